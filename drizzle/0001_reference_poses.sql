CREATE TABLE "reference_poses" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"revision_id" uuid NOT NULL,
	"number" integer NOT NULL,
	"by_name" text NOT NULL,
	"by_user" uuid,
	"at" timestamp (3) with time zone NOT NULL,
	"note" text,
	"passed" boolean NOT NULL,
	"outcome" jsonb NOT NULL,
	"rows" jsonb NOT NULL,
	"source" text NOT NULL,
	CONSTRAINT "reference_poses_revision_number" UNIQUE("revision_id","number")
);
--> statement-breakpoint
ALTER TABLE "teams" ADD COLUMN "evidence_required" boolean DEFAULT false NOT NULL;--> statement-breakpoint
ALTER TABLE "reference_poses" ADD CONSTRAINT "reference_poses_revision_id_revisions_id_fk" FOREIGN KEY ("revision_id") REFERENCES "public"."revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reference_poses" ADD CONSTRAINT "reference_poses_by_user_users_id_fk" FOREIGN KEY ("by_user") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;