-- People, roles, memberships and the other events. The tables of people are moved by the same function that files the entry.

SET LOCAL check_function_bodies = off; -- the functions name tables of schema app, which is made later
SET LOCAL ROLE eb_vault;

CREATE FUNCTION ledger.check_two_person(p_body jsonb) RETURNS boolean LANGUAGE plpgsql
SET search_path = pg_catalog, pg_temp AS $$
DECLARE
  bound boolean := (SELECT count(*) >= 2 FROM ledger.person p WHERE p.role = 'administrator' AND p.active);
BEGIN
  IF p_body -> 'twoPersonRule' IS DISTINCT FROM to_jsonb(CASE WHEN bound THEN 'bound' ELSE 'not yet bound: one administrator' END) THEN
    PERFORM ledger.refuse('EB409', 'wrong-state', CASE WHEN bound THEN 'Two administrators exist, so the two-person rule is bound.'
      ELSE 'Only one administrator exists; the entry must say that the two-person rule is not yet bound.' END);
  END IF;
  RETURN bound;
END
$$;

CREATE FUNCTION ledger.subject_fits(p_noun text, p_subject text) RETURNS boolean LANGUAGE sql IMMUTABLE
SET search_path = pg_catalog, pg_temp AS $$
  SELECT p_subject ~ ('^' || CASE p_noun
    WHEN 'ledger' THEN 'ledger'
    WHEN 'screening' THEN 'screening:[0-9a-f-]{36}:[1-9][0-9]{0,8}'
    WHEN 'person' THEN 'person:[0-9a-f-]{36}'
    WHEN 'member' THEN 'member:[0-9a-f-]{36}:[0-9a-f-]{36}'
    WHEN 'facility' THEN 'facility:[0-9a-f-]{36}'
    WHEN 'engine' THEN 'engine:[A-Za-z0-9._-]{1,80}' END || '$');
$$;

CREATE FUNCTION ledger.record_event(
  p_actor text, p_kind text, p_subject text, p_idem text, p_body text, p_mail jsonb DEFAULT '[]'
) RETURNS ledger.receipt LANGUAGE plpgsql SECURITY DEFINER
SET search_path = pg_catalog, pg_temp AS $$
DECLARE
  kind     ledger.kind;
  body     jsonb;
  target   ledger.person;
  person   ledger.person;
  proposal ledger.role_proposal;
  about    uuid;
  place    uuid;
  bound    boolean;
  receipt  ledger.receipt;
