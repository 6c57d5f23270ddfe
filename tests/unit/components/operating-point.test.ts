import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  allMechanisms,
  defaultOperatingPoint,
  fieldOfPath,
  isotopeChoices,
  modelChoices,
  pieceChoices,
  readNumber,
  readOperatingPoint,
  readQuestion,
  writeOperatingPoint,
  type OperatingPoint,
} from '#src/components/material/operating-point.ts';
import { estimateRequestSchema } from '#src/schemas/estimate.ts';

const defaults = defaultOperatingPoint('300');

function ask(change: Partial<OperatingPoint>, elements: readonly string[] = ['Si']) {
  return readQuestion({
    material: 'si',
    elements,
    point: { ...defaults, ...change },
    temperaturesK: [10, 100, 300, 1000],
    extentK: [2, 1500],
  });
}

function requestOf(change: Partial<OperatingPoint>, elements?: readonly string[]) {
  const asked = ask(change, elements);
  if (asked.kind !== 'request') throw new Error(asked.problems.map(({ message }) => message).join(' '));
  return asked.request;
}

function complaintsOf(change: Partial<OperatingPoint>, elements?: readonly string[]) {
  const asked = ask(change, elements);
  return asked.kind === 'problems' ? asked.problems : [];
}

describe('the operating point in the address', () => {
  it('is nothing at the defaults', () => {
    expect(writeOperatingPoint(defaults, defaults).toString()).toBe('');
  });

  it('comes back as it was written, whatever was typed', () => {
    const typed = fc
      .string({ minLength: 1, maxLength: 20 })
      .map((text) => text.trim())
      .filter((text) => text !== '');
    const points = fc.record<OperatingPoint>({
      form: fc.constantFrom(...pieceChoices),
      size: typed,
      unit: fc.constantFrom('nm', 'um', 'mm', 'm'),
      isotopes: fc.constantFrom(...isotopeChoices),
      abundances: fc.constant({}),
      defects: typed,
      porosity: typed,
      model: fc.constantFrom('recommended', ...modelChoices),
      scale: typed,
      specularity: typed,
      mechanisms: fc.subarray([...allMechanisms], { minLength: 1 }),
      at: typed,
    });
    fc.assert(
      fc.property(points, (point) => {
        const address = writeOperatingPoint(point, defaults).toString();
        expect(readOperatingPoint(new URLSearchParams(address), defaults)).toEqual(point);
      }),
    );
  });

  it('keeps abundances of enriched isotopes', () => {
    const point: OperatingPoint = {
      ...defaults,
      isotopes: 'enriched',
      abundances: { Si: '28 99.99; 29 0.01' },
    };
    const address = writeOperatingPoint(point, defaults).toString();
    expect(readOperatingPoint(new URLSearchParams(address), defaults)).toEqual(point);
  });

  it('falls back to the default for a word that no control offers', () => {
    const read = readOperatingPoint(new URLSearchParams('form=sphere&model=best&unit=inch'), defaults);
    expect(read).toEqual(defaults);
  });
});

describe('the question asked of the server', () => {
  it('is accepted by the schema of the API at the defaults', () => {
    const parsed = estimateRequestSchema.parse(requestOf({}));
    expect(parsed.sample.piece).toEqual({ form: 'round-rod', size_m: 0.005 });
    expect(parsed.sample.isotopes).toBe('natural');
    expect(parsed.umklapp_scale).toBe(1);
    expect(parsed.model).toBeUndefined();
    expect(parsed.mechanisms).toBeUndefined();
  });

  it('turns a length in micrometres into metres and per cent into a fraction', () => {
    const { sample } = estimateRequestSchema.parse(
      requestOf({ form: 'grains', size: '2.5', unit: 'um', porosity: '12' }),
    );
    expect(sample.piece?.size_m).toBeCloseTo(2.5e-6, 15);
    expect(sample.porosity).toBe(0.12);
  });

  it('asks for no boundary with null and for an effective length as such', () => {
    expect(requestOf({ form: 'endless', size: 'nonsense' }).sample?.boundary_length_m).toBeNull();
    expect(requestOf({ form: 'length', size: '3' }).sample?.boundary_length_m).toBe(0.003);
  });

  it('gives abundances by element and mass number as fractions', () => {
    const { sample } = estimateRequestSchema.parse(
      requestOf({ isotopes: 'enriched', abundances: { Si: '28 99.99; 29 0.01 %' } }),
    );
    expect(sample.isotopes).toEqual({ Si: { '28': 0.9999, '29': 0.0001 } });
  });

  it('adds the temperature pointed at, once and in order', () => {
    expect(requestOf({ at: '77.5' }).temperatures_K).toEqual([10, 77.5, 100, 300, 1000]);
    expect(requestOf({ at: '100' }).temperatures_K).toEqual([10, 100, 300, 1000]);
  });
});

describe('a mistake in a control', () => {
  it('is named with the value and the remedy, at the control that has it', () => {
    const [complaint, ...others] = complaintsOf({ porosity: '120' });
    expect(others).toEqual([]);
    expect(complaint?.field).toBe('porosity');
    expect(complaint?.message).toContain('120');
    expect(complaint?.message).toContain('below 100');
  });

  it('is found in every number at once', () => {
    const fields = complaintsOf({
      size: 'five',
      defects: '-1',
      porosity: '',
      scale: 'x',
      specularity: '1',
      at: '1e4',
    }).map(({ field }) => field);
    expect(fields.sort()).toEqual(['at', 'defects', 'porosity', 'scale', 'size', 'specularity']);
  });

  it('is a decimal comma, and the sentence says so', () => {
    expect(complaintsOf({ size: '1,5' })[0]?.message).toContain('decimal with a point');
  });

  it('is abundances that do not add up, or none at all', () => {
    expect(complaintsOf({ isotopes: 'enriched', abundances: { Si: '28 90' } })[0]?.message).toContain('90 %');
    expect(complaintsOf({ isotopes: 'enriched' })[0]?.field).toBe('isotopes');
    expect(complaintsOf({ isotopes: 'enriched', abundances: { Si: 'mostly 28' } })[0]?.message).toContain(
      'mostly 28',
    );
  });

  it('is no mechanism left', () => {
    expect(complaintsOf({ mechanisms: [] })[0]?.field).toBe('mechanisms');
  });

  it('as the server names it finds its control again', () => {
    expect(fieldOfPath('sample.piece.size_m')).toBe('size');
    expect(fieldOfPath('sample.boundary_length_m')).toBe('size');
    expect(fieldOfPath('sample.isotopes.Si.31')).toBe('isotopes');
    expect(fieldOfPath('sample.defect_mass_variance')).toBe('defects');
    expect(fieldOfPath('sample.porosity')).toBe('porosity');
    expect(fieldOfPath('umklapp_scale')).toBe('scale');
    expect(fieldOfPath('mechanisms')).toBe('mechanisms');
    expect(fieldOfPath('temperatures_K.3')).toBe('at');
    expect(fieldOfPath('material')).toBeNull();
  });
});

describe('a number as people type it', () => {
  it.each([
    ['1e-4', 1e-4],
    ['2.01 × 10^-4', 2.01e-4],
    ['10\u2009000', 10000],
    ['\u22122', -2],
    ['.5', 0.5],
  ])('%s is understood', (text, value) => {
    expect(readNumber(text)).toBe(value);
  });

  it.each(['', 'abc', '1,5', '0x10', 'Infinity', '1e'])('%s is not a number', (text) => {
    expect(readNumber(text)).toBeNaN();
  });
});
