import type { SourceReference, Verification } from '#src/schemas/provenance.ts';

/** `GET /api/v1/materials/{slug}/measurements`. */

export interface MeasurementPoint {
  readonly T_K: number;
  readonly kappa_W_mK: number;
  /** As the source states it, in W/(m K); null where it states none. */
  readonly uncertainty_W_mK: number | null;
  readonly verification: Verification | null;
  readonly note: string | null;
}

export interface MeasurementSeries {
  readonly series: string;
  readonly preferred: boolean;
  /** Whether the source gives the whole conductivity or its lattice part. */
  readonly quantity: 'total' | 'lattice' | 'not-stated';
  readonly direction: string | null;
  readonly method: string | null;
  readonly sample: {
    readonly slug: string;
    readonly form: string;
    readonly isotopes: string;
    readonly size_m: number | null;
    readonly description: string;
  };
  readonly source: SourceReference;
  readonly note: string | null;
  readonly points: readonly MeasurementPoint[];
}

export interface MeasurementList {
  readonly items: readonly MeasurementSeries[];
  readonly next_cursor: null;
}
