-- No change of structure outside a window that the superuser opened. The event trigger belongs to the superuser, so no login of the
-- product, and not even the owner of the record, can switch it off.

CREATE FUNCTION guard.refuse_ddl() RETURNS event_trigger LANGUAGE plpgsql SECURITY DEFINER
SET search_path = pg_catalog, pg_temp AS $$
BEGIN
  IF NOT EXISTS (SELECT FROM guard.ddl_window w WHERE w.closed_at IS NULL AND w.until > clock_timestamp()) THEN
    RAISE EXCEPTION USING ERRCODE = 'EB403', MESSAGE = 'not-allowed',
      DETAIL = format('%s is refused: the structure changes only in a window opened by a migration.', TG_TAG);
  END IF;
END
$$;
REVOKE EXECUTE ON FUNCTION guard.refuse_ddl() FROM PUBLIC;

CREATE EVENT TRIGGER structure_is_frozen ON ddl_command_start EXECUTE FUNCTION guard.refuse_ddl();
ALTER EVENT TRIGGER structure_is_frozen ENABLE ALWAYS;
