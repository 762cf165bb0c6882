CREATE TABLE "assessments" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"job_id" uuid NOT NULL,
	"job_version" integer NOT NULL,
	"as_at" date NOT NULL,
	"ruleset" text NOT NULL,
	"body" jsonb NOT NULL,
	"created_at" timestamp(3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "assessments_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
ALTER TABLE "assessments" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "events" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"seq" bigint DEFAULT 0 NOT NULL,
	"at" timestamp(3) with time zone DEFAULT now() NOT NULL,
	"actor_id" uuid,
	"actor_name" text NOT NULL,
	"type" text NOT NULL,
	"job_id" uuid,
	"payload" jsonb NOT NULL,
	"previous_hash" text DEFAULT '' NOT NULL,
	"hash" text DEFAULT '' NOT NULL,
	CONSTRAINT "events_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
ALTER TABLE "events" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "firms" (
	"id" uuid PRIMARY KEY NOT NULL,
	"name" text NOT NULL,
	"contact_name" text,
	"phone" text,
	"email" text,
	"address" text[] DEFAULT '{}' NOT NULL,
	"registration" text,
	"number_prefix" text NOT NULL,
	"next_number" integer DEFAULT 1 NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp(3) with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
ALTER TABLE "firms" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "idempotency_keys" (
	"firm_id" uuid NOT NULL,
	"key" text NOT NULL,
	"act" text NOT NULL,
	"request_hash" text NOT NULL,
	"reply" jsonb,
	"created_at" timestamp(3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "idempotency_keys_firm_id_key_pk" PRIMARY KEY("firm_id","key")
);
--> statement-breakpoint
ALTER TABLE "idempotency_keys" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "jobs" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"number" text NOT NULL,
	"format" text NOT NULL,
	"record" jsonb NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"lists_version" integer DEFAULT 1 NOT NULL,
	"stage" text NOT NULL,
	"site" text NOT NULL,
	"postcode" text,
	"supply_core" text,
	"serials" text[] DEFAULT '{}' NOT NULL,
	"operator_id" text NOT NULL,
	"unit" text NOT NULL,
	"route" text NOT NULL,
	"contradicts" boolean DEFAULT false NOT NULL,
	"standing" text NOT NULL,
	"installer_id" uuid,
	"installed_on" date,
	"planned_on" date,
	"last_day" date,
	"missing_count" integer DEFAULT 0 NOT NULL,
	"search" text DEFAULT '' NOT NULL,
	"created_by" uuid NOT NULL,
	"updated_by" uuid NOT NULL,
	"created_at" timestamp(3) with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp(3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "jobs_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
ALTER TABLE "jobs" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "operator_settings" (
	"firm_id" uuid NOT NULL,
	"operator_id" text NOT NULL,
	"notice_email" text,
	"application_email" text,
	"phone" text,
	"page" text,
	"notice_days" integer,
	"buried_separation_m" double precision,
	"note" text,
	"updated_at" timestamp(3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "operator_settings_firm_id_operator_id_pk" PRIMARY KEY("firm_id","operator_id")
);
--> statement-breakpoint
ALTER TABLE "operator_settings" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "outbox" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"message_id" text NOT NULL,
	"kind" text NOT NULL,
	"to" text NOT NULL,
	"reply_to" text,
	"subject" text NOT NULL,
	"body" text NOT NULL,
	"attachments" jsonb DEFAULT '[]'::jsonb NOT NULL,
	"status" text DEFAULT 'waiting' NOT NULL,
	"attempts" integer DEFAULT 0 NOT NULL,
	"last_error" text,
	"submission_id" uuid,
	"created_at" timestamp(3) with time zone DEFAULT now() NOT NULL,
	"sent_at" timestamp(3) with time zone,
	CONSTRAINT "outbox_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
ALTER TABLE "outbox" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "packs" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"job_id" uuid NOT NULL,
	"version" integer NOT NULL,
	"job_version" integer NOT NULL,
	"status" text DEFAULT 'building' NOT NULL,
	"progress" integer DEFAULT 0 NOT NULL,
	"step" text DEFAULT 'Waiting to be built' NOT NULL,
	"record" json NOT NULL,
	"assessment_id" uuid NOT NULL,
	"assessment" json NOT NULL,
	"photos" jsonb NOT NULL,
	"changes" jsonb NOT NULL,
	"ruleset" text NOT NULL,
	"chain_head" text,
	"gaps_reason" text,
	"declaration_name" text NOT NULL,
	"declaration_statement" text NOT NULL,
	"sealed_by" uuid NOT NULL,
	"issued_at" timestamp(3) with time zone NOT NULL,
	"sha256" text,
	"bytes" bigint,
	"storage_key" text,
	"files" jsonb,
	"sealed_at" timestamp(3) with time zone,
	"error" text,
	"created_at" timestamp(3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "packs_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
ALTER TABLE "packs" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "invitations" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"email" text NOT NULL,
	"roles" text[] NOT NULL,
	"token_hash" text NOT NULL,
	"invited_by" uuid NOT NULL,
	"expires_at" timestamp(3) with time zone NOT NULL,
	"accepted_at" timestamp(3) with time zone,
	"withdrawn_at" timestamp(3) with time zone,
	"created_at" timestamp(3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "invitations_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
ALTER TABLE "invitations" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "members" (
	"firm_id" uuid NOT NULL,
	"user_id" uuid NOT NULL,
	"roles" text[] NOT NULL,
	"registration" text,
	"status" text DEFAULT 'active' NOT NULL,
	"last_seen_at" timestamp(3) with time zone,
	"created_at" timestamp(3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "members_firm_id_user_id_pk" PRIMARY KEY("firm_id","user_id")
);
--> statement-breakpoint
ALTER TABLE "members" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "password_resets" (
	"id" uuid PRIMARY KEY NOT NULL,
	"user_id" uuid NOT NULL,
	"token_hash" text NOT NULL,
	"expires_at" timestamp(3) with time zone NOT NULL,
	"used_at" timestamp(3) with time zone,
	"created_at" timestamp(3) with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "sessions" (
	"id" text PRIMARY KEY NOT NULL,
	"user_id" uuid NOT NULL,
	"expires_at" timestamp with time zone NOT NULL,
	"created_at" timestamp(3) with time zone DEFAULT now() NOT NULL,
	"last_seen_at" timestamp(3) with time zone,
	"device" text DEFAULT '' NOT NULL
);
--> statement-breakpoint
CREATE TABLE "sign_in_attempts" (
	"id" bigserial PRIMARY KEY NOT NULL,
	"account" text NOT NULL,
	"at" timestamp(3) with time zone DEFAULT now() NOT NULL,
	"succeeded" boolean DEFAULT false NOT NULL
);
--> statement-breakpoint
CREATE TABLE "users" (
	"id" uuid PRIMARY KEY NOT NULL,
	"email" text NOT NULL,
	"name" text NOT NULL,
	"password_hash" text,
	"created_at" timestamp(3) with time zone DEFAULT now() NOT NULL
);
--> statement-breakpoint
CREATE TABLE "photos" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"job_id" uuid NOT NULL,
	"file" text NOT NULL,
	"subject" text NOT NULL,
	"of" text,
	"caption" text,
	"taken_at" timestamp(3) with time zone,
	"width_px" integer NOT NULL,
	"height_px" integer NOT NULL,
	"bytes" integer NOT NULL,
	"sha256" text NOT NULL,
	"storage_key" text NOT NULL,
	"sent_sha256" text NOT NULL,
	"in_pack" boolean DEFAULT true NOT NULL,
	"added_by" uuid NOT NULL,
	"created_at" timestamp(3) with time zone DEFAULT now() NOT NULL,
	"removed_at" timestamp(3) with time zone,
	CONSTRAINT "photos_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
ALTER TABLE "photos" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "reviews" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"job_id" uuid NOT NULL,
	"pack_id" uuid NOT NULL,
	"state" text DEFAULT 'waiting' NOT NULL,
	"tally" jsonb NOT NULL,
	"version" integer DEFAULT 1 NOT NULL,
	"decided_by" uuid,
	"decided_at" timestamp(3) with time zone,
	"reason" text,
	"created_at" timestamp(3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "reviews_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
ALTER TABLE "reviews" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "submission_entries" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"submission_id" uuid NOT NULL,
	"at" timestamp(3) with time zone DEFAULT now() NOT NULL,
	"kind" text NOT NULL,
	"text" text NOT NULL,
	"reference" text,
	"state" text NOT NULL,
	"by" uuid NOT NULL,
	CONSTRAINT "submission_entries_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
ALTER TABLE "submission_entries" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE TABLE "submissions" (
	"firm_id" uuid NOT NULL,
	"id" uuid NOT NULL,
	"job_id" uuid NOT NULL,
	"purpose" text NOT NULL,
	"operator_id" text NOT NULL,
	"state" text DEFAULT 'draft' NOT NULL,
	"channel" text,
	"pack_id" uuid NOT NULL,
	"sent_on" date,
	"sent_to" text,
	"reference" text,
	"decided_on" date,
	"limit_a" double precision,
	"expires_on" date,
	"last_day" date,
	"heard_on" date,
	"due_on" date,
	"version" integer DEFAULT 1 NOT NULL,
	"created_at" timestamp(3) with time zone DEFAULT now() NOT NULL,
	"updated_at" timestamp(3) with time zone DEFAULT now() NOT NULL,
	CONSTRAINT "submissions_firm_id_id_pk" PRIMARY KEY("firm_id","id")
);
--> statement-breakpoint
ALTER TABLE "submissions" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "assessments" ADD CONSTRAINT "assessments_firm_id_job_id_jobs_firm_id_id_fk" FOREIGN KEY ("firm_id","job_id") REFERENCES "public"."jobs"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "events" ADD CONSTRAINT "events_firm_id_firms_id_fk" FOREIGN KEY ("firm_id") REFERENCES "public"."firms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "idempotency_keys" ADD CONSTRAINT "idempotency_keys_firm_id_firms_id_fk" FOREIGN KEY ("firm_id") REFERENCES "public"."firms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "jobs" ADD CONSTRAINT "jobs_firm_id_firms_id_fk" FOREIGN KEY ("firm_id") REFERENCES "public"."firms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "jobs" ADD CONSTRAINT "jobs_firm_id_installer_id_members_firm_id_user_id_fk" FOREIGN KEY ("firm_id","installer_id") REFERENCES "public"."members"("firm_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "jobs" ADD CONSTRAINT "jobs_firm_id_created_by_members_firm_id_user_id_fk" FOREIGN KEY ("firm_id","created_by") REFERENCES "public"."members"("firm_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "jobs" ADD CONSTRAINT "jobs_firm_id_updated_by_members_firm_id_user_id_fk" FOREIGN KEY ("firm_id","updated_by") REFERENCES "public"."members"("firm_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "operator_settings" ADD CONSTRAINT "operator_settings_firm_id_firms_id_fk" FOREIGN KEY ("firm_id") REFERENCES "public"."firms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "outbox" ADD CONSTRAINT "outbox_firm_id_firms_id_fk" FOREIGN KEY ("firm_id") REFERENCES "public"."firms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "outbox" ADD CONSTRAINT "outbox_firm_id_submission_id_submissions_firm_id_id_fk" FOREIGN KEY ("firm_id","submission_id") REFERENCES "public"."submissions"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "packs" ADD CONSTRAINT "packs_firm_id_job_id_jobs_firm_id_id_fk" FOREIGN KEY ("firm_id","job_id") REFERENCES "public"."jobs"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "packs" ADD CONSTRAINT "packs_firm_id_assessment_id_assessments_firm_id_id_fk" FOREIGN KEY ("firm_id","assessment_id") REFERENCES "public"."assessments"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "packs" ADD CONSTRAINT "packs_firm_id_sealed_by_members_firm_id_user_id_fk" FOREIGN KEY ("firm_id","sealed_by") REFERENCES "public"."members"("firm_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invitations" ADD CONSTRAINT "invitations_firm_id_firms_id_fk" FOREIGN KEY ("firm_id") REFERENCES "public"."firms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "invitations" ADD CONSTRAINT "invitations_firm_id_invited_by_members_firm_id_user_id_fk" FOREIGN KEY ("firm_id","invited_by") REFERENCES "public"."members"("firm_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "members" ADD CONSTRAINT "members_firm_id_firms_id_fk" FOREIGN KEY ("firm_id") REFERENCES "public"."firms"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "members" ADD CONSTRAINT "members_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "password_resets" ADD CONSTRAINT "password_resets_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sessions" ADD CONSTRAINT "sessions_user_id_users_id_fk" FOREIGN KEY ("user_id") REFERENCES "public"."users"("id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "photos" ADD CONSTRAINT "photos_firm_id_job_id_jobs_firm_id_id_fk" FOREIGN KEY ("firm_id","job_id") REFERENCES "public"."jobs"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "photos" ADD CONSTRAINT "photos_firm_id_added_by_members_firm_id_user_id_fk" FOREIGN KEY ("firm_id","added_by") REFERENCES "public"."members"("firm_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reviews" ADD CONSTRAINT "reviews_firm_id_job_id_jobs_firm_id_id_fk" FOREIGN KEY ("firm_id","job_id") REFERENCES "public"."jobs"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reviews" ADD CONSTRAINT "reviews_firm_id_pack_id_packs_firm_id_id_fk" FOREIGN KEY ("firm_id","pack_id") REFERENCES "public"."packs"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "reviews" ADD CONSTRAINT "reviews_firm_id_decided_by_members_firm_id_user_id_fk" FOREIGN KEY ("firm_id","decided_by") REFERENCES "public"."members"("firm_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submission_entries" ADD CONSTRAINT "submission_entries_firm_id_submission_id_submissions_firm_id_id_fk" FOREIGN KEY ("firm_id","submission_id") REFERENCES "public"."submissions"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submission_entries" ADD CONSTRAINT "submission_entries_firm_id_by_members_firm_id_user_id_fk" FOREIGN KEY ("firm_id","by") REFERENCES "public"."members"("firm_id","user_id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submissions" ADD CONSTRAINT "submissions_firm_id_job_id_jobs_firm_id_id_fk" FOREIGN KEY ("firm_id","job_id") REFERENCES "public"."jobs"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "submissions" ADD CONSTRAINT "submissions_firm_id_pack_id_packs_firm_id_id_fk" FOREIGN KEY ("firm_id","pack_id") REFERENCES "public"."packs"("firm_id","id") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "assessments_of_job" ON "assessments" USING btree ("firm_id","job_id","job_version" DESC NULLS LAST,"created_at" DESC NULLS LAST);--> statement-breakpoint
CREATE UNIQUE INDEX "events_in_order" ON "events" USING btree ("firm_id","seq");--> statement-breakpoint
CREATE INDEX "events_of_job" ON "events" USING btree ("firm_id","job_id","seq");--> statement-breakpoint
CREATE UNIQUE INDEX "jobs_number" ON "jobs" USING btree ("firm_id","number");--> statement-breakpoint
CREATE INDEX "jobs_by_last_day" ON "jobs" USING btree ("firm_id",coalesce("last_day", 'infinity'::date),"id");--> statement-breakpoint
CREATE INDEX "jobs_by_update" ON "jobs" USING btree ("firm_id","updated_at" DESC NULLS LAST,"id" DESC NULLS LAST);--> statement-breakpoint
CREATE INDEX "jobs_by_supply" ON "jobs" USING btree ("firm_id","supply_core");--> statement-breakpoint
CREATE INDEX "jobs_by_installer" ON "jobs" USING btree ("firm_id","installer_id");--> statement-breakpoint
CREATE INDEX "jobs_by_standing" ON "jobs" USING btree ("firm_id","standing");--> statement-breakpoint
CREATE UNIQUE INDEX "outbox_message" ON "outbox" USING btree ("message_id");--> statement-breakpoint
CREATE INDEX "outbox_by_status" ON "outbox" USING btree ("firm_id","status","created_at");--> statement-breakpoint
CREATE UNIQUE INDEX "packs_version" ON "packs" USING btree ("firm_id","job_id","version");--> statement-breakpoint
CREATE INDEX "packs_by_status" ON "packs" USING btree ("firm_id","status");--> statement-breakpoint
CREATE UNIQUE INDEX "invitations_token" ON "invitations" USING btree ("token_hash");--> statement-breakpoint
CREATE INDEX "members_by_user" ON "members" USING btree ("user_id");--> statement-breakpoint
CREATE UNIQUE INDEX "password_resets_token" ON "password_resets" USING btree ("token_hash");--> statement-breakpoint
CREATE INDEX "password_resets_by_user" ON "password_resets" USING btree ("user_id");--> statement-breakpoint
CREATE INDEX "sessions_by_user" ON "sessions" USING btree ("user_id");--> statement-breakpoint
CREATE INDEX "sign_in_attempts_recent" ON "sign_in_attempts" USING btree ("account","at");--> statement-breakpoint
CREATE UNIQUE INDEX "users_email" ON "users" USING btree (lower("email"));--> statement-breakpoint
CREATE UNIQUE INDEX "photos_file" ON "photos" USING btree ("firm_id","job_id","file");--> statement-breakpoint
CREATE INDEX "photos_of_job" ON "photos" USING btree ("firm_id","job_id","created_at");--> statement-breakpoint
CREATE UNIQUE INDEX "reviews_of_pack" ON "reviews" USING btree ("firm_id","pack_id");--> statement-breakpoint
CREATE INDEX "reviews_of_job" ON "reviews" USING btree ("firm_id","job_id","created_at");--> statement-breakpoint
CREATE INDEX "reviews_by_state" ON "reviews" USING btree ("firm_id","state","created_at","id");--> statement-breakpoint
CREATE INDEX "submission_entries_of" ON "submission_entries" USING btree ("firm_id","submission_id","at");--> statement-breakpoint
CREATE INDEX "submissions_of_job" ON "submissions" USING btree ("firm_id","job_id");--> statement-breakpoint
CREATE INDEX "submissions_by_due" ON "submissions" USING btree ("firm_id",coalesce("due_on", 'infinity'::date),"id");--> statement-breakpoint
CREATE INDEX "submissions_by_state" ON "submissions" USING btree ("firm_id","state","due_on");--> statement-breakpoint
CREATE POLICY "assessments_of_firm" ON "assessments" AS PERMISSIVE FOR ALL TO public USING (firm_id = nullif(current_setting('app.firm_id', true), '')::uuid) WITH CHECK (firm_id = nullif(current_setting('app.firm_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "events_of_firm" ON "events" AS PERMISSIVE FOR ALL TO public USING (firm_id = nullif(current_setting('app.firm_id', true), '')::uuid) WITH CHECK (firm_id = nullif(current_setting('app.firm_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "firms_of_firm" ON "firms" AS PERMISSIVE FOR ALL TO public USING (id = nullif(current_setting('app.firm_id', true), '')::uuid) WITH CHECK (id = nullif(current_setting('app.firm_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "idempotency_keys_of_firm" ON "idempotency_keys" AS PERMISSIVE FOR ALL TO public USING (firm_id = nullif(current_setting('app.firm_id', true), '')::uuid) WITH CHECK (firm_id = nullif(current_setting('app.firm_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "jobs_of_firm" ON "jobs" AS PERMISSIVE FOR ALL TO public USING (firm_id = nullif(current_setting('app.firm_id', true), '')::uuid) WITH CHECK (firm_id = nullif(current_setting('app.firm_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "operator_settings_of_firm" ON "operator_settings" AS PERMISSIVE FOR ALL TO public USING (firm_id = nullif(current_setting('app.firm_id', true), '')::uuid) WITH CHECK (firm_id = nullif(current_setting('app.firm_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "outbox_of_firm" ON "outbox" AS PERMISSIVE FOR ALL TO public USING (firm_id = nullif(current_setting('app.firm_id', true), '')::uuid) WITH CHECK (firm_id = nullif(current_setting('app.firm_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "packs_of_firm" ON "packs" AS PERMISSIVE FOR ALL TO public USING (firm_id = nullif(current_setting('app.firm_id', true), '')::uuid) WITH CHECK (firm_id = nullif(current_setting('app.firm_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "invitations_of_firm" ON "invitations" AS PERMISSIVE FOR ALL TO public USING (firm_id = nullif(current_setting('app.firm_id', true), '')::uuid) WITH CHECK (firm_id = nullif(current_setting('app.firm_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "invitations_by_token" ON "invitations" AS PERMISSIVE FOR SELECT TO public USING (token_hash = nullif(current_setting('app.token_hash', true), ''));--> statement-breakpoint
CREATE POLICY "members_of_firm" ON "members" AS PERMISSIVE FOR ALL TO public USING (firm_id = nullif(current_setting('app.firm_id', true), '')::uuid) WITH CHECK (firm_id = nullif(current_setting('app.firm_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "members_own" ON "members" AS PERMISSIVE FOR SELECT TO public USING (user_id = nullif(current_setting('app.user_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "photos_of_firm" ON "photos" AS PERMISSIVE FOR ALL TO public USING (firm_id = nullif(current_setting('app.firm_id', true), '')::uuid) WITH CHECK (firm_id = nullif(current_setting('app.firm_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "reviews_of_firm" ON "reviews" AS PERMISSIVE FOR ALL TO public USING (firm_id = nullif(current_setting('app.firm_id', true), '')::uuid) WITH CHECK (firm_id = nullif(current_setting('app.firm_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "submission_entries_of_firm" ON "submission_entries" AS PERMISSIVE FOR ALL TO public USING (firm_id = nullif(current_setting('app.firm_id', true), '')::uuid) WITH CHECK (firm_id = nullif(current_setting('app.firm_id', true), '')::uuid);--> statement-breakpoint
CREATE POLICY "submissions_of_firm" ON "submissions" AS PERMISSIVE FOR ALL TO public USING (firm_id = nullif(current_setting('app.firm_id', true), '')::uuid) WITH CHECK (firm_id = nullif(current_setting('app.firm_id', true), '')::uuid);