-- Every entry of the trail is sealed as its transaction commits: SHA-256 over the seal before it in its chain and its own fields.
-- One chain per station, one for the desk. Waiting for the commit keeps the lock of a chain short, and out of the way of other locks.
CREATE FUNCTION seal_field(value text) RETURNS text LANGUAGE sql IMMUTABLE PARALLEL SAFE AS $$
  SELECT coalesce(octet_length(value) || ':' || value, '-') || E'\n'
$$;
--> statement-breakpoint
CREATE FUNCTION seal_of(before_it text, entry trail) RETURNS text LANGUAGE sql STABLE AS $$
  SELECT encode(sha256(convert_to(
    'sillwright trail 1' || E'\n' || seal_field(before_it) || seal_field(entry.chain) || seal_field(entry.place::text)
    || seal_field(to_char(entry.at AT TIME ZONE 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.US"Z"'))
    || seal_field(entry.account_id::text) || seal_field(entry.station_id::text)
    || seal_field(entry.action) || seal_field(entry.entity) || seal_field(entry.entity_id)
    || seal_field(entry.before::text) || seal_field(entry.after::text) || seal_field(entry.reason),
    'UTF8')), 'hex')
$$;
--> statement-breakpoint
-- Only the seal of an unsealed entry is ever written to it.
CREATE FUNCTION refuse_change_of_trail() RETURNS trigger LANGUAGE plpgsql AS $$
DECLARE
  sealing text[] := ARRAY['chain', 'place', 'seal'];
BEGIN
  IF TG_OP = 'UPDATE' AND OLD.seal IS NULL AND to_jsonb(NEW) - sealing = to_jsonb(OLD) - sealing THEN
    RETURN NEW;
  END IF;
  RAISE EXCEPTION 'trail is a record and is only ever added to' USING ERRCODE = 'SW002';
END $$;
--> statement-breakpoint
DROP TRIGGER trail_append_only ON trail;
--> statement-breakpoint
CREATE TRIGGER trail_append_only BEFORE UPDATE OR DELETE ON trail
  FOR EACH ROW EXECUTE FUNCTION refuse_change_of_trail();
--> statement-breakpoint
-- Runs with the rights of the tables' owner: the application's role may not write to an entry at all.
CREATE FUNCTION seal_entry() RETURNS trigger LANGUAGE plpgsql SECURITY DEFINER SET search_path = public, pg_temp AS $$
DECLARE
  entry trail;
  head record;
BEGIN
  SELECT * INTO entry FROM trail WHERE id = NEW.id;
  entry.chain := coalesce((SELECT code FROM stations WHERE id = entry.station_id), 'desk');
  PERFORM pg_advisory_xact_lock(5710414, hashtext(entry.chain));
  SELECT place, seal INTO head FROM trail WHERE chain = entry.chain ORDER BY place DESC LIMIT 1;
  entry.place := coalesce(head.place, 0) + 1;
  UPDATE trail SET chain = entry.chain, place = entry.place, seal = seal_of(head.seal, entry) WHERE id = entry.id;
  RETURN NULL;
END $$;
--> statement-breakpoint
DO $$
DECLARE
  entry trail;
  head record;
BEGIN
  FOR entry IN SELECT * FROM trail ORDER BY id LOOP
    entry.chain := coalesce((SELECT code FROM stations WHERE id = entry.station_id), 'desk');
    SELECT place, seal INTO head FROM trail WHERE chain = entry.chain ORDER BY place DESC LIMIT 1;
    entry.place := coalesce(head.place, 0) + 1;
    UPDATE trail SET chain = entry.chain, place = entry.place, seal = seal_of(head.seal, entry) WHERE id = entry.id;
  END LOOP;
END $$;
--> statement-breakpoint
CREATE CONSTRAINT TRIGGER trail_sealed AFTER INSERT ON trail
  DEFERRABLE INITIALLY DEFERRED FOR EACH ROW EXECUTE FUNCTION seal_entry();
