import { expect } from 'vitest';

/**
 * Expects two numbers to agree within a relative tolerance, and says why that tolerance.
 * Zero is met only by zero.
 */
export function expectRelative(
  actual: number,
  expected: number,
  { within, because }: { readonly within: number; readonly because: string },
): void {
  const deviation = relativeDeviation(actual, expected);
  expect(
    deviation <= within,
    `got ${actual}, expected ${expected}: ${deviation.toExponential(2)} apart, allowed ${within.toExponential(2)} (${because})`,
  ).toBe(true);
}

/** |a − b|/|b|; 0 when both are the same number, NaN when one is not a number. */
export function relativeDeviation(actual: number, expected: number): number {
  return actual === expected ? 0 : Math.abs(actual - expected) / Math.abs(expected);
}
