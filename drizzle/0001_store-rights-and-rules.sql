-- Who may do what with the published store. Nobody but the owner writes it; the application and the jobs read it.
-- wl_backup reads everything through pg_read_all_data (drizzle/roles.sql); wl_auth has nothing to look for here.
REVOKE ALL ON ALL TABLES IN SCHEMA public FROM PUBLIC;
--> statement-breakpoint
GRANT SELECT ON
  "source", "isotope", "material", "property_value", "elastic_constant_set", "zone_boundary_frequency",
  "thermal_expansion", "transition", "caveat", "scattering_parameter", "sample", "measurement", "measurement_point"
TO wl_app, wl_jobs;
--> statement-breakpoint
-- What the owner makes later is nobody's until a migration says so.
ALTER DEFAULT PRIVILEGES IN SCHEMA public REVOKE ALL ON TABLES FROM PUBLIC;
--> statement-breakpoint
ALTER DEFAULT PRIVILEGES REVOKE EXECUTE ON FUNCTIONS FROM PUBLIC;
--> statement-breakpoint
-- An elastic solid with a positive bulk modulus has v_T < v_L * sqrt(3)/2 when both are averages over directions
-- (K = rho (v_L^2 - 4/3 v_T^2) > 0). Branch velocities along one direction may break it and still be right.
-- Checked at commit, when both rows of the pair are there.
CREATE FUNCTION refuse_impossible_velocity_pair() RETURNS trigger
LANGUAGE plpgsql AS $$
DECLARE
  longitudinal double precision;
  transverse double precision;
  slug text;
BEGIN
  SELECT v.value INTO longitudinal FROM property_value v
  WHERE v.material_id = NEW.material_id AND v.property = 'sound_velocity_longitudinal'
    AND v.kind = 'average' AND v.is_preferred;
  SELECT v.value INTO transverse FROM property_value v
  WHERE v.material_id = NEW.material_id AND v.property = 'sound_velocity_transverse'
    AND v.kind = 'average' AND v.is_preferred;
  IF transverse >= longitudinal * sqrt(3.0) / 2 THEN
    SELECT m.slug INTO slug FROM material m WHERE m.id = NEW.material_id;
    RAISE EXCEPTION 'The averaged velocities of % (v_L = % m/s, v_T = % m/s) would need a negative bulk modulus: v_T must be below 0.866 v_L.',
      slug, longitudinal, transverse
      USING ERRCODE = 'check_violation', CONSTRAINT = 'property_value_velocity_pair';
  END IF;
  RETURN NULL;
END
$$;
--> statement-breakpoint
CREATE CONSTRAINT TRIGGER property_value_velocity_pair
AFTER INSERT OR UPDATE ON property_value
DEFERRABLE INITIALLY DEFERRED
FOR EACH ROW
WHEN (NEW.property LIKE 'sound_velocity_%' AND NEW.kind = 'average')
EXECUTE FUNCTION refuse_impossible_velocity_pair();
