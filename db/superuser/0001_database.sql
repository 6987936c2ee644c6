-- Who may do what to the database as a whole. Runs as the superuser, who also owns the database: no login of the product does.

DO $$
DECLARE
  db text := current_database();
BEGIN
  EXECUTE format('REVOKE ALL ON DATABASE %I FROM PUBLIC', db);
  EXECUTE format('GRANT CONNECT ON DATABASE %I TO eb_owner, eb_read, eb_write, eb_sign', db);

  -- Conveniences only: a session may switch them off. What holds is the absence of grants.
  EXECUTE format('ALTER ROLE eb_read IN DATABASE %I SET default_transaction_read_only = on', db);
  EXECUTE format('ALTER ROLE eb_sign IN DATABASE %I SET lock_timeout = %L', db, '10s');
  EXECUTE format('ALTER ROLE eb_sign IN DATABASE %I SET idle_in_transaction_session_timeout = %L', db, '5s');
  EXECUTE format('ALTER ROLE eb_sign IN DATABASE %I SET statement_timeout = %L', db, '20s');
END
$$;

REVOKE ALL ON SCHEMA public FROM PUBLIC;

-- Large objects need no grant to be made; without these functions nobody can fill the disk with them.
REVOKE EXECUTE ON FUNCTION pg_catalog.lo_create(oid), pg_catalog.lo_creat(integer), pg_catalog.lo_from_bytea(oid, bytea) FROM PUBLIC;

-- The windows in which the structure may change. Only the superuser writes here.
CREATE TABLE guard.ddl_window (
  id        integer PRIMARY KEY GENERATED ALWAYS AS IDENTITY,
  reason    text NOT NULL CHECK (reason ~ '^[ -~]{1,200}$' AND reason !~ '["\\]'),
  opened_by text NOT NULL DEFAULT session_user,
  opened_at timestamptz NOT NULL DEFAULT clock_timestamp(),
  until     timestamptz NOT NULL,
  closed_at timestamptz,
  CHECK (until > opened_at AND until <= opened_at + interval '1 hour')
);
