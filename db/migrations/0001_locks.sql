-- The owner of a table is held to its policies too: a query that forgets its firm sees nothing, whoever runs it.
ALTER TABLE "firms" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "members" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "invitations" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "jobs" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "idempotency_keys" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "assessments" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "photos" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "packs" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "submissions" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "submission_entries" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "reviews" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "events" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "outbox" FORCE ROW LEVEL SECURITY;--> statement-breakpoint
ALTER TABLE "operator_settings" FORCE ROW LEVEL SECURITY;--> statement-breakpoint

-- Appended, never changed: refused for every role, beside the privileges that are never granted.
CREATE FUNCTION refuse_change() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  RAISE EXCEPTION '% is append-only', TG_TABLE_NAME USING ERRCODE = 'insufficient_privilege';
END $$;--> statement-breakpoint
CREATE TRIGGER events_append_only BEFORE UPDATE OR DELETE ON "events" FOR EACH ROW EXECUTE FUNCTION refuse_change();--> statement-breakpoint
CREATE TRIGGER assessments_append_only BEFORE UPDATE OR DELETE ON "assessments" FOR EACH ROW EXECUTE FUNCTION refuse_change();--> statement-breakpoint
CREATE TRIGGER submission_entries_append_only BEFORE UPDATE OR DELETE ON "submission_entries" FOR EACH ROW EXECUTE FUNCTION refuse_change();--> statement-breakpoint

-- A sealed pack never changes, and what a pack is built from is frozen from its first moment.
CREATE FUNCTION keep_pack_sealed() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF TG_OP = 'DELETE' OR OLD.status = 'sealed' THEN
    RAISE EXCEPTION 'pack % is sealed', OLD.id USING ERRCODE = 'insufficient_privilege';
  END IF;
  IF (NEW.firm_id, NEW.id, NEW.job_id, NEW.version, NEW.job_version, NEW.record::text, NEW.assessment_id, NEW.assessment::text,
      NEW.photos, NEW.changes, NEW.ruleset, NEW.chain_head, NEW.gaps_reason, NEW.declaration_name, NEW.declaration_statement,
      NEW.sealed_by, NEW.issued_at)
     IS DISTINCT FROM
     (OLD.firm_id, OLD.id, OLD.job_id, OLD.version, OLD.job_version, OLD.record::text, OLD.assessment_id, OLD.assessment::text,
      OLD.photos, OLD.changes, OLD.ruleset, OLD.chain_head, OLD.gaps_reason, OLD.declaration_name, OLD.declaration_statement,
      OLD.sealed_by, OLD.issued_at) THEN
    RAISE EXCEPTION 'pack % is frozen', OLD.id USING ERRCODE = 'insufficient_privilege';
  END IF;
  RETURN NEW;
END $$;--> statement-breakpoint
CREATE TRIGGER packs_keep_sealed BEFORE UPDATE OR DELETE ON "packs" FOR EACH ROW EXECUTE FUNCTION keep_pack_sealed();--> statement-breakpoint

-- The words of an event that its hash is taken over. Used by the trigger that writes and by the check that reads.
CREATE FUNCTION event_hash(previous text, e events) RETURNS text LANGUAGE sql STABLE AS $$
  SELECT encode(sha256(convert_to(concat_ws(E'\n', previous, e.firm_id, e.id, e.seq,
    to_char(e.at AT TIME ZONE 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.MS"Z"'), coalesce(e.actor_id::text, '-'),
    e.actor_name, e.type, coalesce(e.job_id::text, '-'), e.payload::text), 'UTF8')), 'hex')
$$;--> statement-breakpoint

-- One writer a firm at a time, so that the chain has no fork; what the client sent as number and hash is ignored.
CREATE FUNCTION chain_event() RETURNS trigger LANGUAGE plpgsql AS $$
DECLARE last record;
BEGIN
  PERFORM pg_advisory_xact_lock(hashtextextended('events:' || NEW.firm_id::text, 0));
  SELECT seq, hash INTO last FROM events WHERE firm_id = NEW.firm_id ORDER BY seq DESC LIMIT 1;
  NEW.seq := coalesce(last.seq, 0) + 1;
  -- The demo's seed tells of past weeks and says so with app.clock; otherwise it is the database's own time.
  NEW.at := coalesce(nullif(current_setting('app.clock', true), '')::timestamptz, clock_timestamp());
  NEW.previous_hash := coalesce(last.hash, repeat('0', 64));
  NEW.hash := event_hash(NEW.previous_hash, NEW);
  RETURN NEW;
END $$;--> statement-breakpoint
CREATE TRIGGER events_chain BEFORE INSERT ON "events" FOR EACH ROW EXECUTE FUNCTION chain_event();
