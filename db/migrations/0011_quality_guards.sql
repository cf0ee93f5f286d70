CREATE TRIGGER signatures_append_only BEFORE UPDATE OR DELETE ON signatures
  FOR EACH ROW EXECUTE FUNCTION refuse_change_of_record();
--> statement-breakpoint
CREATE TRIGGER hold_rule_sets_append_only BEFORE UPDATE OR DELETE ON hold_rule_sets
  FOR EACH ROW EXECUTE FUNCTION refuse_change_of_record();
--> statement-breakpoint
CREATE TRIGGER chart_baselines_append_only BEFORE UPDATE OR DELETE ON chart_baselines
  FOR EACH ROW EXECUTE FUNCTION refuse_change_of_record();
--> statement-breakpoint
-- A signed disposition gains its second signature once and changes in nothing else.
CREATE OR REPLACE FUNCTION refuse_change_of_signed() RETURNS trigger LANGUAGE plpgsql AS $$
DECLARE
  second text[] := ARRAY['second_signed_by', 'second_signed_at', 'second_signature_id'];
BEGIN
  IF TG_OP = 'UPDATE' AND OLD.second_signed_at IS NULL AND to_jsonb(NEW) - second = to_jsonb(OLD) - second THEN
    RETURN NEW;
  END IF;
  RAISE EXCEPTION 'a signed disposition cannot be changed' USING ERRCODE = 'SW002';
END $$;
--> statement-breakpoint
-- A hold is released once, a certificate revoked once; neither changes otherwise.
CREATE FUNCTION refuse_change_but_release() RETURNS trigger LANGUAGE plpgsql AS $$
DECLARE
  told text[] := ARRAY['released_at', 'released_by', 'release_reason', 'signature_id'];
BEGIN
  IF TG_OP = 'UPDATE' AND OLD.released_at IS NULL AND to_jsonb(NEW) - told = to_jsonb(OLD) - told THEN
    RETURN NEW;
  END IF;
  RAISE EXCEPTION 'a hold is only ever released' USING ERRCODE = 'SW002';
END $$;
--> statement-breakpoint
CREATE TRIGGER lot_holds_released_once BEFORE UPDATE OR DELETE ON lot_holds
  FOR EACH ROW EXECUTE FUNCTION refuse_change_but_release();
--> statement-breakpoint
CREATE FUNCTION refuse_change_but_revocation() RETURNS trigger LANGUAGE plpgsql AS $$
DECLARE
  told text[] := ARRAY['revoked_at', 'revoked_by', 'revoked_reason'];
BEGIN
  IF TG_OP = 'UPDATE' AND OLD.revoked_at IS NULL AND to_jsonb(NEW) - told = to_jsonb(OLD) - told THEN
    RETURN NEW;
  END IF;
  RAISE EXCEPTION 'an issued certificate is only ever revoked' USING ERRCODE = 'SW002';
END $$;
--> statement-breakpoint
CREATE TRIGGER certificates_revoked_once BEFORE UPDATE OR DELETE ON certificates
  FOR EACH ROW EXECUTE FUNCTION refuse_change_but_revocation();
