-- What the tables of the record refuse, whoever asks. ENABLE ALWAYS: the rules hold in replication sessions as well.

SET LOCAL ROLE eb_vault;

CREATE FUNCTION ledger.refuse_change() RETURNS trigger LANGUAGE plpgsql
SET search_path = pg_catalog, pg_temp AS $$
BEGIN
  RAISE EXCEPTION USING ERRCODE = 'EB403', MESSAGE = 'not-allowed',
    DETAIL = format('%s on ledger.%s is refused: the record only grows.', TG_OP, TG_TABLE_NAME);
END
$$;

DO $$
DECLARE
  name text;
BEGIN
  FOREACH name IN ARRAY ARRAY['kind', 'origin', 'entry', 'body', 'content'] LOOP
    EXECUTE format('CREATE TRIGGER grows_only BEFORE UPDATE OR DELETE ON ledger.%I FOR EACH ROW EXECUTE FUNCTION ledger.refuse_change()', name);
    EXECUTE format('ALTER TABLE ledger.%I ENABLE ALWAYS TRIGGER grows_only', name);
  END LOOP;
  FOREACH name IN ARRAY ARRAY['head', 'person', 'membership', 'role_proposal', 'revision'] LOOP
    EXECUTE format('CREATE TRIGGER keeps_rows BEFORE DELETE ON ledger.%I FOR EACH ROW EXECUTE FUNCTION ledger.refuse_change()', name);
    EXECUTE format('ALTER TABLE ledger.%I ENABLE ALWAYS TRIGGER keeps_rows', name);
  END LOOP;
  FOREACH name IN ARRAY ARRAY['kind', 'origin', 'entry', 'body', 'content', 'head', 'person', 'membership', 'role_proposal', 'revision'] LOOP
    EXECUTE format('CREATE TRIGGER no_truncate BEFORE TRUNCATE ON ledger.%I FOR EACH STATEMENT EXECUTE FUNCTION ledger.refuse_change()', name);
    EXECUTE format('ALTER TABLE ledger.%I ENABLE ALWAYS TRIGGER no_truncate', name);
  END LOOP;
END
$$;

-- Kinds come with a migration, not even from the owner of the record.
CREATE FUNCTION ledger.check_kind() RETURNS trigger LANGUAGE plpgsql
SET search_path = pg_catalog, pg_temp AS $$
BEGIN
  IF NOT (SELECT r.rolsuper FROM pg_catalog.pg_roles r WHERE r.rolname = session_user) THEN
    RAISE EXCEPTION USING ERRCODE = 'EB403', MESSAGE = 'not-allowed', DETAIL = 'Entry kinds are added by migrations only.';
  END IF;
  RETURN NEW;
END
$$;
CREATE TRIGGER by_migration BEFORE INSERT ON ledger.kind FOR EACH ROW EXECUTE FUNCTION ledger.check_kind();
ALTER TABLE ledger.kind ENABLE ALWAYS TRIGGER by_migration;

CREATE FUNCTION ledger.check_entry() RETURNS trigger LANGUAGE plpgsql
SET search_path = pg_catalog, pg_temp AS $$
DECLARE
  head ledger.head;
  fields jsonb := NEW.envelope::jsonb;
  via text;
BEGIN
  SELECT k.via INTO via FROM ledger.kind k WHERE k.kind = fields ->> 'kind';
  IF via IS NULL THEN
    RAISE EXCEPTION USING ERRCODE = 'EB422', MESSAGE = 'invalid-request', DETAIL = format('There is no entry kind "%s".', fields ->> 'kind');
  END IF;
  IF session_user <> 'eb_sign'
     AND NOT (via = 'database' AND (SELECT r.rolsuper FROM pg_catalog.pg_roles r WHERE r.rolname = session_user)) THEN
    RAISE EXCEPTION USING ERRCODE = 'EB403', MESSAGE = 'not-allowed', DETAIL = format('Login %s may not add a %s entry.', session_user, fields ->> 'kind');
  END IF;

  SELECT * INTO head FROM ledger.head h FOR UPDATE;
  IF NEW.seq <> head.size + 1 OR fields ->> 'prev' <> encode(head.hash, 'hex') OR (fields ->> 'at') COLLATE "C" < head.at THEN
    RAISE EXCEPTION USING ERRCODE = 'EB403', MESSAGE = 'not-allowed', DETAIL = 'An entry must follow the newest one in number, hash and time.';
  END IF;
  RETURN NEW;
END
$$;
CREATE TRIGGER follows_head BEFORE INSERT ON ledger.entry FOR EACH ROW EXECUTE FUNCTION ledger.check_entry();
ALTER TABLE ledger.entry ENABLE ALWAYS TRIGGER follows_head;

