import type { StoredValue } from '#src/schemas/material.ts';

/** Where the crystal stops being one, K: the lowest melting or decomposition temperature stored. Null when none is. */
export function solidUpToK(values: readonly StoredValue[]): number | null {
  const ends = values.filter(
    ({ property, kind, unit }) => unit === 'K' && /melting|decomposition/.test(`${property} ${kind}`),
  );
  return ends.length === 0 ? null : Math.min(...ends.map(({ value }) => value));
}

const wholeDescriptions =
  /glass|structure|polytype|form\b|chains|layered|ordered|molecular|salt|alloy|ice|type/i;

/** "diamond" as "diamond structure"; descriptions that are whole already stay as they are. */
export function structureWords(structure: string): string {
  return wholeDescriptions.test(structure) || structure.includes('(') ? structure : `${structure} structure`;
}

const namedProperties: Readonly<Record<string, string>> = {
  sound_velocity_longitudinal: 'sound velocity, longitudinal',
  sound_velocity_transverse: 'sound velocity, transverse',
  gruneisen: 'Grüneisen parameter',
  gruneisen_longitudinal: 'Grüneisen parameter, longitudinal',
  gruneisen_transverse: 'Grüneisen parameter, transverse',
  debye_temperature: 'Debye temperature',
  acoustic_debye_temperature: 'acoustic Debye temperature',
  molar_heat_capacity_p: 'molar heat capacity at constant pressure',
  zone_boundary_temperature_longitudinal: 'zone-boundary temperature, longitudinal',
  zone_boundary_temperature_transverse: 'zone-boundary temperature, transverse',
  zone_boundary_frequency: 'zone-boundary frequency',
};

/** A property of the store in words. */
export function propertyWords(property: string): string {
  return namedProperties[property] ?? property.replace(/_/g, ' ');
}

/** "fine-dust" in words; the flag only flags. */
export function hazardWords(hazard: string): string {
  return hazard.replace(/-/g, ' ');
}
