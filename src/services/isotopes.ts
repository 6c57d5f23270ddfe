import type { Composition, IsotopeRecord } from '#src/db/queries/records.ts';
import { AppError } from '#src/lib/errors.ts';
import type { FieldError } from '#src/lib/errors.ts';
import { isotopeMassVariance, meanIsotopeMassU } from '#src/physics/index.ts';
import type { ElementSite, Isotope } from '#src/physics/index.ts';
import type { IsotopeChoice } from '#src/schemas/estimate.ts';

/** Isotopes of a compound: mean mass and mass variance from composition and abundances. */

export interface IsotopeMix {
  /** M̄, mean mass of an atom, u. */
  readonly meanMassU: number;
  /** Γ by isotopes. */
  readonly massVariance: number;
  /** For people: "natural abundances". */
  readonly kind: string;
}

/** Fractions of one element must add up to 1 this closely. */
const fractionTolerance = 1e-6;

function naturalIsotopes(element: string, table: readonly IsotopeRecord[]): readonly IsotopeRecord[] {
  return table.filter((isotope) => isotope.element === element && isotope.abundanceFraction > 0);
}

function asPhysics(isotopes: readonly IsotopeRecord[]): readonly Isotope[] {
  return isotopes.map(({ massU, abundanceFraction }) => ({ massU, fraction: abundanceFraction }));
}

function mostAbundant(isotopes: readonly IsotopeRecord[]): IsotopeRecord | undefined {
  return isotopes.reduce<IsotopeRecord | undefined>(
    (best, isotope) =>
      best === undefined || isotope.abundanceFraction > best.abundanceFraction ? isotope : best,
    undefined,
  );
}

function mixOf(sites: readonly ElementSite[], kind: string): IsotopeMix {
  const atoms = sites.reduce((sum, { atomsPerFormula }) => sum + atomsPerFormula, 0);
  const mass = sites.reduce(
    (sum, { atomsPerFormula, isotopes }) => sum + atomsPerFormula * meanIsotopeMassU(isotopes),
    0,
  );
  return { meanMassU: mass / atoms, massVariance: isotopeMassVariance(sites), kind };
}

/** One element's abundances as the request gives them. */
function givenIsotopes(
  element: string,
  fractions: Readonly<Record<string, number>>,
  table: readonly IsotopeRecord[],
): readonly Isotope[] | readonly FieldError[] {
  const known = table.filter((isotope) => isotope.element === element);
  const path = `sample.isotopes.${element}`;
  const errors: FieldError[] = [];
  const isotopes: Isotope[] = [];
  for (const [massNumber, fraction] of Object.entries(fractions)) {
    const isotope = known.find((candidate) => String(candidate.massNumber) === massNumber);
    if (isotope === undefined) {
      const numbers = known.map((candidate) => candidate.massNumber).join(', ');
      errors.push({
        path: `${path}.${massNumber}`,
        message: `${element} has no isotope with mass number ${massNumber} in the store: give ${numbers}.`,
      });
    } else {
      isotopes.push({ massU: isotope.massU, fraction });
    }
  }
  const sum = Object.values(fractions).reduce((total, fraction) => total + fraction, 0);
  if (Math.abs(sum - 1) > fractionTolerance) {
    errors.push({
      path,
      message: `The fractions of ${element} add up to ${Number(sum.toPrecision(9))}: they must add up to 1, each between 0 and 1.`,
    });
  }
  return errors.length > 0 ? errors : isotopes;
}

function isFieldErrors(result: readonly Isotope[] | readonly FieldError[]): result is readonly FieldError[] {
  return result.some((entry) => 'path' in entry);
}

/**
 * The mix of isotopes of a compound, or null where the store lacks the isotopes of one of its elements.
 * `pure` takes the most abundant isotope of each element; elements that given abundances leave out stay natural.
 *
 * @throws AppError INVALID_INPUT for elements that are not in the compound, unknown mass numbers, or fractions that do
 * not add up to 1.
 */
export function mixIsotopes(
  composition: readonly Composition[],
  table: readonly IsotopeRecord[],
  choice: IsotopeChoice,
): IsotopeMix | null {
  const natural = composition.map(({ element, count }) => ({
    element,
    atomsPerFormula: count,
    isotopes: naturalIsotopes(element, table),
  }));
  if (natural.length === 0 || natural.some(({ isotopes }) => isotopes.length === 0)) return null;
  const toSites = (sites: typeof natural): readonly ElementSite[] =>
    sites.map(({ atomsPerFormula, isotopes }) => ({ atomsPerFormula, isotopes: asPhysics(isotopes) }));
  if (choice === 'natural') return mixOf(toSites(natural), 'natural abundances');
  if (choice === 'pure') {
    const chosen = natural.map((site) => ({ ...site, isotope: mostAbundant(site.isotopes) }));
    const sites = chosen.map(({ atomsPerFormula, isotope }) => ({
      atomsPerFormula,
      isotopes: isotope === undefined ? [] : [{ massU: isotope.massU, fraction: 1 }],
    }));
    const names = chosen.map(({ element, isotope }) => `${element}-${isotope?.massNumber ?? ''}`).join(', ');
    return mixOf(sites, `isotopically pure: ${names}`);
  }
  return mixGiven(natural, table, choice);
}

function mixGiven(
  natural: readonly { element: string; atomsPerFormula: number; isotopes: readonly IsotopeRecord[] }[],
  table: readonly IsotopeRecord[],
  choice: Readonly<Record<string, Readonly<Record<string, number>>>>,
): IsotopeMix {
  const elements = natural.map(({ element }) => element);
  const errors: FieldError[] = Object.keys(choice)
    .filter((element) => !elements.includes(element))
    .map((element) => ({
      path: `sample.isotopes.${element}`,
      message: `${element} is not in this material: give abundances of ${elements.join(', ')}.`,
    }));
  const sites = natural.map(({ element, atomsPerFormula, isotopes }): ElementSite => {
    const fractions = choice[element];
    if (fractions === undefined) return { atomsPerFormula, isotopes: asPhysics(isotopes) };
    const given = givenIsotopes(element, fractions, table);
    if (!isFieldErrors(given)) return { atomsPerFormula, isotopes: given };
    errors.push(...given);
    return { atomsPerFormula, isotopes: asPhysics(isotopes) };
  });
  if (errors.length > 0) {
    const detail = errors[0]?.message ?? 'The isotopes cannot be used.';
    throw new AppError('INVALID_INPUT', detail, { fields: errors });
  }
  const named = Object.keys(choice);
  return mixOf(sites, named.length === 0 ? 'natural abundances' : `abundances given for ${named.join(', ')}`);
}
