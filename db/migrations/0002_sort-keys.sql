DROP INDEX "jobs_by_last_day";--> statement-breakpoint
DROP INDEX "submissions_by_due";--> statement-breakpoint
ALTER TABLE "jobs" ADD COLUMN "last_day_key" date GENERATED ALWAYS AS (coalesce(last_day, 'infinity'::date)) STORED NOT NULL;--> statement-breakpoint
ALTER TABLE "submissions" ADD COLUMN "due_key" date GENERATED ALWAYS AS (coalesce(due_on, 'infinity'::date)) STORED NOT NULL;--> statement-breakpoint
CREATE INDEX "jobs_by_last_day" ON "jobs" USING btree ("firm_id","last_day_key","id");--> statement-breakpoint
CREATE INDEX "submissions_by_due" ON "submissions" USING btree ("firm_id","due_key","id");