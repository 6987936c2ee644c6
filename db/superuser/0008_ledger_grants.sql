-- Who reaches the record, and how far. Reading is for the read and write logins; adding is for the sign login, through functions alone.

GRANT USAGE ON SCHEMA guard TO eb_vault;
GRANT SELECT ON guard.ddl_window TO eb_vault, eb_read;
GRANT USAGE ON SCHEMA guard TO eb_read;

SET LOCAL check_function_bodies = off; -- the functions name tables of schema app, which is made later
SET LOCAL ROLE eb_vault;

GRANT USAGE ON SCHEMA ledger TO eb_owner, eb_read, eb_write, eb_sign;
GRANT SELECT ON ledger.kind, ledger.origin, ledger.head, ledger.entry, ledger.body, ledger.content, ledger.person, ledger.membership,
  ledger.member, ledger.role_proposal, ledger.revision TO eb_read;
GRANT SELECT ON ledger.person, ledger.membership, ledger.member, ledger.revision TO eb_write;
GRANT EXECUTE ON FUNCTION ledger.put_content(text, bytea) TO eb_write;
GRANT EXECUTE ON FUNCTION ledger.is_signed(uuid, integer) TO eb_owner, eb_read, eb_write;
GRANT EXECUTE ON FUNCTION
  ledger.sign(uuid, uuid, integer, text, text, text, text, jsonb),
  ledger.countersign(uuid, uuid, integer, text, text, text, text, jsonb),
  ledger.return_(uuid, uuid, integer, text, text, text, text, jsonb),
  ledger.withdraw(uuid, uuid, integer, text, text, text, text, jsonb),
  ledger.record_event(text, text, text, text, text, jsonb) TO eb_sign;

-- Row rules: a body shows to auditors, to jobs, to members of the screening's facility, and to the person it is about. Keyed to the
-- setting that `asPerson` makes for one transaction; without it no body shows. A belt against a forgotten filter: a session can set it.
ALTER TABLE ledger.body ENABLE ROW LEVEL SECURITY;

CREATE FUNCTION ledger.reader_sees_all() RETURNS boolean LANGUAGE sql STABLE SECURITY DEFINER
SET search_path = pg_catalog, pg_temp AS $$
  SELECT coalesce(current_setting('ebbmark.person', true), '') = 'system'
    OR EXISTS (SELECT FROM ledger.person p WHERE p.id::text = current_setting('ebbmark.person', true) AND p.active AND p.role = 'auditor');
$$;

CREATE FUNCTION ledger.reader_sees(p_seq bigint) RETURNS boolean LANGUAGE sql STABLE SECURITY DEFINER
SET search_path = pg_catalog, pg_temp AS $$
  SELECT EXISTS (
    SELECT FROM ledger.entry e JOIN ledger.person p ON p.id::text = current_setting('ebbmark.person', true) AND p.active
    WHERE e.seq = p_seq AND (
      e.subject_id = p.id::text
      OR (p.role IN ('engineer', 'approver') AND EXISTS (
        SELECT FROM app.screening s JOIN app.section c ON c.id = s.section_id JOIN ledger.member m ON m.facility_id = c.facility_id
        WHERE s.id::text = e.subject_id AND m.person_id = p.id))));
$$;
GRANT EXECUTE ON FUNCTION ledger.reader_sees_all(), ledger.reader_sees(bigint) TO eb_read;

CREATE POLICY readable ON ledger.body FOR SELECT TO eb_read USING ((SELECT ledger.reader_sees_all()) OR ledger.reader_sees(seq));
