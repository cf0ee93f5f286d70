-- What must hold whichever program writes. Errors carry SQLSTATE SW001 (closed run) and SW002 (trail).

CREATE FUNCTION refuse_change_of_closed_run() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF TG_OP = 'DELETE' THEN
    IF OLD.ended_at IS NOT NULL THEN
      RAISE EXCEPTION 'run % is closed and cannot be deleted', OLD.id USING ERRCODE = 'SW001';
    END IF;
    RETURN OLD;
  END IF;
  -- The red bin is scanned after the verdict, once.
  IF OLD.ended_at IS NOT NULL AND NOT (
    OLD.bin_scanned_at IS NULL
    AND NEW.bin_scanned_at IS NOT NULL
    AND to_jsonb(NEW) - 'bin_code' - 'bin_scanned_at' = to_jsonb(OLD) - 'bin_code' - 'bin_scanned_at'
  ) THEN
    RAISE EXCEPTION 'run % is closed and cannot be changed', OLD.id USING ERRCODE = 'SW001';
  END IF;
  RETURN NEW;
END $$;
--> statement-breakpoint
CREATE TRIGGER runs_closed BEFORE UPDATE OR DELETE ON runs
  FOR EACH ROW EXECUTE FUNCTION refuse_change_of_closed_run();
--> statement-breakpoint
-- Locks the run, so that results cannot slip in while another connection closes it.
CREATE FUNCTION refuse_results_of_closed_run() RETURNS trigger LANGUAGE plpgsql AS $$
DECLARE
  written jsonb;
  ended timestamptz;
BEGIN
  FOREACH written IN ARRAY ARRAY[to_jsonb(OLD), to_jsonb(NEW)] LOOP
    CONTINUE WHEN written IS NULL;
    SELECT ended_at INTO ended FROM runs WHERE id = (written ->> 'run_id')::uuid FOR SHARE;
    IF ended IS NOT NULL THEN
      RAISE EXCEPTION 'run % is closed and its results cannot be changed', written ->> 'run_id' USING ERRCODE = 'SW001';
    END IF;
  END LOOP;
  IF TG_OP = 'DELETE' THEN
    RETURN OLD;
  END IF;
  RETURN NEW;
END $$;
--> statement-breakpoint
CREATE TRIGGER run_events_closed BEFORE INSERT OR UPDATE OR DELETE ON run_events
  FOR EACH ROW EXECUTE FUNCTION refuse_results_of_closed_run();
--> statement-breakpoint
CREATE TRIGGER traces_closed BEFORE INSERT OR UPDATE OR DELETE ON traces
  FOR EACH ROW EXECUTE FUNCTION refuse_results_of_closed_run();
--> statement-breakpoint
CREATE TRIGGER measurements_closed BEFORE INSERT OR UPDATE OR DELETE ON measurements
  FOR EACH ROW EXECUTE FUNCTION refuse_results_of_closed_run();
--> statement-breakpoint
CREATE FUNCTION refuse_change_of_record() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  RAISE EXCEPTION '% is a record and is only ever added to', TG_TABLE_NAME USING ERRCODE = 'SW002';
END $$;
--> statement-breakpoint
CREATE TRIGGER trail_append_only BEFORE UPDATE OR DELETE ON trail
  FOR EACH ROW EXECUTE FUNCTION refuse_change_of_record();
--> statement-breakpoint
CREATE TRIGGER trail_not_emptied BEFORE TRUNCATE ON trail
  FOR EACH STATEMENT EXECUTE FUNCTION refuse_change_of_record();
--> statement-breakpoint
CREATE TRIGGER runs_not_emptied BEFORE TRUNCATE ON runs
  FOR EACH STATEMENT EXECUTE FUNCTION refuse_change_of_record();
--> statement-breakpoint
CREATE TRIGGER run_events_not_emptied BEFORE TRUNCATE ON run_events
  FOR EACH STATEMENT EXECUTE FUNCTION refuse_change_of_record();
--> statement-breakpoint
CREATE TRIGGER traces_not_emptied BEFORE TRUNCATE ON traces
  FOR EACH STATEMENT EXECUTE FUNCTION refuse_change_of_record();
