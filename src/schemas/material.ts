import { z } from 'zod';
import { paginationQueryShape } from '#src/schemas/pagination.ts';
import type { EstimateParameters, Model } from '#src/schemas/estimate.ts';
import type { Basis, SourceReference, Verification } from '#src/schemas/provenance.ts';

/** `GET /api/v1/materials` and `…/{slug}`: questions and answers. */

export const materialSlugSchema = z
  .string()
  .min(1)
  .max(80)
  .regex(
    /^[a-z0-9]+(-[a-z0-9]+)*$/,
    'A slug has lower-case letters, digits and single hyphens, such as "sic-4h".',
  );

const bound = z.coerce.number().min(0).max(1e6).optional();

export const materialListQuerySchema = z.strictObject({
  q: z.string().trim().max(100).optional(),
  class: z.string().max(80).optional(),
  structure: z.string().max(80).optional(),
  element: z
    .string()
    .regex(/^[A-Z][a-z]?$/, 'Give an element symbol, such as "Si".')
    .optional(),
  theta_min_K: bound,
  theta_max_K: bound,
  v_min_m_s: bound,
  v_max_m_s: bound,
  format: z.enum(['json', 'csv']).default('json'),
  ...paginationQueryShape,
});
export type MaterialListQuery = z.infer<typeof materialListQuerySchema>;

export interface MaterialListItem {
  readonly slug: string;
  readonly name: string;
  readonly formula: string;
  readonly structure: string;
  readonly class: string;
  readonly debye_temperature_K: number | null;
  readonly v_L_m_s: number | null;
  readonly v_T_m_s: number | null;
  readonly kappa_300_W_mK: { readonly value: number; readonly basis: 'measured' | 'estimated' } | null;
}

/** One stored value with all that is known of where it comes from. */
export interface StoredValue {
  readonly property: string;
  readonly kind: string;
  readonly value: number;
  readonly unit: string;
  /** Standard uncertainty in the value's unit; null where the source states none. */
  readonly uncertainty: number | null;
  readonly temperature_K: number | null;
  readonly direction: string | null;
  readonly value_set: string | null;
  readonly basis: Basis;
  readonly verification: Verification | null;
  readonly preferred: boolean;
  readonly source: SourceReference;
  readonly note: string | null;
}

export interface MaterialDetail {
  readonly slug: string;
  readonly name: string;
  readonly formula: string;
  readonly aliases: readonly string[];
  readonly structure: string;
  readonly space_group: string | null;
  readonly space_group_number: number | null;
  readonly class: string;
  readonly atoms_per_cell: number | null;
  readonly composition: readonly { readonly element: string; readonly count: number }[];
  readonly hazards: readonly string[];
  readonly note: string | null;
  readonly revision: number;
  /** Everything stored: property values, elastic constants, zone-boundary frequencies, thermal expansion, transitions. */
  readonly values: readonly StoredValue[];
  readonly caveats: readonly {
    readonly text: string;
    readonly source: SourceReference;
    readonly verification: Verification | null;
  }[];
  /** What an estimate of this material would use; may be sent back unchanged as `parameters`. Null when no estimate can be made. */
  readonly estimator_inputs: EstimateParameters | null;
  readonly recommended_model: Model | null;
  /** Why no estimate can be made, a sentence for each missing input. Empty when one can. */
  readonly estimate_obstacles: readonly string[];
  readonly kappa_300_W_mK: { readonly value: number; readonly basis: 'measured' | 'estimated' } | null;
}
