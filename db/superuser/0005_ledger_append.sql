-- The one way an entry comes to be. `append_` is granted to nobody; the functions in the files after this one decide and then call it.

SET LOCAL check_function_bodies = off; -- the functions name tables of schema app, which is made later
SET LOCAL ROLE eb_vault;

CREATE TYPE ledger.receipt AS (seq bigint, at text, leaf text, commitment text, repeated boolean);

-- 32 bytes for each body, from the server's strong random source. Three version-4 UUIDs carry 366 random bits; SHA-256 folds them into 256.
CREATE FUNCTION ledger.new_salt() RETURNS bytea LANGUAGE sql VOLATILE
SET search_path = pg_catalog, pg_temp AS $$
  SELECT sha256(uuid_send(gen_random_uuid()) || uuid_send(gen_random_uuid()) || uuid_send(gen_random_uuid()));
$$;

-- Takes the head for this transaction. Everything that is checked before an append is checked under this lock.
CREATE FUNCTION ledger.lock_head() RETURNS ledger.head LANGUAGE plpgsql
SET search_path = pg_catalog, pg_temp AS $$
DECLARE
  head ledger.head;
BEGIN
  IF current_setting('transaction_isolation') <> 'read committed' THEN
    PERFORM ledger.refuse('EB422', 'invalid-request', 'Entries are added under read committed only.');
  END IF;
  SELECT * INTO head FROM ledger.head FOR UPDATE;
  IF NOT FOUND THEN PERFORM ledger.refuse('EB503', 'record-unavailable', 'The record has not been founded. Run the migrations.'); END IF;
  RETURN head;
END
$$;

CREATE FUNCTION ledger.append_(p_kind text, p_actor text, p_subject text, p_idem text, p_body text) RETURNS ledger.receipt LANGUAGE plpgsql
SET search_path = pg_catalog, pg_temp AS $$
DECLARE
  newest     ledger.head := ledger.lock_head();
  clock      timestamptz := clock_timestamp();
  moment     text;
  salt       bytea := ledger.new_salt();
  commitment text;
  envelope   text;
  leaf       bytea;
