import { z } from 'zod';

/** Where a value comes from. Estimated values are model results; derived ones follow from other stored values. */
export const basisSchema = z.enum(['measured', 'published', 'derived', 'estimated']);
export type Basis = z.infer<typeof basisSchema>;

/** Whether somebody compared the value with its source. Null for derived and estimated values: there is nothing to compare. */
export const verificationSchema = z.enum(['checked', 'from memory']);
export type Verification = z.infer<typeof verificationSchema>;

/** A citation as every value carries it. */
export interface SourceReference {
  readonly key: string;
  /** One line for people: authors, title or container, year. */
  readonly citation: string;
  readonly doi: string | null;
}
