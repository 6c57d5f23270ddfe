import { z } from 'zod';
import type { Basis, Verification } from '#src/schemas/provenance.ts';

/** `POST /api/v1/estimates`: what may be asked and what is answered. Units are in the names. */

export const modelSchema = z.enum(['gray', 'branch', 'callaway']);
export type Model = z.infer<typeof modelSchema>;

export const mechanismSchema = z.enum(['boundary', 'defect', 'umklapp']);
export type Mechanism = z.infer<typeof mechanismSchema>;

export const temperatureRangeK = { min: 1, max: 3000 } as const;
/** More points than a printed curve can show; keeps one request below about a tenth of a second. */
export const temperatureCountMax = 1000;

const temperatureK = z.number().min(temperatureRangeK.min).max(temperatureRangeK.max);
const positive = z.number().positive();

export const temperaturesSchema = z.union([
  z.array(temperatureK).min(1).max(temperatureCountMax),
  z
    .strictObject({
      from: temperatureK,
      to: temperatureK,
      points: z.number().int().min(1).max(temperatureCountMax),
      spacing: z.enum(['log', 'linear']).default('log'),
    })
    .refine((range) => range.to >= range.from, {
      path: ['to'],
      error: 'The upper temperature lies below the lower one: give "to" at least the value of "from".',
    }),
]);

export const pieceFormSchema = z.enum(['round-rod', 'square-rod', 'grains']);
export type PieceForm = z.infer<typeof pieceFormSchema>;

/** Names and order of the numbers that the estimator takes; `estimator_inputs` of a material has the same. */
export const estimateParametersSchema = z.strictObject({
  cell_volume_A3: positive.max(1e5).optional(),
  atoms_per_cell: z.number().int().min(1).max(1000).optional(),
  mean_mass_u: positive.max(300).optional(),
  debye_temperature_K: positive.max(5000).optional(),
  v_L_m_s: positive.max(50_000).optional(),
  v_T_m_s: positive.max(50_000).optional(),
  theta_L_K: positive.max(5000).optional(),
  theta_T_K: positive.max(5000).optional(),
  gamma_L: positive.max(10).optional(),
  gamma_T: positive.max(10).optional(),
  mass_variance: z.number().min(0).max(1).optional(),
});
export type EstimateParameters = z.infer<typeof estimateParametersSchema>;
export type EstimateParameterName = keyof EstimateParameters;

/** Effective lengths between a tenth of a nanometre and a kilometre: outside it, the unit was mistaken. */
const lengthM = z.number().min(1e-10).max(1e3);

/** `{"Si": {"28": 0.9999, "29": 0.0001}}`: abundances by element and mass number, adding up to 1. */
const isotopesSchema = z.union([
  z.enum(['natural', 'pure']),
  z.record(
    z.string().regex(/^[A-Z][a-z]?$/),
    z.record(z.string().regex(/^[1-9]\d{0,2}$/), z.number().min(0).max(1)),
  ),
]);
export type IsotopeChoice = z.infer<typeof isotopesSchema>;

export const sampleSchema = z
  .strictObject({
    boundary_length_m: lengthM.nullable().optional(),
    piece: z.strictObject({ form: pieceFormSchema, size_m: lengthM }).optional(),
    specularity: z.number().min(0).lt(1).default(0),
    isotopes: isotopesSchema.default('natural'),
    defect_mass_variance: z.number().min(0).max(1).default(0),
    porosity: z.number().min(0).lt(1).default(0),
  })
  .refine((sample) => sample.piece === undefined || sample.boundary_length_m === undefined, {
    path: ['piece'],
    error: 'Give either "piece" or "boundary_length_m", not both: each sets the effective length.',
  });
export type EstimateSample = z.infer<typeof sampleSchema>;

/** Effective length of a good crystal, used when a request names neither length nor piece. */
export const defaultBoundaryLengthM = 0.005;

export const estimateRequestSchema = z
  .strictObject({
    material: z.string().min(1).max(80).optional(),
    parameters: estimateParametersSchema.optional(),
    model: modelSchema.optional(),
    temperatures_K: temperaturesSchema,
    sample: sampleSchema.prefault({}),
    umklapp_scale: z.number().min(0).max(1e6).default(1),
    mechanisms: z.array(mechanismSchema).min(1).max(3).optional(),
    interval: z.boolean().default(true),
  })
  .refine((request) => request.material !== undefined || request.parameters !== undefined, {
    path: ['material'],
    error: 'Name a material of the store, or give "parameters", or both.',
  });
export type EstimateRequest = z.infer<typeof estimateRequestSchema>;
/** What a caller writes, before defaults are filled in. */
export type EstimateRequestInput = z.input<typeof estimateRequestSchema>;

export interface EstimatePoint {
  readonly T_K: number;
  readonly kappa_W_mK: number;
  readonly low_W_mK: number | null;
  readonly high_W_mK: number | null;
  readonly heat_capacity_J_m3K: number;
  readonly velocity_m_s: number;
  readonly mean_free_path_m: number;
  readonly porosity_factor: number;
  readonly share: Readonly<Partial<Record<Mechanism, number>>>;
  readonly floor_W_mK: number | null;
}

export interface EstimateInput {
  readonly name: EstimateParameterName | 'average_v_L_m_s' | 'average_v_T_m_s';
  readonly value: number;
  /** Standard uncertainty (k = 1) in the value's unit; null where the source states none. */
  readonly uncertainty: number | null;
  readonly basis: Basis | 'given';
  readonly verification: Verification | null;
  /** Kind of quantity, for people: "calorimetric, 0 K", "LA at X", "Hill average", "natural abundances". */
  readonly kind: string | null;
  /** One line: the citation, or how the value was derived, or "given in the request". */
  readonly source: string;
  readonly source_key: string | null;
  readonly note: string | null;
}

export interface Caution {
  readonly code: string;
  readonly message: string;
}

export interface EstimateResponse {
  readonly material: string | null;
  readonly model: Model;
  readonly umklapp_scale: number;
  readonly effective_length_m: number | null;
  readonly mass_variance: { readonly isotopes: number; readonly defects: number; readonly total: number };
  readonly points: readonly EstimatePoint[];
  readonly inputs: readonly EstimateInput[];
  readonly cautions: readonly Caution[];
}
