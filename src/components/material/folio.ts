import type { OperatingPoint } from '#src/components/material/operating-point.ts';
import type { FieldError } from '#src/lib/errors.ts';
import type { EstimateResponse, Model } from '#src/schemas/estimate.ts';
import type { MeasurementSeries } from '#src/schemas/measurement.ts';

/** Why the server gave no estimate for an operating point. */
export interface Refusal {
  readonly message: string;
  readonly fields: readonly FieldError[];
}

/** What the material page hands to its island: plain data, the same on the server and in the browser. */
export interface Folio {
  readonly slug: string;
  readonly name: string;
  readonly elements: readonly string[];
  /** Where the temperature axis runs, K. */
  readonly extentK: readonly [number, number];
  readonly defaults: OperatingPoint;
  /** The query part of the address the page was asked with. */
  readonly query: string;
  readonly recommendedModel: Model | null;
  /** Why no estimate of this material can be made; empty when one can. */
  readonly obstacles: readonly string[];
  /** In reading order; markers are given out in it. */
  readonly series: readonly MeasurementSeries[];
  /** The answer for the address; null when refused or impossible. */
  readonly estimate: EstimateResponse | null;
  readonly refusal: Refusal | null;
  /** The answer at the default operating point; null where it is the one above or could not be had. */
  readonly reference: EstimateResponse | null;
}
