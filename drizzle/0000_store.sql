-- The five roles are made by a superuser with drizzle/roles.sql before anything is migrated.
DO $$
DECLARE
  absent text;
BEGIN
  SELECT string_agg(wanted, ', ') INTO absent
  FROM unnest(ARRAY['wl_owner', 'wl_app', 'wl_auth', 'wl_jobs', 'wl_backup']) AS wanted
  WHERE NOT EXISTS (SELECT FROM pg_roles WHERE rolname = wanted);
  IF absent IS NOT NULL THEN
    RAISE EXCEPTION 'The database has no role %: let a superuser run drizzle/roles.sql in this database first.', absent;
  END IF;
END
$$;
--> statement-breakpoint
CREATE EXTENSION IF NOT EXISTS pg_trgm;
--> statement-breakpoint
CREATE TABLE "source" (
	"key" text PRIMARY KEY NOT NULL,
	"authors" text,
	"year" integer,
	"title" text,
	"container" text,
	"volume" text,
	"page" text,
	"doi" text,
	"verification" text,
	CONSTRAINT "source_key_form" CHECK ("source"."key" ~ '^[a-z0-9][a-z0-9.-]*$'),
	CONSTRAINT "source_year" CHECK ("source"."year" is null or "source"."year" between 1600 and 2200),
	CONSTRAINT "source_doi_form" CHECK ("source"."doi" is null or "source"."doi" ~ '^10\.[0-9]{4,9}/.+$'),
	CONSTRAINT "source_verification" CHECK ("source"."verification" is null or "source"."verification" in ('checked', 'from memory'))
);
--> statement-breakpoint
CREATE TABLE "isotope" (
	"symbol" text NOT NULL,
	"atomic_number" integer NOT NULL,
	"mass_number" integer NOT NULL,
	"mass_u" double precision NOT NULL,
	"abundance_fraction" double precision NOT NULL,
	"source_key" text NOT NULL,
	"basis" text NOT NULL,
	"verification" text,
	CONSTRAINT "isotope_symbol_mass_number_pk" PRIMARY KEY("symbol","mass_number"),
	CONSTRAINT "isotope_symbol" CHECK ("isotope"."symbol" ~ '^[A-Z][a-z]?$'),
	CONSTRAINT "isotope_atomic_number" CHECK ("isotope"."atomic_number" between 1 and 120),
	CONSTRAINT "isotope_mass" CHECK ("isotope"."mass_u" > 0 and "isotope"."mass_u" < 'Infinity' and abs("isotope"."mass_u" - "isotope"."mass_number") < 0.5),
	CONSTRAINT "isotope_abundance" CHECK ("isotope"."abundance_fraction" >= 0 and "isotope"."abundance_fraction" <= 1),
	CONSTRAINT "isotope_basis" CHECK ("isotope"."basis" in ('measured', 'published', 'derived', 'estimated')),
	CONSTRAINT "isotope_verification" CHECK (case when "isotope"."basis" in ('measured', 'published') then "isotope"."verification" in ('checked', 'from memory') and "isotope"."verification" is not null else "isotope"."verification" is null end)
);
--> statement-breakpoint
CREATE TABLE "caveat" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"material_id" uuid NOT NULL,
	"text" text NOT NULL,
	"source_key" text NOT NULL,
	"verification" text,
	CONSTRAINT "caveat_verification" CHECK ("caveat"."verification" is null or "caveat"."verification" in ('checked', 'from memory'))
);
--> statement-breakpoint
CREATE TABLE "elastic_constant_set" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"material_id" uuid NOT NULL,
	"c11_pa" double precision NOT NULL,
	"c12_pa" double precision NOT NULL,
	"c44_pa" double precision,
	"c13_pa" double precision,
	"c33_pa" double precision,
	"c66_pa" double precision,
	"c14_pa" double precision,
	"temperature_k" double precision,
	"source_key" text NOT NULL,
	"basis" text NOT NULL,
	"verification" text,
	"note" text,
	CONSTRAINT "elastic_constant_set_stable" CHECK ("elastic_constant_set"."c11_pa" > 0 and "elastic_constant_set"."c11_pa" < 'Infinity' and "elastic_constant_set"."c12_pa" > '-Infinity' and "elastic_constant_set"."c12_pa" < 'Infinity' and "elastic_constant_set"."c11_pa" > abs("elastic_constant_set"."c12_pa")),
	CONSTRAINT "elastic_constant_set_c44" CHECK ("elastic_constant_set"."c44_pa" is null or ("elastic_constant_set"."c44_pa" > 0 and "elastic_constant_set"."c44_pa" < 'Infinity')),
	CONSTRAINT "elastic_constant_set_c33" CHECK ("elastic_constant_set"."c33_pa" is null or ("elastic_constant_set"."c33_pa" > 0 and "elastic_constant_set"."c33_pa" < 'Infinity')),
	CONSTRAINT "elastic_constant_set_c66" CHECK ("elastic_constant_set"."c66_pa" is null or ("elastic_constant_set"."c66_pa" > 0 and "elastic_constant_set"."c66_pa" < 'Infinity')),
	CONSTRAINT "elastic_constant_set_c13" CHECK ("elastic_constant_set"."c13_pa" is null or ("elastic_constant_set"."c13_pa" > '-Infinity' and "elastic_constant_set"."c13_pa" < 'Infinity')),
	CONSTRAINT "elastic_constant_set_c14" CHECK ("elastic_constant_set"."c14_pa" is null or ("elastic_constant_set"."c14_pa" > '-Infinity' and "elastic_constant_set"."c14_pa" < 'Infinity')),
	CONSTRAINT "elastic_constant_set_temperature" CHECK ("elastic_constant_set"."temperature_k" is null or ("elastic_constant_set"."temperature_k" > 0 and "elastic_constant_set"."temperature_k" < 'Infinity')),
	CONSTRAINT "elastic_constant_set_basis" CHECK ("elastic_constant_set"."basis" in ('measured', 'published', 'derived', 'estimated')),
	CONSTRAINT "elastic_constant_set_verification" CHECK (case when "elastic_constant_set"."basis" in ('measured', 'published') then "elastic_constant_set"."verification" in ('checked', 'from memory') and "elastic_constant_set"."verification" is not null else "elastic_constant_set"."verification" is null end)
);
--> statement-breakpoint
CREATE TABLE "material" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"slug" text NOT NULL,
	"name" text NOT NULL,
	"formula" text NOT NULL,
	"aliases" text[] DEFAULT '{}' NOT NULL,
	"composition" jsonb NOT NULL,
	"structure" text NOT NULL,
	"space_group" text,
	"space_group_number" integer,
	"class" text NOT NULL,
	"atoms_per_cell" integer,
	"hazards" text[] DEFAULT '{}' NOT NULL,
	"note" text,
	"revision" integer DEFAULT 1 NOT NULL,
	"search_text" text NOT NULL,
	CONSTRAINT "material_slug_unique" UNIQUE("slug"),
	CONSTRAINT "material_slug_form" CHECK ("material"."slug" ~ '^[a-z0-9]+(-[a-z0-9]+)*$'),
	CONSTRAINT "material_space_group_number" CHECK ("material"."space_group_number" is null or "material"."space_group_number" between 1 and 230),
	CONSTRAINT "material_atoms_per_cell" CHECK ("material"."atoms_per_cell" is null or "material"."atoms_per_cell" between 1 and 1000),
	CONSTRAINT "material_composition" CHECK (jsonb_typeof("material"."composition") = 'array' and jsonb_array_length("material"."composition") > 0),
	CONSTRAINT "material_hazards" CHECK ("material"."hazards" <@ array['beryllium', 'cadmium', 'thallium', 'lead', 'arsenic', 'antimony', 'tellurium', 'selenium', 'uranium', 'thorium', 'mercury', 'lithium-hydride', 'alkali-metal', 'fluoride', 'asphyxiant', 'cryogenic', 'fine-dust']),
	CONSTRAINT "material_revision" CHECK ("material"."revision" >= 1)
);
--> statement-breakpoint
CREATE TABLE "property_value" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"material_id" uuid NOT NULL,
	"property" text NOT NULL,
	"kind" text NOT NULL,
	"value_set" text,
	"value" double precision NOT NULL,
	"unit" text NOT NULL,
	"uncertainty" double precision,
	"temperature_k" double precision,
	"direction" text,
	"source_key" text NOT NULL,
	"basis" text NOT NULL,
	"verification" text,
	"is_preferred" boolean DEFAULT false NOT NULL,
	"note" text,
	CONSTRAINT "property_value_property" CHECK ("property_value"."property" in ('density', 'lattice_parameter_a', 'lattice_parameter_b', 'lattice_parameter_c', 'cell_volume', 'debye_temperature', 'acoustic_debye_temperature', 'sound_velocity_longitudinal', 'sound_velocity_transverse', 'zone_boundary_temperature_longitudinal', 'zone_boundary_temperature_transverse', 'gruneisen', 'gruneisen_longitudinal', 'gruneisen_transverse', 'molar_heat_capacity_p', 'bulk_modulus', 'electrical_resistivity')),
	CONSTRAINT "property_value_unit" CHECK ("property_value"."unit" = case "property_value"."property" when 'density' then 'kg/m^3' when 'lattice_parameter_a' then 'm' when 'lattice_parameter_b' then 'm' when 'lattice_parameter_c' then 'm' when 'cell_volume' then 'm^3' when 'debye_temperature' then 'K' when 'acoustic_debye_temperature' then 'K' when 'sound_velocity_longitudinal' then 'm/s' when 'sound_velocity_transverse' then 'm/s' when 'zone_boundary_temperature_longitudinal' then 'K' when 'zone_boundary_temperature_transverse' then 'K' when 'gruneisen' then '1' when 'gruneisen_longitudinal' then '1' when 'gruneisen_transverse' then '1' when 'molar_heat_capacity_p' then 'J/(mol K)' when 'bulk_modulus' then 'Pa' when 'electrical_resistivity' then 'ohm m' end),
	CONSTRAINT "property_value_range" CHECK (case when "property_value"."property" like 'gruneisen%' then abs("property_value"."value") <= 20 else "property_value"."value" > 0 and "property_value"."value" < 'Infinity' end),
	CONSTRAINT "property_value_uncertainty" CHECK ("property_value"."uncertainty" is null or ("property_value"."uncertainty" >= 0 and "property_value"."uncertainty" < 'Infinity')),
	CONSTRAINT "property_value_temperature" CHECK ("property_value"."temperature_k" is null or ("property_value"."temperature_k" > 0 and "property_value"."temperature_k" < 'Infinity')),
	CONSTRAINT "property_value_basis" CHECK ("property_value"."basis" in ('measured', 'published', 'derived', 'estimated')),
	CONSTRAINT "property_value_verification" CHECK (case when "property_value"."basis" in ('measured', 'published') then "property_value"."verification" in ('checked', 'from memory') and "property_value"."verification" is not null else "property_value"."verification" is null end)
);
--> statement-breakpoint
CREATE TABLE "scattering_parameter" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"material_id" uuid NOT NULL,
	"sample" text,
	"quantity" text NOT NULL,
	"value" double precision NOT NULL,
	"unit" text NOT NULL,
	"source_key" text NOT NULL,
	"basis" text NOT NULL,
	"verification" text,
	"note" text,
	CONSTRAINT "scattering_parameter_range" CHECK ("scattering_parameter"."value" > '-Infinity' and "scattering_parameter"."value" < 'Infinity'),
	CONSTRAINT "scattering_parameter_basis" CHECK ("scattering_parameter"."basis" in ('measured', 'published', 'derived', 'estimated')),
	CONSTRAINT "scattering_parameter_verification" CHECK (case when "scattering_parameter"."basis" in ('measured', 'published') then "scattering_parameter"."verification" in ('checked', 'from memory') and "scattering_parameter"."verification" is not null else "scattering_parameter"."verification" is null end)
);
--> statement-breakpoint
CREATE TABLE "thermal_expansion" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"material_id" uuid NOT NULL,
	"alpha_linear_per_k" double precision NOT NULL,
	"direction" text,
	"temperature_k" double precision,
	"source_key" text NOT NULL,
	"basis" text NOT NULL,
	"verification" text,
	"note" text,
	CONSTRAINT "thermal_expansion_range" CHECK (abs("thermal_expansion"."alpha_linear_per_k") < 0.01),
	CONSTRAINT "thermal_expansion_temperature" CHECK ("thermal_expansion"."temperature_k" is null or ("thermal_expansion"."temperature_k" > 0 and "thermal_expansion"."temperature_k" < 'Infinity')),
	CONSTRAINT "thermal_expansion_basis" CHECK ("thermal_expansion"."basis" in ('measured', 'published', 'derived', 'estimated')),
	CONSTRAINT "thermal_expansion_verification" CHECK (case when "thermal_expansion"."basis" in ('measured', 'published') then "thermal_expansion"."verification" in ('checked', 'from memory') and "thermal_expansion"."verification" is not null else "thermal_expansion"."verification" is null end)
);
--> statement-breakpoint
CREATE TABLE "transition" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"material_id" uuid NOT NULL,
	"kind" text NOT NULL,
	"temperature_k" double precision NOT NULL,
	"source_key" text NOT NULL,
	"basis" text NOT NULL,
	"verification" text,
	"note" text,
	CONSTRAINT "transition_kind" CHECK ("transition"."kind" in ('melting', 'decomposition', 'transition')),
	CONSTRAINT "transition_temperature" CHECK ("transition"."temperature_k" > 0 and "transition"."temperature_k" < 'Infinity'),
	CONSTRAINT "transition_basis" CHECK ("transition"."basis" in ('measured', 'published', 'derived', 'estimated')),
	CONSTRAINT "transition_verification" CHECK (case when "transition"."basis" in ('measured', 'published') then "transition"."verification" in ('checked', 'from memory') and "transition"."verification" is not null else "transition"."verification" is null end)
);
--> statement-breakpoint
CREATE TABLE "zone_boundary_frequency" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"material_id" uuid NOT NULL,
	"point" text NOT NULL,
	"branch" text NOT NULL,
	"frequency_hz" double precision NOT NULL,
	"temperature_k" double precision,
	"source_key" text NOT NULL,
	"basis" text NOT NULL,
	"verification" text,
	"note" text,
	CONSTRAINT "zone_boundary_frequency_branch" CHECK ("zone_boundary_frequency"."branch" in ('LA', 'TA', 'LO', 'TO')),
	CONSTRAINT "zone_boundary_frequency_range" CHECK ("zone_boundary_frequency"."frequency_hz" > 0 and "zone_boundary_frequency"."frequency_hz" < 'Infinity'),
	CONSTRAINT "zone_boundary_frequency_temperature" CHECK ("zone_boundary_frequency"."temperature_k" is null or ("zone_boundary_frequency"."temperature_k" > 0 and "zone_boundary_frequency"."temperature_k" < 'Infinity')),
	CONSTRAINT "zone_boundary_frequency_basis" CHECK ("zone_boundary_frequency"."basis" in ('measured', 'published', 'derived', 'estimated')),
	CONSTRAINT "zone_boundary_frequency_verification" CHECK (case when "zone_boundary_frequency"."basis" in ('measured', 'published') then "zone_boundary_frequency"."verification" in ('checked', 'from memory') and "zone_boundary_frequency"."verification" is not null else "zone_boundary_frequency"."verification" is null end)
);
--> statement-breakpoint
CREATE TABLE "measurement" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"material_id" uuid NOT NULL,
	"sample_id" uuid NOT NULL,
	"series" text NOT NULL,
	"quantity" text NOT NULL,
	"direction" text,
	"method" text,
	"source_key" text NOT NULL,
	"is_preferred" boolean DEFAULT false NOT NULL,
	"note" text,
	"position" integer NOT NULL,
	CONSTRAINT "measurement_series_of_material" UNIQUE("material_id","series"),
	CONSTRAINT "measurement_quantity" CHECK ("measurement"."quantity" in ('total', 'lattice', 'not-stated'))
);
--> statement-breakpoint
CREATE TABLE "measurement_point" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"measurement_id" uuid NOT NULL,
	"temperature_k" double precision NOT NULL,
	"kappa_w_per_m_k" double precision NOT NULL,
	"uncertainty_w_per_m_k" double precision,
	"basis" text NOT NULL,
	"verification" text,
	"note" text,
	CONSTRAINT "measurement_point_temperature_of_series" UNIQUE("measurement_id","temperature_k"),
	CONSTRAINT "measurement_point_temperature" CHECK ("measurement_point"."temperature_k" > 0 and "measurement_point"."temperature_k" < 'Infinity'),
	CONSTRAINT "measurement_point_kappa" CHECK ("measurement_point"."kappa_w_per_m_k" > 0 and "measurement_point"."kappa_w_per_m_k" < 'Infinity'),
	CONSTRAINT "measurement_point_uncertainty" CHECK ("measurement_point"."uncertainty_w_per_m_k" is null or ("measurement_point"."uncertainty_w_per_m_k" >= 0 and "measurement_point"."uncertainty_w_per_m_k" < 'Infinity')),
	CONSTRAINT "measurement_point_basis" CHECK ("measurement_point"."basis" in ('measured', 'published', 'derived', 'estimated')),
	CONSTRAINT "measurement_point_verification" CHECK (case when "measurement_point"."basis" in ('measured', 'published') then "measurement_point"."verification" in ('checked', 'from memory') and "measurement_point"."verification" is not null else "measurement_point"."verification" is null end)
);
--> statement-breakpoint
CREATE TABLE "sample" (
	"id" uuid PRIMARY KEY DEFAULT gen_random_uuid() NOT NULL,
	"material_id" uuid NOT NULL,
	"slug" text NOT NULL,
	"form" text NOT NULL,
	"isotopes" text NOT NULL,
	"size_m" double precision,
	"description" text NOT NULL,
	CONSTRAINT "sample_slug_of_material" UNIQUE("material_id","slug"),
	CONSTRAINT "sample_form" CHECK ("sample"."form" in ('single crystal', 'polycrystal', 'ceramic', 'film', 'wire', 'layer', 'glass', 'evaluated', 'unknown')),
	CONSTRAINT "sample_isotopes" CHECK ("sample"."isotopes" in ('natural', 'enriched', 'mixture', 'unknown')),
	CONSTRAINT "sample_size" CHECK ("sample"."size_m" is null or ("sample"."size_m" > 0 and "sample"."size_m" < 'Infinity'))
);
--> statement-breakpoint
ALTER TABLE "isotope" ADD CONSTRAINT "isotope_source_key_source_key_fk" FOREIGN KEY ("source_key") REFERENCES "public"."source"("key") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "caveat" ADD CONSTRAINT "caveat_material_id_material_id_fk" FOREIGN KEY ("material_id") REFERENCES "public"."material"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "caveat" ADD CONSTRAINT "caveat_source_key_source_key_fk" FOREIGN KEY ("source_key") REFERENCES "public"."source"("key") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "elastic_constant_set" ADD CONSTRAINT "elastic_constant_set_material_id_material_id_fk" FOREIGN KEY ("material_id") REFERENCES "public"."material"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "elastic_constant_set" ADD CONSTRAINT "elastic_constant_set_source_key_source_key_fk" FOREIGN KEY ("source_key") REFERENCES "public"."source"("key") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "property_value" ADD CONSTRAINT "property_value_material_id_material_id_fk" FOREIGN KEY ("material_id") REFERENCES "public"."material"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "property_value" ADD CONSTRAINT "property_value_source_key_source_key_fk" FOREIGN KEY ("source_key") REFERENCES "public"."source"("key") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "scattering_parameter" ADD CONSTRAINT "scattering_parameter_material_id_material_id_fk" FOREIGN KEY ("material_id") REFERENCES "public"."material"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "scattering_parameter" ADD CONSTRAINT "scattering_parameter_source_key_source_key_fk" FOREIGN KEY ("source_key") REFERENCES "public"."source"("key") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "thermal_expansion" ADD CONSTRAINT "thermal_expansion_material_id_material_id_fk" FOREIGN KEY ("material_id") REFERENCES "public"."material"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "thermal_expansion" ADD CONSTRAINT "thermal_expansion_source_key_source_key_fk" FOREIGN KEY ("source_key") REFERENCES "public"."source"("key") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "transition" ADD CONSTRAINT "transition_material_id_material_id_fk" FOREIGN KEY ("material_id") REFERENCES "public"."material"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "transition" ADD CONSTRAINT "transition_source_key_source_key_fk" FOREIGN KEY ("source_key") REFERENCES "public"."source"("key") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "zone_boundary_frequency" ADD CONSTRAINT "zone_boundary_frequency_material_id_material_id_fk" FOREIGN KEY ("material_id") REFERENCES "public"."material"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "zone_boundary_frequency" ADD CONSTRAINT "zone_boundary_frequency_source_key_source_key_fk" FOREIGN KEY ("source_key") REFERENCES "public"."source"("key") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "measurement" ADD CONSTRAINT "measurement_material_id_material_id_fk" FOREIGN KEY ("material_id") REFERENCES "public"."material"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "measurement" ADD CONSTRAINT "measurement_sample_id_sample_id_fk" FOREIGN KEY ("sample_id") REFERENCES "public"."sample"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "measurement" ADD CONSTRAINT "measurement_source_key_source_key_fk" FOREIGN KEY ("source_key") REFERENCES "public"."source"("key") ON DELETE no action ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "measurement_point" ADD CONSTRAINT "measurement_point_measurement_id_measurement_id_fk" FOREIGN KEY ("measurement_id") REFERENCES "public"."measurement"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
ALTER TABLE "sample" ADD CONSTRAINT "sample_material_id_material_id_fk" FOREIGN KEY ("material_id") REFERENCES "public"."material"("id") ON DELETE cascade ON UPDATE no action;--> statement-breakpoint
CREATE INDEX "caveat_material" ON "caveat" USING btree ("material_id");--> statement-breakpoint
CREATE INDEX "elastic_constant_set_material" ON "elastic_constant_set" USING btree ("material_id");--> statement-breakpoint
CREATE INDEX "material_search_text_trigram" ON "material" USING gin ("search_text" gin_trgm_ops);--> statement-breakpoint
CREATE INDEX "material_class" ON "material" USING btree ("class");--> statement-breakpoint
CREATE INDEX "property_value_material" ON "property_value" USING btree ("material_id","property");--> statement-breakpoint
CREATE UNIQUE INDEX "property_value_one_preferred" ON "property_value" USING btree ("material_id","property",(case when "kind" = 'branch' then 'branch' else 'other' end)) WHERE "property_value"."is_preferred";--> statement-breakpoint
CREATE INDEX "scattering_parameter_material" ON "scattering_parameter" USING btree ("material_id");--> statement-breakpoint
CREATE INDEX "thermal_expansion_material" ON "thermal_expansion" USING btree ("material_id");--> statement-breakpoint
CREATE INDEX "transition_material" ON "transition" USING btree ("material_id");--> statement-breakpoint
CREATE INDEX "zone_boundary_frequency_material" ON "zone_boundary_frequency" USING btree ("material_id");--> statement-breakpoint
CREATE UNIQUE INDEX "measurement_one_preferred" ON "measurement" USING btree ("material_id") WHERE "measurement"."is_preferred";--> statement-breakpoint
CREATE INDEX "measurement_point_measurement" ON "measurement_point" USING btree ("measurement_id");