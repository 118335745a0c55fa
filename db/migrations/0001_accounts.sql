CREATE TABLE "rate_limits" (
	"key" text PRIMARY KEY NOT NULL,
	"points" integer NOT NULL,
	"expire" timestamp with time zone
);
--> statement-breakpoint
ALTER TABLE "people" DROP CONSTRAINT "people_email_unique";--> statement-breakpoint
CREATE UNIQUE INDEX "people_email" ON "people" USING btree ("email") WHERE removed_at is null;