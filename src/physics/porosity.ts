import { requireInside } from './domain.ts';

/**
 * Factor by which round closed pores reduce the conductivity of a solid: (1 − φ)/(1 + φ/2).
 *
 * φ volume fraction of pores, 0 ≤ φ < 1; good up to about 0.3 (pores apart from each other, empty, long against the
 * mean free path). Source: Maxwell, Treatise on Electricity and Magnetism (1873); Eucken, Forschungsheft 353 (1932).
 *
 * @throws RangeError outside 0 ≤ φ < 1.
 */
export function porosityFactor(porosity: number): number {
  requireInside('porosity', porosity, { min: 0, max: 1, maxExcluded: true });
  return (1 - porosity) / (1 + 0.5 * porosity);
}
