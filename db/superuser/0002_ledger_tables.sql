-- The record. Owned by the vault role, which nobody can log in as or become.

CREATE SCHEMA ledger AUTHORIZATION eb_vault;
SET LOCAL ROLE eb_vault;
ALTER DEFAULT PRIVILEGES FOR ROLE eb_vault REVOKE EXECUTE ON FUNCTIONS FROM PUBLIC;

-- Every kind an entry may have, what its subject names, whose role may cause it, and the function it comes through.
CREATE TABLE ledger.kind (
  kind    text COLLATE "C" PRIMARY KEY,
  noun    text NOT NULL CHECK (noun IN ('ledger', 'screening', 'person', 'member', 'facility', 'engine')),
  roles   text[] NOT NULL,
  via     text NOT NULL CHECK (via IN ('sign', 'countersign', 'return', 'withdraw', 'event', 'database'))
);

INSERT INTO ledger.kind (kind, noun, roles, via) VALUES
  ('genesis',                 'ledger',    '{}',                                    'database'),
  ('ddl_window',              'ledger',    '{}',                                    'database'),
  ('clock_anomaly',           'ledger',    '{}',                                    'database'),
  ('screening_signed',        'screening', '{engineer}',                            'sign'),
  ('screening_countersigned', 'screening', '{approver}',                            'countersign'),
  ('screening_superseded',    'screening', '{approver}',                            'countersign'),
  ('screening_returned',      'screening', '{approver}',                            'return'),
  ('screening_withdrawn',     'screening', '{engineer,approver}',                   'withdraw'),
  ('second_look_done',        'screening', '{approver}',                            'event'),
  ('replay_result',           'screening', '{engineer,approver,auditor,system}',    'event'),
  ('export_made',             'screening', '{engineer,approver,auditor}',           'event'),
  ('person_enrolled',         'person',    '{administrator,system}',                'event'),
  ('person_disabled',         'person',    '{administrator}',                       'event'),
  ('person_reenabled',        'person',    '{administrator}',                       'event'),
  ('role_proposed',           'person',    '{administrator}',                       'event'),
  ('role_confirmed',          'person',    '{administrator}',                       'event'),
  ('member_added',            'member',    '{administrator}',                       'event'),
  ('member_removed',          'member',    '{administrator}',                       'event'),
  ('policy_changed',          'facility',  '{administrator}',                       'event'),
  ('engine_registered',       'engine',    '{administrator,system}',                'event'),
  ('security_digest',         'ledger',    '{system}',                              'event');

CREATE TABLE ledger.origin (
  one    boolean PRIMARY KEY DEFAULT true CHECK (one),
  origin text NOT NULL CHECK (origin ~ '^ebbmark\.[a-z0-9][a-z0-9.-]{0,62}/ledger$')
);

CREATE TABLE ledger.head (
  one  boolean PRIMARY KEY DEFAULT true CHECK (one),
  size bigint NOT NULL CHECK (size >= 0),
  hash bytea NOT NULL CHECK (octet_length(hash) = 32),
  at   text COLLATE "C" NOT NULL
);

-- The character classes make the concatenation of an envelope canonical by construction; everything else is generated from it.
CREATE TABLE ledger.entry (
  seq        bigint PRIMARY KEY CHECK (seq BETWEEN 1 AND 9007199254740991),
  envelope   text COLLATE "C" NOT NULL CHECK (envelope ~ (
               '^\{"actor":"([0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}|system)"'
            || ',"at":"[0-9]{4}-[0-9]{2}-[0-9]{2}T[0-9]{2}:[0-9]{2}:[0-9]{2}\.[0-9]{6}Z"'
            || ',"body":"[0-9a-f]{64}"'
            || ',"idem":"[A-Za-z0-9._:-]{8,120}"'
            || ',"kind":"[a-z][a-z_]{2,39}"'
            || ',"prev":"[0-9a-f]{64}"'
            || ',"seq":[1-9][0-9]{0,15}'
            || ',"subject":"[a-z]+(:[A-Za-z0-9._-]{1,80}){0,3}"'
            || ',"v":1\}$')),
  hash       bytea NOT NULL UNIQUE GENERATED ALWAYS AS (sha256('\x00'::bytea || decode(envelope, 'escape'))) STORED,
  kind       text COLLATE "C" NOT NULL REFERENCES ledger.kind GENERATED ALWAYS AS (envelope::jsonb ->> 'kind') STORED,
  actor      text COLLATE "C" NOT NULL GENERATED ALWAYS AS (envelope::jsonb ->> 'actor') STORED,
  subject    text COLLATE "C" NOT NULL GENERATED ALWAYS AS (envelope::jsonb ->> 'subject') STORED,
  subject_id text COLLATE "C" NOT NULL GENERATED ALWAYS AS (split_part(envelope::jsonb ->> 'subject', ':', 2)) STORED,
  at         text COLLATE "C" NOT NULL GENERATED ALWAYS AS (envelope::jsonb ->> 'at') STORED,
  idem       text COLLATE "C" NOT NULL UNIQUE GENERATED ALWAYS AS (envelope::jsonb ->> 'idem') STORED,
  -- Unique: no two entries can follow the same one, so the chain can't fork even without the head lock.
  prev       text COLLATE "C" NOT NULL UNIQUE GENERATED ALWAYS AS (envelope::jsonb ->> 'prev') STORED,
  commitment text COLLATE "C" NOT NULL GENERATED ALWAYS AS (envelope::jsonb ->> 'body') STORED,
  CHECK ((envelope::jsonb ->> 'seq')::bigint = seq)
);
CREATE INDEX entry_by_subject ON ledger.entry (subject_id, seq DESC);
CREATE INDEX entry_by_actor ON ledger.entry (actor, seq DESC);
CREATE INDEX entry_by_kind ON ledger.entry (kind, seq DESC);
CREATE INDEX entry_by_time ON ledger.entry (at, seq DESC);

