-- Signing, countersigning, returning and withdrawing. Each checks everything again: the application asked the same questions before, but
-- what stands in the record must not depend on it.

SET LOCAL check_function_bodies = off; -- the functions name tables of schema app, which is made later
SET LOCAL ROLE eb_vault;

CREATE FUNCTION ledger.is_signed(p_screening uuid, p_rev integer) RETURNS boolean LANGUAGE sql STABLE SECURITY DEFINER
SET search_path = pg_catalog, pg_temp AS $$
  SELECT EXISTS (SELECT FROM ledger.revision r WHERE r.screening_id = p_screening AND r.rev = p_rev);
$$;

CREATE FUNCTION ledger.record_name(p_screening uuid) RETURNS text LANGUAGE sql STABLE
SET search_path = pg_catalog, pg_temp AS $$
  SELECT 'SC-' || lpad(s.number::text, greatest(4, length(s.number::text)), '0') FROM app.screening s WHERE s.id = p_screening;
$$;

-- The person, once it is certain that they hold the role and belong to the screening's facility. Not a member looks like not there.
CREATE FUNCTION ledger.acting_member(p_actor uuid, p_screening uuid, p_roles text[]) RETURNS ledger.person LANGUAGE plpgsql
SET search_path = pg_catalog, pg_temp AS $$
DECLARE
  person ledger.person := ledger.acting_person(p_actor, p_roles);
BEGIN
  IF NOT EXISTS (
    SELECT FROM app.screening s JOIN app.section c ON c.id = s.section_id JOIN ledger.member m ON m.facility_id = c.facility_id
    WHERE s.id = p_screening AND m.person_id = p_actor) THEN
    PERFORM ledger.refuse('EB404', 'not-found', 'There is no such screening in a facility of this person.');
  END IF;
  RETURN person;
END
$$;

-- What every statement must say, held against what the database knows.
CREATE FUNCTION ledger.check_statement(
  p_body jsonb, p_act text, p_person ledger.person, p_screening uuid, p_rev integer, p_nonce text, p_method text, p_shown text
) RETURNS void LANGUAGE plpgsql
SET search_path = pg_catalog, pg_temp AS $$
DECLARE
  known jsonb := jsonb_build_object(
    'act', p_act,
    'authentication', jsonb_build_object('method', p_method),
    'nonce', p_nonce,
    'person', jsonb_build_object('badge', p_person.badge, 'id', p_person.id, 'printedName', p_person.printed_name, 'role', p_person.role),
    'screening', jsonb_build_object('id', p_screening, 'record', ledger.record_name(p_screening), 'rev', p_rev));
  key text;
BEGIN
  FOR key IN SELECT jsonb_object_keys(known) LOOP
    IF p_body -> key IS DISTINCT FROM known -> key THEN
      PERFORM ledger.refuse('EB422', 'invalid-request', format('"%s" of the statement is %s; the database knows %s.', key,
        coalesce((p_body -> key)::text, 'missing'), known -> key));
    END IF;
  END LOOP;
  IF coalesce(p_body ->> 'meaning', '') = '' THEN
    PERFORM ledger.refuse('EB422', 'invalid-request', 'The statement does not say what the signature means.');
  END IF;
  IF p_body #>> '{content,sha256}' IS DISTINCT FROM p_shown THEN
    PERFORM ledger.refuse('EB412', 'content-changed', 'The statement names other content than the one that was shown.');
  END IF;
END
$$;

-- Each caution that stands with the record must be in the statement, in the words shown.
CREATE FUNCTION ledger.check_cautions(p_body jsonb, p_content jsonb) RETURNS void LANGUAGE plpgsql
SET search_path = pg_catalog, pg_temp AS $$
BEGIN
  IF jsonb_typeof(p_content -> 'cautions') IS DISTINCT FROM 'array' OR jsonb_array_length(p_content -> 'cautions') = 0
     OR p_body -> 'cautions' IS DISTINCT FROM p_content -> 'cautions' THEN
    PERFORM ledger.refuse('EB422', 'invalid-request', 'The cautions acknowledged are not the cautions that stand with the record.');
  END IF;
END
$$;

-- Uses up the open signing page: right person, revision, act and hash, credential given again, not expired, not used. Returns the method.
CREATE FUNCTION ledger.use_ceremony(
  p_nonce text, p_idem text, p_actor uuid, p_screening uuid, p_rev integer, p_act text, p_shown text
) RETURNS text LANGUAGE plpgsql
SET search_path = pg_catalog, pg_temp AS $$
DECLARE
  open app.ceremony;
