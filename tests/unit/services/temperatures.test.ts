import { describe, expect, it } from 'vitest';
import { expandTemperaturesK } from '#src/services/temperatures.ts';
import { expectRelative } from '#tests/support/approx.ts';

describe('the temperatures of a request', () => {
  it('stay in the order given', () => {
    expect(expandTemperaturesK([300, 10, 77])).toEqual([300, 10, 77]);
  });

  it.each(['log', 'linear'] as const)('begin and end exactly where a %s range says', (spacing) => {
    for (const points of [2, 3, 200, 1000]) {
      const expanded = expandTemperaturesK({ from: 1, to: 3000, points, spacing });
      expect(expanded).toHaveLength(points);
      expect([expanded[0], expanded.at(-1)]).toEqual([1, 3000]);
      expect(expanded.every((temperature) => temperature >= 1 && temperature <= 3000)).toBe(true);
    }
  });

  it('have a constant ratio, or a constant difference', () => {
    const [, second, third] = expandTemperaturesK({ from: 1, to: 1000, points: 4, spacing: 'log' });
    expectRelative(second ?? NaN, 10, { within: 1e-12, because: 'decades' });
    expectRelative(third ?? NaN, 100, { within: 1e-12, because: 'decades' });
    expect(expandTemperaturesK({ from: 100, to: 300, points: 3, spacing: 'linear' })).toEqual([
      100, 200, 300,
    ]);
  });

  it('are one when one point is asked for', () => {
    expect(expandTemperaturesK({ from: 300, to: 400, points: 1, spacing: 'log' })).toEqual([300]);
  });
});
