/** Checks on arguments: each message names the argument, what is allowed and what was given. */

export interface Interval {
  readonly min: number;
  readonly max: number;
  /** The limits themselves are refused where these are true. */
  readonly minExcluded?: boolean;
  readonly maxExcluded?: boolean;
}

export const positive: Interval = { min: 0, max: Number.MAX_VALUE, minExcluded: true };
export const notNegative: Interval = { min: 0, max: Number.MAX_VALUE };
/** Temperatures for which the conductivity models are meant (and their integrals tested). */
export const modelTemperatureK: Interval = { min: 1, max: 3000 };

function describeInterval(interval: Interval): string {
  const { min, max, minExcluded = false, maxExcluded = false } = interval;
  const lower = `${minExcluded ? 'above' : 'at least'} ${min}`;
  if (max === Number.MAX_VALUE) return `a finite number ${lower}`;
  return `${lower} and ${maxExcluded ? 'below' : 'at most'} ${max}`;
}

/**
 * Passes a number on when it lies in its interval.
 *
 * @throws RangeError naming the argument, the allowed interval and the value; NaN and infinities are outside every interval.
 */
export function requireInside(argument: string, value: number, interval: Interval): number {
  const { min, max, minExcluded = false, maxExcluded = false } = interval;
  const isInside = (minExcluded ? value > min : value >= min) && (maxExcluded ? value < max : value <= max);
  if (!isInside) throw new RangeError(`${argument} must be ${describeInterval(interval)}; it is ${value}.`);
  return value;
}

/** @throws RangeError unless the value is a whole number of at least 1. */
export function requireCount(argument: string, value: number): number {
  if (!Number.isSafeInteger(value) || value < 1) {
    throw new RangeError(`${argument} must be a whole number of at least 1; it is ${value}.`);
  }
  return value;
}