CREATE TABLE ledger.body (
  seq   bigint PRIMARY KEY REFERENCES ledger.entry,
  salt  bytea CHECK (octet_length(salt) = 32),
  bytes text COLLATE "C" CHECK (octet_length(bytes) <= 1048576),
  CHECK ((salt IS NULL) = (bytes IS NULL))
);

CREATE TABLE ledger.content (
  sha256     text COLLATE "C" PRIMARY KEY GENERATED ALWAYS AS (encode(sha256(bytes), 'hex')) STORED,
  media_type text NOT NULL CHECK (media_type ~ '^[a-z]+/[a-z0-9.+-]{1,80}$'),
  bytes      bytea NOT NULL CHECK (octet_length(bytes) <= 67108864)
);

CREATE TABLE ledger.person (
  id           uuid PRIMARY KEY,
  badge        text NOT NULL UNIQUE CHECK (badge ~ '^[A-Z]{1,3}-[0-9]{1,5}$'),
  printed_name text NOT NULL CHECK (length(printed_name) BETWEEN 1 AND 80),
  role         text NOT NULL CHECK (role IN ('engineer', 'approver', 'auditor', 'administrator')),
  active       boolean NOT NULL,
  changed_seq  bigint NOT NULL REFERENCES ledger.entry
);

CREATE TABLE ledger.membership (
  facility_id uuid NOT NULL,
  person_id   uuid NOT NULL REFERENCES ledger.person,
  added_seq   bigint NOT NULL REFERENCES ledger.entry,
  removed_seq bigint REFERENCES ledger.entry,
  PRIMARY KEY (facility_id, person_id, added_seq)
);
CREATE UNIQUE INDEX membership_open ON ledger.membership (person_id, facility_id) WHERE removed_seq IS NULL;
CREATE VIEW ledger.member AS SELECT facility_id, person_id FROM ledger.membership WHERE removed_seq IS NULL;

CREATE TABLE ledger.role_proposal (
  seq           bigint PRIMARY KEY REFERENCES ledger.entry,
  person_id     uuid NOT NULL REFERENCES ledger.person,
  role          text NOT NULL CHECK (role IN ('engineer', 'approver', 'auditor', 'administrator')),
  proposed_by   uuid NOT NULL REFERENCES ledger.person,
  confirmed_seq bigint REFERENCES ledger.entry,
  CHECK (proposed_by <> person_id)
);
CREATE INDEX role_proposal_by_person ON ledger.role_proposal (person_id, seq DESC);

CREATE TABLE ledger.revision (
  screening_id   uuid NOT NULL,
  rev            integer NOT NULL CHECK (rev >= 1),
  state          text NOT NULL CHECK (state IN ('signed', 'countersigned', 'returned', 'superseded', 'withdrawn')),
  author         uuid NOT NULL REFERENCES ledger.person,
  contributors   uuid[] NOT NULL,
  content_sha256 text COLLATE "C" NOT NULL REFERENCES ledger.content,
  signed_seq     bigint NOT NULL UNIQUE REFERENCES ledger.entry,
  decided_by     uuid REFERENCES ledger.person,
  decided_seq    bigint UNIQUE REFERENCES ledger.entry,
  closed_seq     bigint UNIQUE REFERENCES ledger.entry,
  PRIMARY KEY (screening_id, rev),
  CHECK (author = ANY (contributors)),
  CHECK (decided_by <> author),
  CHECK (NOT (decided_by = ANY (contributors))),
  CHECK ((decided_by IS NULL) = (decided_seq IS NULL)),
  CHECK (state NOT IN ('countersigned', 'returned') OR decided_by IS NOT NULL),
  CHECK ((state IN ('superseded', 'withdrawn')) = (closed_seq IS NOT NULL)),
  -- At most one countersigned revision of a screening. Checked at commit, because the new one is countersigned and the old one superseded
  -- by two entries of one transaction; a partial unique index can't wait that long.
  CONSTRAINT revision_one_countersigned EXCLUDE USING btree (screening_id WITH =) WHERE (state = 'countersigned') DEFERRABLE INITIALLY DEFERRED
);
CREATE INDEX revision_by_state ON ledger.revision (state, signed_seq DESC);
