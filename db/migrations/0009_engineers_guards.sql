-- An approved specification or a released sequence may only be superseded, then withdrawn.
CREATE OR REPLACE FUNCTION refuse_change_of_approved() RETURNS trigger LANGUAGE plpgsql AS $$
DECLARE
  told text[] := ARRAY['status', 'superseded_at', 'withdrawn_at', 'withdrawn_by', 'withdrawn_reason'];
BEGIN
  IF OLD.status::text IN ('approved', 'released', 'superseded', 'withdrawn') AND (
    TG_OP = 'DELETE'
    OR OLD.status::text = 'withdrawn'
    OR NEW.status::text NOT IN ('superseded', 'withdrawn')
    OR to_jsonb(NEW) - told <> to_jsonb(OLD) - told
  ) THEN
    RAISE EXCEPTION 'revision % is % and cannot be changed', OLD.id, OLD.status USING ERRCODE = 'SW002';
  END IF;
  IF TG_OP = 'DELETE' THEN
    RETURN OLD;
  END IF;
  RETURN NEW;
END $$;
--> statement-breakpoint
CREATE TRIGGER lot_moves_append_only BEFORE UPDATE OR DELETE ON lot_moves
  FOR EACH ROW EXECUTE FUNCTION refuse_change_of_record();
--> statement-breakpoint
CREATE TRIGGER files_not_changed BEFORE UPDATE ON files
  FOR EACH ROW EXECUTE FUNCTION refuse_change_of_record();
--> statement-breakpoint
-- Steps of earlier revisions had no id, name or switch of their own: they are given ids by their place.
ALTER TABLE sequence_revisions DISABLE TRIGGER sequence_revisions_released;
--> statement-breakpoint
UPDATE sequence_revisions SET data = jsonb_set(data, '{steps}', (
  SELECT jsonb_agg(jsonb_build_object('id', 's' || place, 'name', '', 'enabled', true) || step ORDER BY place)
  FROM jsonb_array_elements(data -> 'steps') WITH ORDINALITY AS listed (step, place)
))
WHERE jsonb_array_length(data -> 'steps') > 0;
--> statement-breakpoint
ALTER TABLE sequence_revisions ENABLE TRIGGER sequence_revisions_released;
--> statement-breakpoint
-- A desk tells the server what waits: a dry run to begin or to stop.
CREATE FUNCTION notify_dry_run() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF TG_OP = 'INSERT' OR NEW.state IS DISTINCT FROM OLD.state THEN
    PERFORM pg_notify('dry_run', NEW.id::text);
  END IF;
  RETURN NULL;
END $$;
--> statement-breakpoint
CREATE TRIGGER dry_runs_notify AFTER INSERT OR UPDATE OF state ON dry_runs
  FOR EACH ROW EXECUTE FUNCTION notify_dry_run();
