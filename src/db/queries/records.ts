import type { Basis, SourceReference, Verification } from '#src/schemas/provenance.ts';

/** What the read queries give to the services. Values in the unit of the store (SI). */

export interface Composition {
  readonly element: string;
  /** Atoms per formula unit; not whole for alloys and solid solutions. */
  readonly count: number;
}

export interface MaterialRecord {
  readonly id: string;
  readonly slug: string;
  readonly name: string;
  readonly formula: string;
  readonly aliases: readonly string[];
  readonly composition: readonly Composition[];
  readonly structure: string;
  readonly spaceGroup: string | null;
  readonly spaceGroupNumber: number | null;
  readonly class: string;
  readonly atomsPerCell: number | null;
  readonly hazards: readonly string[];
  readonly note: string | null;
  readonly revision: number;
}

/** One stored value of a property, elastic constant, frequency, expansion coefficient or transition. */
export interface ValueRecord {
  readonly property: string;
  readonly kind: string;
  readonly valueSet: string | null;
  readonly value: number;
  readonly unit: string;
  readonly uncertainty: number | null;
  readonly temperatureK: number | null;
  readonly direction: string | null;
  readonly source: SourceReference;
  readonly basis: Basis;
  readonly verification: Verification | null;
  readonly preferred: boolean;
  readonly note: string | null;
}

export interface IsotopeRecord {
  readonly element: string;
  readonly massNumber: number;
  readonly massU: number;
  readonly abundanceFraction: number;
}

export interface CaveatRecord {
  readonly text: string;
  readonly source: SourceReference;
  readonly verification: Verification | null;
}

export interface MeasuredPointRecord {
  readonly temperatureK: number;
  readonly kappaWPerMK: number;
  readonly uncertaintyWPerMK: number | null;
  readonly verification: Verification | null;
  readonly note: string | null;
}

export interface MeasuredSeriesRecord {
  readonly series: string;
  readonly preferred: boolean;
  readonly quantity: 'total' | 'lattice' | 'not-stated';
  readonly direction: string | null;
  readonly method: string | null;
  readonly sample: {
    readonly slug: string;
    readonly form: string;
    readonly isotopes: string;
    readonly sizeM: number | null;
    readonly description: string;
  };
  readonly source: SourceReference;
  readonly note: string | null;
  readonly points: readonly MeasuredPointRecord[];
}