BEGIN
  SELECT * INTO open FROM app.ceremony c WHERE c.nonce = p_nonce FOR UPDATE;
  IF NOT FOUND OR open.proved_at IS NULL OR open.used_at IS NOT NULL OR open.expires_at <= clock_timestamp()
     OR (open.idempotency_key, open.person_id, open.screening_id, open.rev, open.act)
        IS DISTINCT FROM (p_idem, p_actor, p_screening, p_rev, p_act) THEN
    PERFORM ledger.refuse('EB410', 'ceremony-expired', 'No open signing page fits: it expired, was used, or belongs to another person, record or act.');
  END IF;
  IF open.shown_sha256 <> p_shown THEN
    PERFORM ledger.refuse('EB412', 'content-changed', 'The signing page showed other content.');
  END IF;
  UPDATE app.ceremony SET used_at = clock_timestamp() WHERE nonce = p_nonce;
  RETURN open.method;
END
$$;

-- Mail that tells of the entry, filed with it. {{seq}}, {{at}} and {{leaf}} become the receipt's.
CREATE FUNCTION ledger.file_mail(p_mail jsonb, p_receipt ledger.receipt) RETURNS void LANGUAGE plpgsql
SET search_path = pg_catalog, pg_temp AS $$
DECLARE
  installation text := (SELECT split_part(substr(o.origin, 9), '/', 1) FROM ledger.origin o);
BEGIN
  IF jsonb_typeof(p_mail) <> 'array' OR jsonb_array_length(p_mail) > 50 THEN
    PERFORM ledger.refuse('EB422', 'invalid-request', 'Mail must be a list of at most 50 messages.');
  END IF;
  INSERT INTO app.outbox (message_id, "to", subject, text, html)
  SELECT format('<entry-%s-%s-%s@%s>', p_receipt.seq, m.ordinality, left(p_receipt.leaf, 16), installation),
    m.value ->> 'to', filled.subject, filled.text, filled.html
  FROM jsonb_array_elements(p_mail) WITH ORDINALITY m,
    LATERAL (SELECT
      replace(replace(replace(m.value ->> 'subject', '{{seq}}', p_receipt.seq::text), '{{at}}', p_receipt.at), '{{leaf}}', p_receipt.leaf) AS subject,
      replace(replace(replace(m.value ->> 'text', '{{seq}}', p_receipt.seq::text), '{{at}}', p_receipt.at), '{{leaf}}', p_receipt.leaf) AS text,
      replace(replace(replace(m.value ->> 'html', '{{seq}}', p_receipt.seq::text), '{{at}}', p_receipt.at), '{{leaf}}', p_receipt.leaf) AS html
    ) filled;
END
$$;

CREATE FUNCTION ledger.sign(
  p_actor uuid, p_screening uuid, p_rev integer, p_nonce text, p_idem text, p_shown text, p_body text, p_mail jsonb DEFAULT '[]'
) RETURNS ledger.receipt LANGUAGE plpgsql SECURITY DEFINER
SET search_path = pg_catalog, pg_temp AS $$
DECLARE
  subject text := 'screening:' || p_screening || ':' || p_rev;
  body    jsonb;
  content jsonb;
  person  ledger.person;
  draft   app.draft;
  hands   uuid[];
  last    ledger.revision;
  method  text;
  receipt ledger.receipt;
