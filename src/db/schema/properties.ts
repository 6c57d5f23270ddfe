/**
 * The quantities a material may have, each with one unit in the store (SI) and one in the CSV files, so that no row
 * ever needs its unit guessed.
 */
export const propertyUnits = {
  density: { si: 'kg/m^3', csv: 'kg/m^3', siPerCsv: 1 },
  lattice_parameter_a: { si: 'm', csv: 'angstrom', siPerCsv: 1e-10 },
  lattice_parameter_b: { si: 'm', csv: 'angstrom', siPerCsv: 1e-10 },
  lattice_parameter_c: { si: 'm', csv: 'angstrom', siPerCsv: 1e-10 },
  cell_volume: { si: 'm^3', csv: 'angstrom^3', siPerCsv: 1e-30 },
  debye_temperature: { si: 'K', csv: 'K', siPerCsv: 1 },
  acoustic_debye_temperature: { si: 'K', csv: 'K', siPerCsv: 1 },
  sound_velocity_longitudinal: { si: 'm/s', csv: 'm/s', siPerCsv: 1 },
  sound_velocity_transverse: { si: 'm/s', csv: 'm/s', siPerCsv: 1 },
  zone_boundary_temperature_longitudinal: { si: 'K', csv: 'K', siPerCsv: 1 },
  zone_boundary_temperature_transverse: { si: 'K', csv: 'K', siPerCsv: 1 },
  gruneisen: { si: '1', csv: '1', siPerCsv: 1 },
  gruneisen_longitudinal: { si: '1', csv: '1', siPerCsv: 1 },
  gruneisen_transverse: { si: '1', csv: '1', siPerCsv: 1 },
  molar_heat_capacity_p: { si: 'J/(mol K)', csv: 'J/(mol K)', siPerCsv: 1 },
  bulk_modulus: { si: 'Pa', csv: 'GPa', siPerCsv: 1e9 },
  electrical_resistivity: { si: 'ohm m', csv: 'ohm m', siPerCsv: 1 },
} as const satisfies Record<string, { si: string; csv: string; siPerCsv: number }>;

export type PropertyName = keyof typeof propertyUnits;

/** In the order of the table above. */
export const propertyNames = [
  'density',
  'lattice_parameter_a',
  'lattice_parameter_b',
  'lattice_parameter_c',
  'cell_volume',
  'debye_temperature',
  'acoustic_debye_temperature',
  'sound_velocity_longitudinal',
  'sound_velocity_transverse',
  'zone_boundary_temperature_longitudinal',
  'zone_boundary_temperature_transverse',
  'gruneisen',
  'gruneisen_longitudinal',
  'gruneisen_transverse',
  'molar_heat_capacity_p',
  'bulk_modulus',
  'electrical_resistivity',
] as const satisfies readonly PropertyName[];
