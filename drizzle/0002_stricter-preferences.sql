-- The key must stand before the reference to it.
ALTER TABLE "sample" ADD CONSTRAINT "sample_of_material" UNIQUE("id","material_id");
--> statement-breakpoint
ALTER TABLE "measurement" DROP CONSTRAINT "measurement_sample_id_sample_id_fk";
--> statement-breakpoint
ALTER TABLE "measurement" ADD CONSTRAINT "measurement_sample_of_material" FOREIGN KEY ("sample_id","material_id") REFERENCES "public"."sample"("id","material_id") ON DELETE cascade ON UPDATE no action;
--> statement-breakpoint
ALTER TABLE "property_value" ADD CONSTRAINT "property_value_preferred_kind" CHECK (not "property_value"."is_preferred" or ("property_value"."kind" <> 'in-plane' and ("property_value"."property" <> 'gruneisen' or "property_value"."kind" = 'acoustic')));
--> statement-breakpoint
ALTER TABLE "property_value" ADD CONSTRAINT "property_value_branch_set" CHECK ("property_value"."kind" <> 'branch' or "property_value"."value_set" is not null);
--> statement-breakpoint
ALTER TABLE "scattering_parameter" ADD CONSTRAINT "scattering_parameter_unit" CHECK ("scattering_parameter"."unit" in ('1', 'm', 'm/s', 'K', 's', 's^3', 's K^-1', 's K^-3', 'K^-4', 'W/(m K)'));
