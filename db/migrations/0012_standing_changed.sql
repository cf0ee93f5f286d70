-- What a bench shows of the server's affairs changed: the station that it is of, or * for every station.
CREATE FUNCTION notify_standing_changed() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  PERFORM pg_notify('standing_changed', coalesce(to_jsonb(NEW) ->> 'station_id', '*'));
  RETURN NULL;
END $$;
--> statement-breakpoint
CREATE TRIGGER engineering_offers_notify AFTER INSERT OR UPDATE ON engineering_offers
  FOR EACH ROW EXECUTE FUNCTION notify_standing_changed();
--> statement-breakpoint
CREATE TRIGGER engineer_calls_notify AFTER INSERT OR UPDATE ON engineer_calls
  FOR EACH ROW EXECUTE FUNCTION notify_standing_changed();
--> statement-breakpoint
CREATE TRIGGER daily_checks_notify AFTER INSERT ON daily_checks
  FOR EACH ROW EXECUTE FUNCTION notify_standing_changed();
--> statement-breakpoint
-- A lot may be in work at several stations.
CREATE TRIGGER lots_notify AFTER UPDATE ON lots
  FOR EACH ROW EXECUTE FUNCTION notify_standing_changed();
--> statement-breakpoint
CREATE FUNCTION notify_label_changed() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  PERFORM pg_notify('standing_changed', r.station_id::text) FROM runs r WHERE r.id = NEW.run_id;
  RETURN NULL;
END $$;
--> statement-breakpoint
CREATE TRIGGER labels_notify AFTER UPDATE OF state ON labels
  FOR EACH ROW EXECUTE FUNCTION notify_label_changed();
