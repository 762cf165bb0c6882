DROP INDEX "jobs_by_update";--> statement-breakpoint
CREATE INDEX "jobs_by_update" ON "jobs" USING btree ("firm_id","updated_at","id");