export * from './sources.ts';
export * from './isotopes.ts';
export * from './properties.ts';
export * from './materials.ts';
export * from './measurements.ts';
