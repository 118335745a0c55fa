ALTER TABLE "statements" ADD COLUMN "closed_rows" jsonb;--> statement-breakpoint
ALTER TABLE "variances" ADD COLUMN "row_key" text NOT NULL;