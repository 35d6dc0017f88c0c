CREATE TABLE "meshes" (
	"revision_id" uuid NOT NULL,
	"path" text NOT NULL,
	"digest" text NOT NULL,
	"size" integer NOT NULL,
	"media_type" text NOT NULL,
	CONSTRAINT "meshes_revision_id_path_pk" PRIMARY KEY("revision_id","path")
);
--> statement-breakpoint
CREATE TABLE "key_uses" (
	"key_id" text NOT NULL,
	"revision_id" uuid NOT NULL,
	"last_used_at" timestamp (3) with time zone NOT NULL,
	CONSTRAINT "key_uses_key_id_revision_id_pk" PRIMARY KEY("key_id","revision_id")
);
--> statement-breakpoint
ALTER TABLE "revisions" ADD COLUMN "entry" text;--> statement-breakpoint
ALTER TABLE "meshes" ADD CONSTRAINT "meshes_revision_id_revisions_id_fk" FOREIGN KEY ("revision_id") REFERENCES "public"."revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "key_uses" ADD CONSTRAINT "key_uses_key_id_keys_id_fk" FOREIGN KEY ("key_id") REFERENCES "public"."keys"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "key_uses" ADD CONSTRAINT "key_uses_revision_id_revisions_id_fk" FOREIGN KEY ("revision_id") REFERENCES "public"."revisions"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "key_uses_by_revision" ON "key_uses" USING btree ("revision_id");