--> statement-breakpoint
CREATE TRIGGER measurements_not_emptied BEFORE TRUNCATE ON measurements
  FOR EACH STATEMENT EXECUTE FUNCTION refuse_change_of_record();
--> statement-breakpoint
-- A signed disposition gains its second signature once and changes in nothing else.
CREATE FUNCTION refuse_change_of_signed() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF TG_OP = 'UPDATE'
    AND OLD.second_signed_at IS NULL
    AND to_jsonb(NEW) - 'second_signed_by' - 'second_signed_at' = to_jsonb(OLD) - 'second_signed_by' - 'second_signed_at'
  THEN
    RETURN NEW;
  END IF;
  RAISE EXCEPTION 'a signed disposition cannot be changed' USING ERRCODE = 'SW002';
END $$;
--> statement-breakpoint
CREATE TRIGGER dispositions_signed BEFORE UPDATE OR DELETE ON dispositions
  FOR EACH ROW EXECUTE FUNCTION refuse_change_of_signed();
--> statement-breakpoint
-- An approved specification or a released sequence may only be withdrawn.
CREATE FUNCTION refuse_change_of_approved() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF OLD.status::text IN ('approved', 'released', 'withdrawn') AND (
    TG_OP = 'DELETE'
    OR NEW.status::text <> 'withdrawn'
    OR to_jsonb(NEW) - 'status' - 'withdrawn_at' <> to_jsonb(OLD) - 'status' - 'withdrawn_at'
  ) THEN
    RAISE EXCEPTION 'revision % is % and cannot be changed', OLD.id, OLD.status USING ERRCODE = 'SW002';
  END IF;
  IF TG_OP = 'DELETE' THEN
    RETURN OLD;
  END IF;
  RETURN NEW;
END $$;
--> statement-breakpoint
CREATE TRIGGER board_type_revisions_approved BEFORE UPDATE OR DELETE ON board_type_revisions
  FOR EACH ROW EXECUTE FUNCTION refuse_change_of_approved();
--> statement-breakpoint
CREATE TRIGGER sequence_revisions_released BEFORE UPDATE OR DELETE ON sequence_revisions
  FOR EACH ROW EXECUTE FUNCTION refuse_change_of_approved();
--> statement-breakpoint
-- Disabling an account, changing its roles or retiring a station ends the sessions; whoever holds a live socket hears of it.
CREATE FUNCTION end_sessions_of_account() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF NEW.disabled_at IS NOT NULL OR NEW.roles IS DISTINCT FROM OLD.roles THEN
    UPDATE sessions
      SET ended_at = now(), ended_because = CASE WHEN NEW.disabled_at IS NULL THEN 'roles-changed' ELSE 'disabled' END
      WHERE account_id = NEW.id AND ended_at IS NULL;
  END IF;
  RETURN NULL;
END $$;
--> statement-breakpoint
CREATE TRIGGER accounts_end_sessions AFTER UPDATE OF disabled_at, roles ON accounts
  FOR EACH ROW EXECUTE FUNCTION end_sessions_of_account();
--> statement-breakpoint
CREATE FUNCTION end_sessions_of_station() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF NEW.retired_at IS NOT NULL THEN
    UPDATE sessions SET ended_at = now(), ended_because = 'station-retired'
      WHERE station_id = NEW.id AND ended_at IS NULL;
  END IF;
  RETURN NULL;
END $$;
--> statement-breakpoint
CREATE TRIGGER stations_end_sessions AFTER UPDATE OF retired_at ON stations
  FOR EACH ROW EXECUTE FUNCTION end_sessions_of_station();
--> statement-breakpoint
CREATE FUNCTION notify_session_ended() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF OLD.ended_at IS NULL AND NEW.ended_at IS NOT NULL THEN
    PERFORM pg_notify('session_ended', NEW.id::text);
  END IF;
  RETURN NULL;
END $$;
--> statement-breakpoint
CREATE TRIGGER sessions_notify_ended AFTER UPDATE OF ended_at ON sessions
  FOR EACH ROW EXECUTE FUNCTION notify_session_ended();
