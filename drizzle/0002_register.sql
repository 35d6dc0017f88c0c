-- In every distribution of PostgreSQL, and trusted: the owner of the database may install it.
CREATE EXTENSION IF NOT EXISTS pg_trgm;
--> statement-breakpoint
CREATE TABLE "register_entries" (
	"model_id" uuid PRIMARY KEY NOT NULL,
	"team_id" uuid NOT NULL,
	"slug" text collate "C" NOT NULL,
	"search_text" text NOT NULL,
	"independent" integer NOT NULL,
	"statuses" text[] NOT NULL
);
--> statement-breakpoint
ALTER TABLE "transitions" ADD COLUMN "team_id" uuid;--> statement-breakpoint
UPDATE "transitions" SET "team_id" = "models"."team_id" FROM "revisions" JOIN "models" ON "models"."id" = "revisions"."model_id" WHERE "revisions"."id" = "transitions"."revision_id";--> statement-breakpoint
ALTER TABLE "transitions" ALTER COLUMN "team_id" SET NOT NULL;--> statement-breakpoint
ALTER TABLE "register_entries" ADD CONSTRAINT "register_entries_model_id_models_id_fk" FOREIGN KEY ("model_id") REFERENCES "public"."models"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "register_entries" ADD CONSTRAINT "register_entries_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "register_by_slug" ON "register_entries" USING btree ("team_id","slug");--> statement-breakpoint
CREATE INDEX "register_by_joints" ON "register_entries" USING btree ("team_id","independent","slug");--> statement-breakpoint
CREATE INDEX "register_by_text" ON "register_entries" USING gin ("search_text" gin_trgm_ops) WITH (fastupdate=false);--> statement-breakpoint
CREATE INDEX "register_draft" ON "register_entries" USING btree ("team_id","slug") WHERE 'draft' = any(statuses);--> statement-breakpoint
CREATE INDEX "register_in_review" ON "register_entries" USING btree ("team_id","slug") WHERE 'in-review' = any(statuses);--> statement-breakpoint
CREATE INDEX "register_released" ON "register_entries" USING btree ("team_id","slug") WHERE 'released' = any(statuses);--> statement-breakpoint
CREATE INDEX "register_superseded" ON "register_entries" USING btree ("team_id","slug") WHERE 'superseded' = any(statuses);--> statement-breakpoint
CREATE INDEX "register_withdrawn" ON "register_entries" USING btree ("team_id","slug") WHERE 'withdrawn' = any(statuses);--> statement-breakpoint
ALTER TABLE "transitions" ADD CONSTRAINT "transitions_team_id_teams_id_fk" FOREIGN KEY ("team_id") REFERENCES "public"."teams"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "revisions_drafts" ON "revisions" USING btree ("imported_by","imported_at") WHERE "revisions"."status" = 'draft';--> statement-breakpoint
CREATE INDEX "transitions_latest" ON "transitions" USING btree ("team_id","at","ordinal");