BEGIN
  PERFORM ledger.require_sign_login();
  PERFORM ledger.lock_head();
  receipt := ledger.repeat_('screening_signed', p_actor::text, subject, p_idem, p_body);
  IF receipt.seq IS NOT NULL THEN RETURN receipt; END IF;

  body := ledger.check_canonical(p_body);
  person := ledger.acting_member(p_actor, p_screening, ARRAY['engineer']);
  IF ledger.is_signed(p_screening, p_rev) THEN
    PERFORM ledger.refuse('EB409', 'wrong-state', 'This revision is signed already.');
  END IF;

  SELECT * INTO draft FROM app.draft d WHERE d.screening_id = p_screening AND d.rev = p_rev FOR UPDATE;
  IF NOT FOUND THEN PERFORM ledger.refuse('EB404', 'not-found', 'There is no such draft.'); END IF;
  IF draft.prepared_version IS DISTINCT FROM draft.version THEN
    PERFORM ledger.refuse('EB409', 'not-computed', 'The draft has changed since it was computed.');
  END IF;
  IF draft.prepared_sha256 IS DISTINCT FROM p_shown THEN
    PERFORM ledger.refuse('EB412', 'content-changed', 'The draft was computed again after the signing page was opened.');
  END IF;

  SELECT array_agg(DISTINCT h ORDER BY h) INTO hands FROM unnest(draft.contributors || draft.author_id) h;
  IF NOT p_actor = ANY (hands) THEN
    PERFORM ledger.refuse('EB403', 'not-allowed', 'Only somebody who worked on this revision signs it.');
  END IF;
  IF body -> 'contributors' IS DISTINCT FROM to_jsonb(hands) THEN
    PERFORM ledger.refuse('EB422', 'invalid-request', 'The contributors named are not those of the draft, in order of id.');
  END IF;

  SELECT * INTO last FROM ledger.revision r WHERE r.screening_id = p_screening ORDER BY r.rev DESC LIMIT 1;
  IF p_rev <> coalesce(last.rev, 0) + 1 THEN
    PERFORM ledger.refuse('EB409', 'wrong-state', format('The next revision to sign is %s.', coalesce(last.rev, 0) + 1));
  END IF;
  IF body -> 'replaces' IS DISTINCT FROM (CASE WHEN last.rev IS NULL THEN 'null'::jsonb ELSE
       jsonb_build_object('contentSha256', last.content_sha256, 'reason', draft.reason, 'rev', last.rev) END) THEN
    PERFORM ledger.refuse('EB422', 'invalid-request', 'The statement must name the revision it replaces, its content and the reason.');
  END IF;

  SELECT convert_from(c.bytes, 'UTF8')::jsonb INTO content FROM ledger.content c WHERE c.sha256 = p_shown;
  IF NOT FOUND THEN PERFORM ledger.refuse('EB412', 'content-changed', 'The content is not stored.'); END IF;
  IF content ->> 'record' IS DISTINCT FROM ledger.record_name(p_screening) OR (content ->> 'rev')::integer IS DISTINCT FROM p_rev THEN
    PERFORM ledger.refuse('EB412', 'content-changed', 'The content belongs to another record or revision.');
  END IF;
  IF EXISTS (
    SELECT FROM jsonb_array_elements(content -> 'cases') c,
      LATERAL (VALUES (c ->> 'caseSha256'), (c ->> 'resultSha256'), (c ->> 'confirmationSha256')) named (sha256)
    WHERE named.sha256 IS NULL OR NOT EXISTS (SELECT FROM ledger.content s WHERE s.sha256 = named.sha256)) THEN
    PERFORM ledger.refuse('EB412', 'content-changed', 'A case, result or confirmation run named in the content is not stored.');
  END IF;
  PERFORM ledger.check_cautions(body, content);

  method := ledger.use_ceremony(p_nonce, p_idem, p_actor, p_screening, p_rev, 'sign', p_shown);
  PERFORM ledger.check_statement(body, 'sign', person, p_screening, p_rev, p_nonce, method, p_shown);

  receipt := ledger.append_('screening_signed', p_actor::text, subject, p_idem, p_body);
  INSERT INTO ledger.revision (screening_id, rev, state, author, contributors, content_sha256, signed_seq)
  VALUES (p_screening, p_rev, 'signed', p_actor, hands, p_shown, receipt.seq);
  PERFORM ledger.file_mail(p_mail, receipt);
  RETURN receipt;
END
$$;

-- The revision a second person is about to decide on, once it is certain that they may.
CREATE FUNCTION ledger.revision_to_decide(p_person ledger.person, p_screening uuid, p_rev integer, p_shown text, p_body jsonb)
RETURNS ledger.revision LANGUAGE plpgsql
SET search_path = pg_catalog, pg_temp AS $$
DECLARE
  revision ledger.revision;
BEGIN
  SELECT * INTO revision FROM ledger.revision r WHERE r.screening_id = p_screening AND r.rev = p_rev;
  IF NOT FOUND THEN PERFORM ledger.refuse('EB404', 'not-found', 'There is no such signed revision.'); END IF;
  IF p_person.id = revision.author OR p_person.id = ANY (revision.contributors) THEN
    PERFORM ledger.refuse('EB403', 'own-work', format('%s had a hand in this revision.', p_person.badge));
  END IF;
  IF revision.state IN ('countersigned', 'returned') THEN
    PERFORM ledger.refuse('EB409', 'already-decided', format('This revision was %s by entry %s.', revision.state, revision.decided_seq));
  END IF;
  IF revision.state <> 'signed' THEN
    PERFORM ledger.refuse('EB409', 'wrong-state', format('This revision is %s.', revision.state));
  END IF;
  IF revision.content_sha256 IS DISTINCT FROM p_shown THEN
    PERFORM ledger.refuse('EB412', 'content-changed', 'Other content was signed than was shown.');
  END IF;
  IF p_body -> 'signed' IS DISTINCT FROM (
       SELECT jsonb_build_object('leaf', encode(e.hash, 'hex'), 'seq', e.seq) FROM ledger.entry e WHERE e.seq = revision.signed_seq) THEN
    PERFORM ledger.refuse('EB422', 'invalid-request', 'The statement must name the entry of the signature it decides on.');
  END IF;
  RETURN revision;
