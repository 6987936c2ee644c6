-- Grants are written out table by table: a table nobody thought about is closed.
GRANT USAGE ON SCHEMA "app" TO eb_read, eb_write, eb_vault;--> statement-breakpoint

-- Not for the read login: what proves a person, open signing pages, and mail.
GRANT SELECT ON "app"."facility", "app"."section", "app"."screening", "app"."draft", "app"."remark", "app"."session",
  "app"."security_event", "app"."person_setting" TO eb_read;--> statement-breakpoint

GRANT SELECT ON ALL TABLES IN SCHEMA "app" TO eb_write;--> statement-breakpoint
GRANT USAGE ON SEQUENCE "app"."screening_number" TO eb_write;--> statement-breakpoint
GRANT INSERT ON "app"."facility", "app"."section", "app"."screening", "app"."draft", "app"."remark", "app"."security_event",
  "app"."session", "app"."credential", "app"."auth_throttle", "app"."person_setting", "app"."ceremony", "app"."outbox" TO eb_write;--> statement-breakpoint
-- By column, so that a section never moves to another facility, nor a screening to another section, nor a draft to another author.
GRANT UPDATE ("code", "name", "barometric_pressure_pa", "policy") ON "app"."facility" TO eb_write;--> statement-breakpoint
GRANT UPDATE ("tag", "name", "description") ON "app"."section" TO eb_write;--> statement-breakpoint
GRANT UPDATE ("title") ON "app"."screening" TO eb_write;--> statement-breakpoint
GRANT UPDATE ("document", "version", "reason", "updated_by", "updated_at", "prepared_version", "prepared_sha256", "prepared_at", "prepared")
  ON "app"."draft" TO eb_write;--> statement-breakpoint
GRANT UPDATE ("last_seen_at", "expires_at", "revoked_at") ON "app"."session" TO eb_write;--> statement-breakpoint
GRANT UPDATE ON "app"."credential", "app"."auth_throttle", "app"."person_setting" TO eb_write;--> statement-breakpoint
GRANT UPDATE ("method", "proved_at") ON "app"."ceremony" TO eb_write;--> statement-breakpoint
GRANT UPDATE ("next_attempt_at", "attempts", "last_error", "sent_at", "dead_at") ON "app"."outbox" TO eb_write;--> statement-breakpoint
GRANT DELETE ON "app"."draft", "app"."session", "app"."auth_throttle", "app"."ceremony" TO eb_write;--> statement-breakpoint

-- What the functions of the record read and write here, as their owner.
GRANT SELECT ON "app"."facility", "app"."section", "app"."screening", "app"."draft", "app"."ceremony" TO eb_vault;--> statement-breakpoint
GRANT UPDATE ("used_at") ON "app"."ceremony" TO eb_vault;--> statement-breakpoint
-- Row locks need a right to update; this column says nothing and lets the functions hold a draft still while they read it.
GRANT UPDATE ("updated_at") ON "app"."draft" TO eb_vault;--> statement-breakpoint
GRANT INSERT ON "app"."outbox", "app"."remark" TO eb_vault;--> statement-breakpoint

CREATE FUNCTION "app"."guard_draft"() RETURNS trigger LANGUAGE plpgsql SET search_path = pg_catalog, pg_temp AS $$
BEGIN
  IF ledger.is_signed(CASE WHEN TG_OP = 'INSERT' THEN NEW.screening_id ELSE OLD.screening_id END, CASE WHEN TG_OP = 'INSERT' THEN NEW.rev ELSE OLD.rev END) THEN
    RAISE EXCEPTION USING ERRCODE = 'EB409', MESSAGE = 'wrong-state', DETAIL = 'This revision is signed; a change makes the next one.';
  END IF;
  IF TG_OP = 'DELETE' THEN RETURN OLD; END IF;

  -- Everyone who had a hand in it stays named, whatever the caller sends.
  SELECT array_agg(DISTINCT h ORDER BY h) INTO NEW.contributors
  FROM unnest(CASE WHEN TG_OP = 'UPDATE' THEN OLD.contributors ELSE '{}' END || NEW.contributors || NEW.author_id || NEW.updated_by) h;
  RETURN NEW;
END
$$;--> statement-breakpoint
CREATE TRIGGER guard_draft BEFORE INSERT OR UPDATE OR DELETE ON "app"."draft" FOR EACH ROW EXECUTE FUNCTION "app"."guard_draft"();--> statement-breakpoint
ALTER TABLE "app"."draft" ENABLE ALWAYS TRIGGER guard_draft;--> statement-breakpoint

-- Row rules: drafts show to engineers and approvers of the facility, and to jobs. See `asPerson` in db/clients.ts.
ALTER TABLE "app"."draft" ENABLE ROW LEVEL SECURITY;--> statement-breakpoint
CREATE FUNCTION "app"."reader_sees_screening"(p_screening uuid) RETURNS boolean LANGUAGE sql STABLE SET search_path = pg_catalog, pg_temp AS $$
  SELECT coalesce(current_setting('ebbmark.person', true), '') = 'system'
    OR EXISTS (
      SELECT FROM app.screening s JOIN app.section c ON c.id = s.section_id JOIN ledger.member m ON m.facility_id = c.facility_id
        JOIN ledger.person p ON p.id = m.person_id
      WHERE s.id = p_screening AND p.id::text = current_setting('ebbmark.person', true) AND p.active AND p.role IN ('engineer', 'approver'));
$$;--> statement-breakpoint
CREATE POLICY members ON "app"."draft" TO eb_read, eb_write USING ("app"."reader_sees_screening"("screening_id"));--> statement-breakpoint
-- An auditor reads what was signed, never what is being worked on.
CREATE POLICY auditors ON "app"."draft" FOR SELECT TO eb_read USING (
  ledger.is_signed("screening_id", "rev") AND EXISTS (
    SELECT FROM ledger.person p WHERE p.id::text = current_setting('ebbmark.person', true) AND p.active AND p.role = 'auditor'));--> statement-breakpoint
CREATE POLICY record ON "app"."draft" TO eb_vault USING (true);
