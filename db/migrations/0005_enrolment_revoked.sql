-- A bench browser whose enrolment ends loses its socket at once.
CREATE FUNCTION notify_enrolment_revoked() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  IF OLD.revoked_at IS NULL AND NEW.revoked_at IS NOT NULL THEN
    PERFORM pg_notify('enrolment_revoked', NEW.id::text);
  END IF;
  RETURN NULL;
END $$;
--> statement-breakpoint
CREATE TRIGGER station_enrolments_notify_revoked AFTER UPDATE OF revoked_at ON station_enrolments
  FOR EACH ROW EXECUTE FUNCTION notify_enrolment_revoked();