CREATE FUNCTION ledger.check_head() RETURNS trigger LANGUAGE plpgsql
SET search_path = pg_catalog, pg_temp AS $$
BEGIN
  IF TG_OP = 'INSERT' THEN
    IF EXISTS (SELECT FROM ledger.entry) OR NEW.size <> 0 THEN
      RAISE EXCEPTION USING ERRCODE = 'EB403', MESSAGE = 'not-allowed', DETAIL = 'The head is made once, before the first entry.';
    END IF;
    RETURN NEW;
  END IF;
  IF NEW.size <> OLD.size + 1
     OR NOT EXISTS (SELECT FROM ledger.entry e WHERE e.seq = NEW.size AND e.hash = NEW.hash AND e.at = NEW.at AND e.prev = encode(OLD.hash, 'hex')) THEN
    RAISE EXCEPTION USING ERRCODE = 'EB403', MESSAGE = 'not-allowed', DETAIL = 'The head moves by exactly one chained entry.';
  END IF;
  RETURN NEW;
END
$$;
CREATE TRIGGER moves_by_one BEFORE INSERT OR UPDATE ON ledger.head FOR EACH ROW EXECUTE FUNCTION ledger.check_head();
ALTER TABLE ledger.head ENABLE ALWAYS TRIGGER moves_by_one;

CREATE FUNCTION ledger.check_body() RETURNS trigger LANGUAGE plpgsql
SET search_path = pg_catalog, pg_temp AS $$
BEGIN
  IF NOT EXISTS (
    SELECT FROM ledger.entry e WHERE e.seq = NEW.seq
      AND e.commitment = encode(sha256(convert_to(E'ebbmark/body/v1\n', 'UTF8') || NEW.salt || convert_to(NEW.bytes, 'UTF8')), 'hex')) THEN
    RAISE EXCEPTION USING ERRCODE = 'EB403', MESSAGE = 'not-allowed', DETAIL = 'The body is not the one its entry commits to.';
  END IF;
  RETURN NEW;
END
$$;
CREATE TRIGGER matches_entry BEFORE INSERT ON ledger.body FOR EACH ROW EXECUTE FUNCTION ledger.check_body();
ALTER TABLE ledger.body ENABLE ALWAYS TRIGGER matches_entry;

-- Projections move only together with an entry about the same subject: the one that is the head at that moment.
CREATE FUNCTION ledger.is_head_entry(entry_seq bigint, kinds text[], about text) RETURNS boolean LANGUAGE sql STABLE
SET search_path = pg_catalog, pg_temp AS $$
  SELECT EXISTS (
    SELECT FROM ledger.head h JOIN ledger.entry e ON e.seq = h.size
    WHERE h.size = entry_seq AND e.kind = ANY (kinds) AND e.subject = about);
$$;

CREATE FUNCTION ledger.check_person() RETURNS trigger LANGUAGE plpgsql
SET search_path = pg_catalog, pg_temp AS $$
DECLARE
  kinds text[] := CASE TG_OP WHEN 'INSERT' THEN ARRAY['person_enrolled'] ELSE ARRAY['person_disabled', 'person_reenabled', 'role_confirmed'] END;
BEGIN
  IF TG_OP = 'UPDATE' AND (NEW.id <> OLD.id OR NEW.badge <> OLD.badge OR NEW.printed_name <> OLD.printed_name) THEN
    RAISE EXCEPTION USING ERRCODE = 'EB403', MESSAGE = 'not-allowed', DETAIL = 'Id, badge and printed name of a person never change.';
  END IF;
  IF NOT ledger.is_head_entry(NEW.changed_seq, kinds, 'person:' || NEW.id) THEN
    RAISE EXCEPTION USING ERRCODE = 'EB403', MESSAGE = 'not-allowed', DETAIL = 'A person changes only by an entry about that person.';
  END IF;
  RETURN NEW;
END
$$;
CREATE TRIGGER follows_entry BEFORE INSERT OR UPDATE ON ledger.person FOR EACH ROW EXECUTE FUNCTION ledger.check_person();
ALTER TABLE ledger.person ENABLE ALWAYS TRIGGER follows_entry;

CREATE FUNCTION ledger.check_membership() RETURNS trigger LANGUAGE plpgsql
SET search_path = pg_catalog, pg_temp AS $$
DECLARE
  about text := 'member:' || NEW.facility_id || ':' || NEW.person_id;
BEGIN
  IF TG_OP = 'INSERT' THEN
    IF NEW.removed_seq IS NULL AND ledger.is_head_entry(NEW.added_seq, ARRAY['member_added'], about) THEN RETURN NEW; END IF;
  ELSIF OLD.removed_seq IS NULL AND (NEW.facility_id, NEW.person_id, NEW.added_seq) = (OLD.facility_id, OLD.person_id, OLD.added_seq)
        AND ledger.is_head_entry(NEW.removed_seq, ARRAY['member_removed'], about) THEN
    RETURN NEW;
  END IF;
  RAISE EXCEPTION USING ERRCODE = 'EB403', MESSAGE = 'not-allowed', DETAIL = 'A membership changes only by an entry about it.';
