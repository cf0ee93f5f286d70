-- The running station of a changed row opens again with what the row says now.
CREATE FUNCTION notify_station_changed() RETURNS trigger LANGUAGE plpgsql AS $$
BEGIN
  PERFORM pg_notify('station_changed', NEW.id::text);
  RETURN NULL;
END $$;
--> statement-breakpoint
CREATE TRIGGER stations_notify_changed AFTER INSERT OR UPDATE ON stations
  FOR EACH ROW EXECUTE FUNCTION notify_station_changed();