BEGIN
  PERFORM ledger.require_sign_login();
  PERFORM ledger.lock_head();
  SELECT * INTO kind FROM ledger.kind k WHERE k.kind = p_kind AND k.via = 'event';
  IF NOT FOUND THEN PERFORM ledger.refuse('EB422', 'invalid-request', 'There is no such kind of event.'); END IF;
  IF NOT coalesce(ledger.subject_fits(kind.noun, p_subject), false) THEN
    PERFORM ledger.refuse('EB422', 'invalid-request', format('The subject of %s must name a %s.', p_kind, kind.noun));
  END IF;
  receipt := ledger.repeat_(p_kind, p_actor, p_subject, p_idem, p_body);
  IF receipt.seq IS NOT NULL THEN RETURN receipt; END IF;

  body := ledger.check_canonical(p_body);
  IF p_actor = 'system' THEN
    -- The first administrator is enrolled by the installation itself, and nobody else is.
    IF NOT 'system' = ANY (kind.roles)
       OR (p_kind = 'person_enrolled' AND (EXISTS (SELECT FROM ledger.person) OR body ->> 'role' IS DISTINCT FROM 'administrator')) THEN
      PERFORM ledger.refuse('EB403', 'not-allowed', format('The installation itself may not add %s.', p_kind));
    END IF;
  ELSE
    person := ledger.acting_person(p_actor::uuid, kind.roles);
  END IF;

  IF p_kind IN ('person_enrolled', 'role_proposed', 'role_confirmed')
     AND coalesce(body ->> 'role', '') NOT IN ('engineer', 'approver', 'auditor', 'administrator') THEN
    PERFORM ledger.refuse('EB422', 'invalid-request', 'The role must be engineer, approver, auditor or administrator.');
  END IF;
  IF p_kind = 'person_enrolled' AND (coalesce(body ->> 'badge', '') !~ '^[A-Z]{1,3}-[0-9]{1,5}$'
     OR length(coalesce(btrim(body ->> 'printedName'), '')) NOT BETWEEN 1 AND 80) THEN
    PERFORM ledger.refuse('EB422', 'invalid-request', 'A badge looks like E-114, and the printed name has 1 to 80 characters.');
  END IF;

  IF kind.noun IN ('person', 'member') THEN
    about := split_part(p_subject, ':', CASE kind.noun WHEN 'person' THEN 2 ELSE 3 END)::uuid;
    IF about = person.id THEN PERFORM ledger.refuse('EB403', 'not-allowed', 'Nobody changes their own account, role or membership.'); END IF;
    SELECT * INTO target FROM ledger.person p WHERE p.id = about;
    IF p_kind = 'person_enrolled' THEN
      IF FOUND OR EXISTS (SELECT FROM ledger.person p WHERE p.badge = body ->> 'badge') THEN
        PERFORM ledger.refuse('EB409', 'already-exists', format('There is a person with badge %s already.', body ->> 'badge'));
      END IF;
    ELSIF NOT FOUND THEN
      PERFORM ledger.refuse('EB404', 'not-found', 'There is no such person.');
    ELSIF body ->> 'badge' IS DISTINCT FROM target.badge THEN
      PERFORM ledger.refuse('EB422', 'invalid-request', 'The body names another badge than the subject has.');
    END IF;
  END IF;
  IF kind.noun IN ('facility', 'member') THEN
    place := split_part(p_subject, ':', 2)::uuid;
    IF NOT EXISTS (SELECT FROM app.facility f WHERE f.id = place) THEN PERFORM ledger.refuse('EB404', 'not-found', 'There is no such facility.'); END IF;
  END IF;
  IF kind.noun = 'screening' THEN
    IF NOT ledger.is_signed(split_part(p_subject, ':', 2)::uuid, split_part(p_subject, ':', 3)::integer) THEN
      PERFORM ledger.refuse('EB404', 'not-found', 'There is no such signed revision.');
    END IF;
    IF person.role IN ('engineer', 'approver') THEN
      PERFORM ledger.acting_member(person.id, split_part(p_subject, ':', 2)::uuid, kind.roles);
    END IF;
  END IF;

  CASE p_kind
    WHEN 'person_enrolled' THEN
      receipt := ledger.append_(p_kind, p_actor, p_subject, p_idem, p_body);
      INSERT INTO ledger.person (id, badge, printed_name, role, active, changed_seq)
      VALUES (about, body ->> 'badge', body ->> 'printedName', body ->> 'role', true, receipt.seq);
    WHEN 'person_disabled', 'person_reenabled' THEN
      IF target.active = (p_kind = 'person_reenabled') THEN
        PERFORM ledger.refuse('EB409', 'wrong-state', format('%s is %s already.', target.badge, CASE WHEN target.active THEN 'active' ELSE 'disabled' END));
      END IF;
      IF coalesce(btrim(body ->> 'reason'), '') = '' THEN PERFORM ledger.refuse('EB422', 'invalid-request', 'A reason is needed.'); END IF;
      receipt := ledger.append_(p_kind, p_actor, p_subject, p_idem, p_body);
      UPDATE ledger.person SET active = (p_kind = 'person_reenabled'), changed_seq = receipt.seq WHERE id = about;
    WHEN 'role_proposed' THEN
      PERFORM ledger.check_two_person(body);
      IF body ->> 'role' = target.role THEN PERFORM ledger.refuse('EB409', 'wrong-state', format('%s is %s already.', target.badge, target.role)); END IF;
      IF coalesce(btrim(body ->> 'reason'), '') = '' THEN PERFORM ledger.refuse('EB422', 'invalid-request', 'A reason is needed.'); END IF;
      receipt := ledger.append_(p_kind, p_actor, p_subject, p_idem, p_body);
      INSERT INTO ledger.role_proposal (seq, person_id, role, proposed_by) VALUES (receipt.seq, about, body ->> 'role', person.id);
    WHEN 'role_confirmed' THEN
      bound := ledger.check_two_person(body);
      SELECT * INTO proposal FROM ledger.role_proposal r WHERE r.person_id = about ORDER BY r.seq DESC LIMIT 1;
      IF NOT FOUND OR proposal.confirmed_seq IS NOT NULL OR body ->> 'role' IS DISTINCT FROM proposal.role
         OR body -> 'proposed' IS DISTINCT FROM to_jsonb(proposal.seq) THEN
        PERFORM ledger.refuse('EB409', 'wrong-state', 'There is no such open proposal.');
      END IF;
      IF clock_timestamp() > (SELECT e.at::timestamptz + interval '7 days' FROM ledger.entry e WHERE e.seq = proposal.seq) THEN
        PERFORM ledger.refuse('EB409', 'wrong-state', 'The proposal lapsed after 7 days. Propose the change again.');
      END IF;
      IF bound AND proposal.proposed_by = person.id THEN
        PERFORM ledger.refuse('EB403', 'own-work', 'A change of role takes two administrators; this one proposed it.');
      END IF;
      receipt := ledger.append_(p_kind, p_actor, p_subject, p_idem, p_body);
      UPDATE ledger.role_proposal SET confirmed_seq = receipt.seq WHERE seq = proposal.seq;
      UPDATE ledger.person SET role = proposal.role, changed_seq = receipt.seq WHERE id = about;
    WHEN 'member_added' THEN
      IF EXISTS (SELECT FROM ledger.member m WHERE m.facility_id = place AND m.person_id = about) THEN
        PERFORM ledger.refuse('EB409', 'already-exists', format('%s belongs to this facility already.', target.badge));
      END IF;
      receipt := ledger.append_(p_kind, p_actor, p_subject, p_idem, p_body);
      INSERT INTO ledger.membership (facility_id, person_id, added_seq) VALUES (place, about, receipt.seq);
    WHEN 'member_removed' THEN
      IF NOT EXISTS (SELECT FROM ledger.member m WHERE m.facility_id = place AND m.person_id = about) THEN
        PERFORM ledger.refuse('EB409', 'wrong-state', format('%s does not belong to this facility.', target.badge));
      END IF;
      receipt := ledger.append_(p_kind, p_actor, p_subject, p_idem, p_body);
      UPDATE ledger.membership SET removed_seq = receipt.seq WHERE facility_id = place AND person_id = about AND removed_seq IS NULL;
    ELSE
      receipt := ledger.append_(p_kind, p_actor, p_subject, p_idem, p_body);
  END CASE;
  PERFORM ledger.file_mail(p_mail, receipt);
  RETURN receipt;
END
$$;