END
$$;

CREATE FUNCTION ledger.countersign(
  p_actor uuid, p_screening uuid, p_rev integer, p_nonce text, p_idem text, p_shown text, p_body text, p_mail jsonb DEFAULT '[]'
) RETURNS ledger.receipt LANGUAGE plpgsql SECURITY DEFINER
SET search_path = pg_catalog, pg_temp AS $$
DECLARE
  subject text := 'screening:' || p_screening || ':' || p_rev;
  body    jsonb;
  person  ledger.person;
  method  text;
  older   ledger.revision;
  receipt ledger.receipt;
  closing ledger.receipt;
BEGIN
  PERFORM ledger.require_sign_login();
  PERFORM ledger.lock_head();
  receipt := ledger.repeat_('screening_countersigned', p_actor::text, subject, p_idem, p_body);
  IF receipt.seq IS NOT NULL THEN RETURN receipt; END IF;

  body := ledger.check_canonical(p_body);
  person := ledger.acting_member(p_actor, p_screening, ARRAY['approver']);
  PERFORM ledger.revision_to_decide(person, p_screening, p_rev, p_shown, body);
  IF jsonb_typeof(body -> 'conditions') IS DISTINCT FROM 'array' THEN
    PERFORM ledger.refuse('EB422', 'invalid-request', 'The statement must list the conditions, if only as an empty list.');
  END IF;
  PERFORM ledger.check_cautions(body, (SELECT convert_from(c.bytes, 'UTF8')::jsonb FROM ledger.content c WHERE c.sha256 = p_shown));
  method := ledger.use_ceremony(p_nonce, p_idem, p_actor, p_screening, p_rev, 'countersign', p_shown);
  PERFORM ledger.check_statement(body, 'countersign', person, p_screening, p_rev, p_nonce, method, p_shown);

  receipt := ledger.append_('screening_countersigned', p_actor::text, subject, p_idem, p_body);
  UPDATE ledger.revision SET state = 'countersigned', decided_by = p_actor, decided_seq = receipt.seq
  WHERE screening_id = p_screening AND rev = p_rev;

  FOR older IN
    SELECT * FROM ledger.revision r
    WHERE r.screening_id = p_screening AND r.rev < p_rev AND r.state IN ('signed', 'countersigned', 'returned') ORDER BY r.rev
  LOOP
    closing := ledger.append_('screening_superseded', p_actor::text, 'screening:' || p_screening || ':' || older.rev,
      p_idem || '.superseded.' || older.rev, format('{"act":"supersede","by":{"rev":%s,"seq":%s},"screening":{"id":"%s","record":"%s","rev":%s}}',
        p_rev, receipt.seq, p_screening, ledger.record_name(p_screening), older.rev));
    UPDATE ledger.revision SET state = 'superseded', closed_seq = closing.seq WHERE screening_id = p_screening AND rev = older.rev;
  END LOOP;

  PERFORM ledger.file_mail(p_mail, receipt);
  RETURN receipt;
END
$$;

CREATE FUNCTION ledger.return_(
  p_actor uuid, p_screening uuid, p_rev integer, p_nonce text, p_idem text, p_shown text, p_body text, p_mail jsonb DEFAULT '[]'
) RETURNS ledger.receipt LANGUAGE plpgsql SECURITY DEFINER
SET search_path = pg_catalog, pg_temp AS $$
DECLARE
  subject text := 'screening:' || p_screening || ':' || p_rev;
  body    jsonb;
  person  ledger.person;
  method  text;
  receipt ledger.receipt;