BEGIN
  PERFORM ledger.check_canonical(p_body);

  -- While the clock stands behind the newest entry all entries carry that entry's time; the first of them is preceded by a notice.
  IF newest.size > 0 AND newest.at::timestamptz - clock > interval '1 second' AND p_kind <> 'clock_anomaly'
     AND NOT EXISTS (SELECT FROM ledger.entry e WHERE e.kind = 'clock_anomaly' AND e.at = newest.at) THEN
    PERFORM ledger.append_('clock_anomaly', 'system', 'ledger', 'clock-anomaly-' || (newest.size + 1),
      format('{"clock":"%s","newest":"%s"}', to_char(clock AT TIME ZONE 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.US"Z"'), newest.at));
    SELECT * INTO newest FROM ledger.head;
  END IF;
  moment := greatest(to_char(clock AT TIME ZONE 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.US"Z"') COLLATE "C", newest.at);

  commitment := encode(sha256(convert_to(E'ebbmark/body/v1\n', 'UTF8') || salt || convert_to(p_body, 'UTF8')), 'hex');
  envelope := '{"actor":"' || p_actor || '","at":"' || moment || '","body":"' || commitment || '","idem":"' || p_idem || '","kind":"' || p_kind
    || '","prev":"' || encode(newest.hash, 'hex') || '","seq":' || (newest.size + 1) || ',"subject":"' || p_subject || '","v":1}';

  INSERT INTO ledger.entry (seq, envelope) VALUES (newest.size + 1, envelope) RETURNING hash INTO leaf;
  INSERT INTO ledger.body (seq, salt, bytes) VALUES (newest.size + 1, salt, p_body);
  UPDATE ledger.head SET size = newest.size + 1, hash = leaf, at = moment;
  RETURN ROW(newest.size + 1, moment, encode(leaf, 'hex'), commitment, false)::ledger.receipt;
END
$$;

-- The first receipt when this very act was already recorded; null when it was not; a refusal when the key was used for something else.
CREATE FUNCTION ledger.repeat_(p_kind text, p_actor text, p_subject text, p_idem text, p_body text) RETURNS ledger.receipt LANGUAGE plpgsql
SET search_path = pg_catalog, pg_temp AS $$
DECLARE
  entry ledger.entry;
BEGIN
  IF p_idem IS NULL OR p_idem !~ '^[A-Za-z0-9_-]{8,80}$' THEN
    PERFORM ledger.refuse('EB422', 'invalid-request', 'The idempotency key must be 8 to 80 letters, digits, hyphens or underscores.');
  END IF;
  SELECT * INTO entry FROM ledger.entry e WHERE e.idem = p_idem;
  IF NOT FOUND THEN RETURN NULL; END IF;
  IF (entry.kind, entry.actor, entry.subject) = (p_kind, p_actor, p_subject)
     AND EXISTS (SELECT FROM ledger.body b WHERE b.seq = entry.seq AND b.bytes = p_body) THEN
    RETURN ROW(entry.seq, entry.at, encode(entry.hash, 'hex'), entry.commitment, true)::ledger.receipt;
  END IF;
  PERFORM ledger.refuse('EB409', 'repeat-differs', format('This key was used for entry %s, which says something else.', entry.seq));
END
$$;

CREATE FUNCTION ledger.require_sign_login() RETURNS void LANGUAGE plpgsql
SET search_path = pg_catalog, pg_temp AS $$
BEGIN
  IF session_user <> 'eb_sign' THEN
    PERFORM ledger.refuse('EB403', 'not-allowed', 'Only the signing login adds entries.');
  END IF;
END
$$;

CREATE FUNCTION ledger.acting_person(p_actor uuid, p_roles text[]) RETURNS ledger.person LANGUAGE plpgsql
SET search_path = pg_catalog, pg_temp AS $$
DECLARE
  person ledger.person;
BEGIN
  SELECT * INTO person FROM ledger.person p WHERE p.id = p_actor;
  IF NOT FOUND THEN PERFORM ledger.refuse('EB403', 'not-allowed', 'There is no such person.'); END IF;
  IF NOT person.active THEN PERFORM ledger.refuse('EB403', 'account-disabled', format('%s is disabled.', person.badge)); END IF;
  IF NOT person.role = ANY (p_roles) THEN
    PERFORM ledger.refuse('EB403', 'not-allowed', format('%s is %s; this takes %s.', person.badge, person.role, array_to_string(p_roles, ' or ')));
  END IF;
  RETURN person;
END
$$;

-- Stored bytes go in by their own hash; the caller never names it.
CREATE FUNCTION ledger.put_content(p_media_type text, p_bytes bytea) RETURNS text LANGUAGE plpgsql SECURITY DEFINER
SET search_path = pg_catalog, pg_temp AS $$
BEGIN
  IF p_bytes IS NULL OR octet_length(p_bytes) = 0 THEN
    PERFORM ledger.refuse('EB422', 'invalid-request', 'There are no bytes to store.');
  END IF;
  INSERT INTO ledger.content (media_type, bytes) VALUES (p_media_type, p_bytes) ON CONFLICT (sha256) DO NOTHING;
  RETURN encode(sha256(p_bytes), 'hex');
END
$$;

-- First entry of all; called once, by the migrations.
CREATE FUNCTION ledger.found(p_origin text) RETURNS ledger.receipt LANGUAGE plpgsql SECURITY DEFINER
SET search_path = pg_catalog, pg_temp AS $$
BEGIN
  IF EXISTS (SELECT FROM ledger.origin) THEN PERFORM ledger.refuse('EB409', 'wrong-state', 'The record is founded already.'); END IF;
  INSERT INTO ledger.origin (origin) VALUES (p_origin);
  INSERT INTO ledger.head (size, hash, at) VALUES (0, sha256(convert_to(p_origin, 'UTF8')), '0001-01-01T00:00:00.000000Z');
  RETURN ledger.append_('genesis', 'system', 'ledger', 'genesis-1', format('{"format":"ebbmark-ledger/1","origin":"%s"}', p_origin));
END
$$;

-- Opening and closing of a window in which the structure may change.
CREATE FUNCTION ledger.record_ddl_window(p_window integer) RETURNS ledger.receipt LANGUAGE plpgsql SECURITY DEFINER
SET search_path = pg_catalog, pg_temp AS $$
DECLARE
  w   guard.ddl_window;
  act text;
BEGIN
  SELECT * INTO STRICT w FROM guard.ddl_window g WHERE g.id = p_window;
  act := CASE WHEN w.closed_at IS NULL THEN 'opened' ELSE 'closed' END;
  RETURN ledger.append_('ddl_window', 'system', 'ledger', format('ddl-window-%s-%s', w.id, act),
    format('{"act":"%s","login":%s,"reason":%s,"until":"%s","window":%s}', act, to_json(w.opened_by), to_json(w.reason),
      to_char(w.until AT TIME ZONE 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.US"Z"'), w.id));
END
$$;
