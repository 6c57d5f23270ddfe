import { notNegative, positive, requireInside } from './domain.ts';

/** One isotope of an element: its mass and the fraction of the element's atoms that are of it. */
export interface Isotope {
  readonly massU: number;
  readonly fraction: number;
}

/** One sublattice of a compound without substitution: an element and how many of its atoms a formula unit has. */
export interface ElementSite {
  readonly atomsPerFormula: number;
  readonly isotopes: readonly Isotope[];
}

/** Site of a compound with its mean mass and its own scattering parameter Γ_s. */
export interface ScatteringSite {
  readonly atomsPerFormula: number;
  readonly meanMassU: number;
  readonly parameter: number;
}

/** Printed abundances add up to 1 within about 1e-5; a larger gap is a slip. */
const fractionSumTolerance = 1e-3;

/** Fractions scaled so that they add up to 1 exactly. */
function normalised<Part extends { readonly fraction: number }>(
  argument: string,
  parts: readonly Part[],
): readonly Part[] {
  const sum = parts.reduce((total, part, index) => {
    return total + requireInside(`${argument}[${index}].fraction`, part.fraction, notNegative);
  }, 0);
  if (!(Math.abs(sum - 1) <= fractionSumTolerance)) {
    throw new RangeError(
      `The fractions of ${argument} must add up to 1 (within ${fractionSumTolerance}); they add up to ${sum}.`,
    );
  }
  return parts.map((part) => ({ ...part, fraction: part.fraction / sum }));
}

function checkedIsotopes(isotopes: readonly Isotope[]): readonly Isotope[] {
  isotopes.forEach((isotope, index) => requireInside(`isotopes[${index}].massU`, isotope.massU, positive));
  return normalised('isotopes', isotopes);
}

/**
 * m̄ = Σ f_i m_i, mean mass of an element, u.
 *
 * @throws RangeError for a mass that is not positive, or fractions that are negative or do not add up to 1.
 */
export function meanIsotopeMassU(isotopes: readonly Isotope[]): number {
  return checkedIsotopes(isotopes).reduce((sum, { massU, fraction }) => sum + fraction * massU, 0);
}

/** Σ f (1 − a/ā)², the relative variance of a quantity a. */
function relativeVariance(parts: readonly { readonly fraction: number; readonly amount: number }[]): number {
  const mean = parts.reduce((sum, { fraction, amount }) => sum + fraction * amount, 0);
  return parts.reduce((sum, { fraction, amount }) => sum + fraction * (1 - amount / mean) ** 2, 0);
}

/**
 * g = Σ f_i (1 − m_i/m̄)², mass variance of an element by its isotopes.
 *
 * Source: Klemens, Proc. Phys. Soc. A 68, 1113 (1955).
 *
 * @throws RangeError for a mass that is not positive, or fractions that are negative or do not add up to 1.
 */
export function elementMassVariance(isotopes: readonly Isotope[]): number {
  return relativeVariance(
    checkedIsotopes(isotopes).map(({ massU, fraction }) => ({ fraction, amount: massU })),
  );
}

/**
 * Γ = Σ_s c_s (m̄_s/M̄)² Γ_s / Σ_s c_s, point-defect parameter of a compound from those of its sites.
 *
 * c_s atoms of the site per formula unit; m̄_s mean mass of the site, M̄ of all atoms.
 * Source: Slack, Phys. Rev. 126, 427 (1962); Abeles, Phys. Rev. 131, 1906 (1963).
 *
 * @throws RangeError for counts or masses that are not positive, a negative Γ_s, or an empty list.
 */
export function compoundMassVariance(sites: readonly ScatteringSite[]): number {
  if (sites.length === 0) throw new RangeError('sites must name at least one site; the list is empty.');
  sites.forEach((site, index) => {
    requireInside(`sites[${index}].atomsPerFormula`, site.atomsPerFormula, positive);
    requireInside(`sites[${index}].meanMassU`, site.meanMassU, positive);
    requireInside(`sites[${index}].parameter`, site.parameter, notNegative);
  });
  const atoms = sites.reduce((sum, { atomsPerFormula }) => sum + atomsPerFormula, 0);
  const mass = sites.reduce((sum, { atomsPerFormula, meanMassU }) => sum + atomsPerFormula * meanMassU, 0);
  const meanMassU = mass / atoms;
  const weighted = sites.reduce(
    (sum, site) => sum + site.atomsPerFormula * (site.meanMassU / meanMassU) ** 2 * site.parameter,
    0,
  );
  return weighted / atoms;
}

/**
 * Γ of a compound by its isotopes, from its composition.
 *
 *   g_s = Σ f_i (1 − m_i/m̄_s)²,  Γ = Σ_s c_s (m̄_s/M̄)² g_s / Σ_s c_s
 *
 * Example: natural GaAs 9.16e-5. Source: Klemens 1955; for compounds Slack 1962, Abeles 1963.
 *
 * @throws RangeError as `elementMassVariance` and `compoundMassVariance` do.
 */
export function isotopeMassVariance(composition: readonly ElementSite[]): number {
  return compoundMassVariance(
    composition.map(({ atomsPerFormula, isotopes }) => ({
      atomsPerFormula,
      meanMassU: meanIsotopeMassU(isotopes),
      parameter: elementMassVariance(isotopes),
    })),
  );
}
