ALTER TABLE "revisions" ADD COLUMN "serial_number" text;--> statement-breakpoint
ALTER TABLE "revisions" ADD COLUMN "geometry" text;--> statement-breakpoint
ALTER TABLE "revisions" ADD COLUMN "supplier_note" text;