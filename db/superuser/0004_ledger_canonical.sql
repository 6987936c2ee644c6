-- RFC 8785 in the database, for the bodies of entries: a body is stored only if writing out its value again gives the same bytes. That
-- refuses white space, keys out of order, doubled keys and numbers in another notation, whatever the application sent.

SET LOCAL check_function_bodies = off; -- the functions name tables of schema app, which is made later
SET LOCAL ROLE eb_vault;

CREATE FUNCTION ledger.refuse(code text, reason text, detail text) RETURNS void LANGUAGE plpgsql
SET search_path = pg_catalog, pg_temp AS $$
BEGIN
  RAISE EXCEPTION USING ERRCODE = code, MESSAGE = reason, DETAIL = detail;
END
$$;

-- Lays out the digits of a number as ECMAScript does (Number::toString). Takes the decimal digits as written, because the shortest digits
-- PostgreSQL prints differ from ECMAScript's where a decimal lies on the edge between two doubles (1e23).
CREATE FUNCTION ledger.canonical_number(value numeric) RETURNS text LANGUAGE plpgsql IMMUTABLE STRICT
SET search_path = pg_catalog, pg_temp SET extra_float_digits = 1 AS $$
DECLARE
  written text := abs(value)::text;
  sign    text := CASE WHEN value < 0 THEN '-' ELSE '' END;
  whole   text := split_part(written, '.', 1);
  part    text := split_part(written, '.', 2);
  digits  text := ltrim(whole || part, '0');
  point   integer;
BEGIN
  IF digits = '' THEN RETURN '0'; END IF;
  point := length(ltrim(whole, '0'));
  IF point = 0 THEN point := -(length(part) - length(ltrim(part, '0'))); END IF;
  digits := rtrim(digits, '0');

  IF length(digits) > 17 OR abs(value) > 1.7976931348623157e308 OR abs(value) < 4.9e-324 THEN
    PERFORM ledger.refuse('EB422', 'invalid-request', 'A number of the body is not a double written with its shortest digits.');
  END IF;
  -- Never more digits than PostgreSQL needs to name the same double.
  IF length(digits) > length(trim(both '0' FROM replace(regexp_replace(abs(value::float8)::text, 'e.*$', ''), '.', ''))) THEN
    PERFORM ledger.refuse('EB422', 'invalid-request', 'A number of the body is not written with its shortest digits.');
  END IF;

  IF length(digits) <= point AND point <= 21 THEN RETURN sign || digits || repeat('0', point - length(digits)); END IF;
  IF 0 < point AND point <= 21 THEN RETURN sign || left(digits, point) || '.' || substr(digits, point + 1); END IF;
  IF -6 < point AND point <= 0 THEN RETURN sign || '0.' || repeat('0', -point) || digits; END IF;
  RETURN sign || left(digits, 1) || CASE WHEN length(digits) > 1 THEN '.' || substr(digits, 2) ELSE '' END
    || 'e' || CASE WHEN point > 0 THEN '+' ELSE '-' END || abs(point - 1);
END
$$;

CREATE FUNCTION ledger.canonical(value jsonb, depth integer DEFAULT 1) RETURNS text LANGUAGE plpgsql IMMUTABLE STRICT
SET search_path = pg_catalog, pg_temp AS $$
DECLARE
  said text;
BEGIN
  IF depth > 32 THEN PERFORM ledger.refuse('EB422', 'invalid-request', 'The body is nested more than 32 deep.'); END IF;
  CASE jsonb_typeof(value)
    WHEN 'object' THEN
      -- ASCII keys only, so the order of bytes is the order of UTF-16 units that RFC 8785 asks for.
      IF EXISTS (SELECT FROM jsonb_object_keys(value) k WHERE k !~ '^[A-Za-z][A-Za-z0-9_]{0,63}$') THEN
        PERFORM ledger.refuse('EB422', 'invalid-request', 'A key of the body has characters other than letters, digits and underscore.');
      END IF;
      RETURN '{' || coalesce((SELECT string_agg('"' || m.key || '":' || ledger.canonical(m.value, depth + 1), ',' ORDER BY m.key COLLATE "C")
                              FROM jsonb_each(value) m), '') || '}';
    WHEN 'array' THEN
      RETURN '[' || coalesce((SELECT string_agg(ledger.canonical(i.value, depth + 1), ',' ORDER BY i.ordinality)
                              FROM jsonb_array_elements(value) WITH ORDINALITY i), '') || ']';
    WHEN 'string' THEN
      said := value #>> '{}';
      IF said ~ '[\u0001-\u0008\u000b-\u001f\u007f\u202a-\u202e\u2066-\u2069]' THEN
        PERFORM ledger.refuse('EB422', 'invalid-request', 'A text of the body holds control characters or marks that turn the reading direction.');
      END IF;
      IF said IS NOT NFC NORMALIZED THEN
        PERFORM ledger.refuse('EB422', 'invalid-request', 'A text of the body is not in Unicode normal form C.');
      END IF;
      RETURN to_json(said)::text;
    WHEN 'number' THEN
      RETURN ledger.canonical_number((value #>> '{}')::numeric);
    ELSE
      RETURN value::text;
  END CASE;
END
$$;

CREATE FUNCTION ledger.check_canonical(body text) RETURNS jsonb LANGUAGE plpgsql IMMUTABLE
SET search_path = pg_catalog, pg_temp AS $$
DECLARE
  value jsonb;
BEGIN
  IF body IS NULL OR octet_length(body) > 1048576 THEN
    PERFORM ledger.refuse('EB422', 'invalid-request', 'The body is missing or larger than 1 MiB.');
  END IF;
  BEGIN
    value := body::jsonb;
  EXCEPTION WHEN data_exception OR statement_too_complex OR program_limit_exceeded THEN
    PERFORM ledger.refuse('EB422', 'invalid-request', 'The body is not JSON.');
  END;
  IF jsonb_typeof(value) <> 'object' OR ledger.canonical(value) <> body THEN
    PERFORM ledger.refuse('EB422', 'invalid-request', 'The body is not an object in canonical form (RFC 8785).');
  END IF;
  RETURN value;
END
$$;
