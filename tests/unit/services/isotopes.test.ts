import { describe, expect, it } from 'vitest';
import { AppError } from '#src/lib/errors.ts';
import { mixIsotopes } from '#src/services/isotopes.ts';
import { expectRelative } from '#tests/support/approx.ts';
import { isotopes } from '#tests/unit/services/facts.ts';

const silicon = [{ element: 'Si', count: 1 }];
const galliumArsenide = [
  { element: 'Ga', count: 1 },
  { element: 'As', count: 1 },
];

function refusal(work: () => unknown): AppError {
  try {
    work();
  } catch (error) {
    if (error instanceof AppError) return error;
    throw error;
  }
  throw new Error('It was accepted.');
}

describe('isotopes of a material', () => {
  it('give natural silicon its printed mass variance and atomic weight', () => {
    const mix = mixIsotopes(silicon, isotopes, 'natural');
    // Morelli, Heremans, Slack, Phys. Rev. B 66, 195304 (2002): 2.01e-4. IUPAC standard atomic weight 28.085.
    expectRelative(mix?.massVariance ?? NaN, 2.01e-4, { within: 0.005, because: 'three printed figures' });
    expectRelative(mix?.meanMassU ?? NaN, 28.085, { within: 4e-5, because: 'five printed figures' });
  });

  it('give natural gallium arsenide its printed mass variance', () => {
    const mix = mixIsotopes(galliumArsenide, isotopes, 'natural');
    // physics.md section 5, printed for GaAs: 9.16e-5.
    expectRelative(mix?.massVariance ?? NaN, 9.16e-5, { within: 0.002, because: 'three printed figures' });
  });

  it('do not scatter when each element has one, the most abundant, and the mass follows', () => {
    const mix = mixIsotopes(galliumArsenide, isotopes, 'pure');
    expect(mix?.massVariance).toBe(0);
    expectRelative(mix?.meanMassU ?? NaN, (68.9255736 + 74.9215965) / 2, {
      within: 1e-12,
      because: 'the same sum',
    });
    expect(mix?.kind).toContain('Ga-69, As-75');
  });

  it('count as pure when they are given as pure', () => {
    const given = mixIsotopes(silicon, isotopes, { Si: { '28': 1 } });
    const pure = mixIsotopes(silicon, isotopes, 'pure');
    expect(given?.meanMassU).toBe(pure?.meanMassU);
    expect(given?.massVariance).toBe(0);
  });

  it('scatter as a mixture of two does: g = f(1 − f)(Δm/m̄)²', () => {
    const f = 0.25;
    const [light, heavy] = [27.9769265, 29.9737702];
    const mean = (1 - f) * light + f * heavy;
    const mix = mixIsotopes(silicon, isotopes, { Si: { '28': 1 - f, '30': f } });
    expectRelative(mix?.massVariance ?? NaN, f * (1 - f) * ((heavy - light) / mean) ** 2, {
      within: 1e-12,
      because: 'variance of two values, algebra',
    });
  });

  it('stay natural for elements that the request leaves out', () => {
    const mix = mixIsotopes(galliumArsenide, isotopes, { Ga: { '69': 0.60108, '71': 0.39892 } });
    expect(mix).toMatchObject({
      massVariance: mixIsotopes(galliumArsenide, isotopes, 'natural')?.massVariance,
    });
  });

  it('are not known where the store lacks an element', () => {
    expect(mixIsotopes([{ element: 'Pu', count: 1 }], isotopes, 'natural')).toBeNull();
    expect(mixIsotopes([], isotopes, 'pure')).toBeNull();
  });
});

describe('abundances that cannot be', () => {
  it.each([
    [{ Si: { '28': 0.9, '29': 0.05 } }, 'sample.isotopes.Si'],
    [{ Si: {} }, 'sample.isotopes.Si'],
    [{ Si: { '28': 0.5, '31': 0.5 } }, 'sample.isotopes.Si.31'],
    [{ Ge: { '70': 1 } }, 'sample.isotopes.Ge'],
  ])('are refused by name: %j', (choice, path) => {
    const error = refusal(() => mixIsotopes(silicon, isotopes, choice));
    expect(error.status).toBe(422);
    expect(error.fields.map((field) => field.path)).toContain(path);
  });

  it('may miss 1 by a millionth and no more', () => {
    expect(() => mixIsotopes(silicon, isotopes, { Si: { '28': 0.999_999_1 } })).not.toThrow();
    expect(() => mixIsotopes(silicon, isotopes, { Si: { '28': 0.999_998 } })).toThrow(/add up to 0.999998/);
  });

  it('are named all at once', () => {
    const error = refusal(() =>
      mixIsotopes(galliumArsenide, isotopes, { Si: { '28': 1 }, Ga: { '69': 0.5 } }),
    );
    expect(error.fields.map(({ path }) => path)).toEqual(['sample.isotopes.Si', 'sample.isotopes.Ga']);
  });
});
