-- wl_auth keeps accounts and sessions in a schema of its own, apart from the store. Its tables come with accounts.
CREATE SCHEMA auth;
--> statement-breakpoint
GRANT USAGE ON SCHEMA auth TO wl_auth;
--> statement-breakpoint
-- The preferred branch velocities, cut-offs and Grüneisen parameters of a material come from one published row:
-- a pair of one row with the cut-offs of another describes no crystal. Checked at commit, when the whole set is there.
CREATE FUNCTION refuse_mixed_branch_sets() RETURNS trigger
LANGUAGE plpgsql AS $$
DECLARE
  sets text;
  slug text;
BEGIN
  SELECT string_agg(DISTINCT v.value_set, ', ') INTO sets FROM property_value v
  WHERE v.material_id = NEW.material_id AND v.kind = 'branch' AND v.is_preferred
  HAVING count(DISTINCT v.value_set) > 1;
  IF sets IS NOT NULL THEN
    SELECT m.slug INTO slug FROM material m WHERE m.id = NEW.material_id;
    RAISE EXCEPTION 'The preferred branch values of % come from several published rows (%): prefer one row.', slug, sets
      USING ERRCODE = 'check_violation', CONSTRAINT = 'property_value_one_branch_set';
  END IF;
  RETURN NULL;
END
$$;
--> statement-breakpoint
CREATE CONSTRAINT TRIGGER property_value_one_branch_set
AFTER INSERT OR UPDATE ON property_value
DEFERRABLE INITIALLY DEFERRED
FOR EACH ROW
WHEN (NEW.kind = 'branch' AND NEW.is_preferred)
EXECUTE FUNCTION refuse_mixed_branch_sets();