END
$$;
CREATE TRIGGER follows_entry BEFORE INSERT OR UPDATE ON ledger.membership FOR EACH ROW EXECUTE FUNCTION ledger.check_membership();
ALTER TABLE ledger.membership ENABLE ALWAYS TRIGGER follows_entry;

CREATE FUNCTION ledger.check_role_proposal() RETURNS trigger LANGUAGE plpgsql
SET search_path = pg_catalog, pg_temp AS $$
BEGIN
  IF TG_OP = 'INSERT' THEN
    IF NEW.confirmed_seq IS NULL AND ledger.is_head_entry(NEW.seq, ARRAY['role_proposed'], 'person:' || NEW.person_id) THEN RETURN NEW; END IF;
  ELSIF OLD.confirmed_seq IS NULL
        AND (NEW.seq, NEW.person_id, NEW.role, NEW.proposed_by) = (OLD.seq, OLD.person_id, OLD.role, OLD.proposed_by)
        AND ledger.is_head_entry(NEW.confirmed_seq, ARRAY['role_confirmed'], 'person:' || NEW.person_id) THEN
    RETURN NEW;
  END IF;
  RAISE EXCEPTION USING ERRCODE = 'EB403', MESSAGE = 'not-allowed', DETAIL = 'A change of role is proposed and confirmed by entries about that person.';
END
$$;
CREATE TRIGGER follows_entry BEFORE INSERT OR UPDATE ON ledger.role_proposal FOR EACH ROW EXECUTE FUNCTION ledger.check_role_proposal();
ALTER TABLE ledger.role_proposal ENABLE ALWAYS TRIGGER follows_entry;

CREATE FUNCTION ledger.check_revision() RETURNS trigger LANGUAGE plpgsql
SET search_path = pg_catalog, pg_temp AS $$
DECLARE
  about text := 'screening:' || NEW.screening_id || ':' || NEW.rev;
BEGIN
  IF TG_OP = 'INSERT' THEN
    IF NEW.state = 'signed' AND NEW.decided_seq IS NULL AND ledger.is_head_entry(NEW.signed_seq, ARRAY['screening_signed'], about) THEN
      RETURN NEW;
    END IF;
    RAISE EXCEPTION USING ERRCODE = 'EB403', MESSAGE = 'not-allowed', DETAIL = 'A revision begins as signed, by its own entry.';
  END IF;

  IF (NEW.screening_id, NEW.rev, NEW.author, NEW.contributors, NEW.content_sha256, NEW.signed_seq)
     IS DISTINCT FROM (OLD.screening_id, OLD.rev, OLD.author, OLD.contributors, OLD.content_sha256, OLD.signed_seq) THEN
    RAISE EXCEPTION USING ERRCODE = 'EB403', MESSAGE = 'not-allowed', DETAIL = 'What was signed is never edited.';
  END IF;
  IF NOT (CASE NEW.state
    WHEN 'countersigned' THEN OLD.state = 'signed' AND ledger.is_head_entry(NEW.decided_seq, ARRAY['screening_countersigned'], about)
    WHEN 'returned' THEN OLD.state = 'signed' AND ledger.is_head_entry(NEW.decided_seq, ARRAY['screening_returned'], about)
    WHEN 'superseded' THEN OLD.state IN ('signed', 'countersigned', 'returned')
      AND ledger.is_head_entry(NEW.closed_seq, ARRAY['screening_superseded'], about)
    WHEN 'withdrawn' THEN OLD.state IN ('signed', 'countersigned')
      AND ledger.is_head_entry(NEW.closed_seq, ARRAY['screening_withdrawn'], about)
    ELSE false END) THEN
    RAISE EXCEPTION USING ERRCODE = 'EB409', MESSAGE = 'wrong-state', DETAIL = format('A revision can''t go from %s to %s here.', OLD.state, NEW.state);
  END IF;
  IF OLD.decided_seq IS NOT NULL AND (NEW.decided_seq, NEW.decided_by) IS DISTINCT FROM (OLD.decided_seq, OLD.decided_by) THEN
    RAISE EXCEPTION USING ERRCODE = 'EB403', MESSAGE = 'not-allowed', DETAIL = 'A decision is never edited.';
  END IF;
  RETURN NEW;
END
$$;
CREATE TRIGGER follows_entry BEFORE INSERT OR UPDATE ON ledger.revision FOR EACH ROW EXECUTE FUNCTION ledger.check_revision();
ALTER TABLE ledger.revision ENABLE ALWAYS TRIGGER follows_entry;