BEGIN
  PERFORM ledger.require_sign_login();
  PERFORM ledger.lock_head();
  receipt := ledger.repeat_('screening_returned', p_actor::text, subject, p_idem, p_body);
  IF receipt.seq IS NOT NULL THEN RETURN receipt; END IF;

  body := ledger.check_canonical(p_body);
  person := ledger.acting_member(p_actor, p_screening, ARRAY['approver']);
  PERFORM ledger.revision_to_decide(person, p_screening, p_rev, p_shown, body);
  IF jsonb_typeof(body -> 'remarks') IS DISTINCT FROM 'array' OR jsonb_array_length(body -> 'remarks') = 0
     OR EXISTS (SELECT FROM jsonb_array_elements(body -> 'remarks') r
                WHERE coalesce(btrim(r ->> 'text'), '') = '' OR coalesce(r ->> 'line', '') = '') THEN
    PERFORM ledger.refuse('EB422', 'invalid-request', 'A return needs at least one remark, each tied to a line and saying something.');
  END IF;
  method := ledger.use_ceremony(p_nonce, p_idem, p_actor, p_screening, p_rev, 'return', p_shown);
  PERFORM ledger.check_statement(body, 'return', person, p_screening, p_rev, p_nonce, method, p_shown);

  receipt := ledger.append_('screening_returned', p_actor::text, subject, p_idem, p_body);
  UPDATE ledger.revision SET state = 'returned', decided_by = p_actor, decided_seq = receipt.seq
  WHERE screening_id = p_screening AND rev = p_rev;
  INSERT INTO app.remark (screening_id, rev, line, text, author_id, entry_seq)
  SELECT p_screening, p_rev, r ->> 'line', r ->> 'text', p_actor, receipt.seq FROM jsonb_array_elements(body -> 'remarks') r;
  PERFORM ledger.file_mail(p_mail, receipt);
  RETURN receipt;
END
$$;

-- An author takes back what nobody has decided yet; an approver withdraws what was countersigned. Both give a reason.
CREATE FUNCTION ledger.withdraw(
  p_actor uuid, p_screening uuid, p_rev integer, p_nonce text, p_idem text, p_shown text, p_body text, p_mail jsonb DEFAULT '[]'
) RETURNS ledger.receipt LANGUAGE plpgsql SECURITY DEFINER
SET search_path = pg_catalog, pg_temp AS $$
DECLARE
  subject  text := 'screening:' || p_screening || ':' || p_rev;
  body     jsonb;
  person   ledger.person;
  revision ledger.revision;
  method   text;
  receipt  ledger.receipt;
BEGIN
  PERFORM ledger.require_sign_login();
  PERFORM ledger.lock_head();
  receipt := ledger.repeat_('screening_withdrawn', p_actor::text, subject, p_idem, p_body);
  IF receipt.seq IS NOT NULL THEN RETURN receipt; END IF;

  body := ledger.check_canonical(p_body);
  person := ledger.acting_member(p_actor, p_screening, ARRAY['engineer', 'approver']);
  SELECT * INTO revision FROM ledger.revision r WHERE r.screening_id = p_screening AND r.rev = p_rev;
  IF NOT FOUND THEN PERFORM ledger.refuse('EB404', 'not-found', 'There is no such signed revision.'); END IF;
  IF revision.state NOT IN ('signed', 'countersigned') THEN
    PERFORM ledger.refuse('EB409', 'wrong-state', format('This revision is %s.', revision.state));
  END IF;
  IF NOT ((revision.state = 'signed' AND revision.author = p_actor) OR (revision.state = 'countersigned' AND person.role = 'approver')) THEN
    PERFORM ledger.refuse('EB403', 'not-allowed', 'A signed revision is withdrawn by its author, a countersigned one by an approver.');
  END IF;
  IF revision.content_sha256 IS DISTINCT FROM p_shown THEN
    PERFORM ledger.refuse('EB412', 'content-changed', 'Other content was signed than was shown.');
  END IF;
  IF coalesce(btrim(body ->> 'reason'), '') = '' THEN
    PERFORM ledger.refuse('EB422', 'invalid-request', 'A withdrawal needs a reason.');
  END IF;
  method := ledger.use_ceremony(p_nonce, p_idem, p_actor, p_screening, p_rev, 'withdraw', p_shown);
  PERFORM ledger.check_statement(body, 'withdraw', person, p_screening, p_rev, p_nonce, method, p_shown);

  receipt := ledger.append_('screening_withdrawn', p_actor::text, subject, p_idem, p_body);
  UPDATE ledger.revision SET state = 'withdrawn', closed_seq = receipt.seq WHERE screening_id = p_screening AND rev = p_rev;
  PERFORM ledger.file_mail(p_mail, receipt);
  RETURN receipt;
END
$$;
