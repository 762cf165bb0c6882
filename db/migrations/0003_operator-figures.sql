CREATE TABLE "operator_entries" (
	"firm_id" uuid NOT NULL,
	"operator_id" text NOT NULL,
	"name" text NOT NULL,
	"kind" text NOT NULL,
	"division" text,
	"from_day" date NOT NULL,
	"source" text NOT NULL,
	"set_at" timestamp(3) with time zone NOT NULL,
	CONSTRAINT "operator_entries_firm_id_operator_id_pk" PRIMARY KEY("firm_id","operator_id"),
	CONSTRAINT "operator_entries_two_digits" CHECK ("operator_entries"."operator_id" ~ '^[0-9]{2}$' and "operator_entries"."operator_id" <> '00')
);
--> statement-breakpoint
ALTER TABLE "operator_entries" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "operator_settings" ADD COLUMN "asks_first_above_a" double precision;--> statement-breakpoint
ALTER TABLE "operator_settings" ADD COLUMN "assumes_fuse_a" double precision;--> statement-breakpoint
ALTER TABLE "operator_settings" ADD COLUMN "grounds" jsonb DEFAULT '{}'::jsonb NOT NULL;--> statement-breakpoint
ALTER TABLE "operator_entries" ADD CONSTRAINT "operator_entries_firm_id_firms_id_fk" FOREIGN KEY ("firm_id") REFERENCES "public"."firms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE POLICY "operator_entries_of_firm" ON "operator_entries" AS PERMISSIVE FOR ALL TO public USING (firm_id = nullif(current_setting('app.firm_id', true), '')::uuid) WITH CHECK (firm_id = nullif(current_setting('app.firm_id', true), '')::uuid);--> statement-breakpoint
-- The owner of the table is held to its policy too.
ALTER TABLE "operator_entries" FORCE ROW LEVEL SECURITY;
