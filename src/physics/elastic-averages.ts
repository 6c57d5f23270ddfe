/**
 * Elastic constants C_ij in Pa, Voigt notation, by crystal system; what symmetry fixes is left out:
 * - cubic: three constants;
 * - hexagonal: C66 = (C11 − C12)/2;
 * - trigonal, classes 32, 3m and −3m: C66 likewise, C24 = −C14, C56 = C14;
 * - tetragonal, classes 4mm, 422, −42m and 4/mmm (C16 = 0).
 */
export type ElasticConstants =
  | {
      readonly system: 'cubic';
      readonly constantsPa: { readonly c11: number; readonly c12: number; readonly c44: number };
    }
  | { readonly system: 'hexagonal'; readonly constantsPa: HexagonalConstants }
  | { readonly system: 'trigonal'; readonly constantsPa: HexagonalConstants & { readonly c14: number } }
  | { readonly system: 'tetragonal'; readonly constantsPa: HexagonalConstants & { readonly c66: number } };

export interface HexagonalConstants {
  readonly c11: number;
  readonly c12: number;
  readonly c13: number;
  readonly c33: number;
  readonly c44: number;
}

export interface ElasticAverages {
  readonly bulkVoigtPa: number;
  readonly bulkReussPa: number;
  readonly bulkHillPa: number;
  readonly shearVoigtPa: number;
  readonly shearReussPa: number;
  readonly shearHillPa: number;
}

interface UniaxialConstants extends HexagonalConstants {
  readonly c14: number;
  readonly c66: number;
}

/** All four systems as one: uniaxial constants with C14 and C66 written out. */
function toUniaxial(elastic: ElasticConstants): UniaxialConstants {
  switch (elastic.system) {
    case 'cubic': {
      const { c11, c12, c44 } = elastic.constantsPa;
      return { c11, c12, c13: c12, c33: c11, c44, c14: 0, c66: c44 };
    }
    case 'hexagonal': {
      const { c11, c12 } = elastic.constantsPa;
      return { ...elastic.constantsPa, c14: 0, c66: 0.5 * (c11 - c12) };
    }
    case 'trigonal': {
      const { c11, c12 } = elastic.constantsPa;
      return { ...elastic.constantsPa, c66: 0.5 * (c11 - c12) };
    }
    case 'tetragonal':
      return { ...elastic.constantsPa, c14: 0 };
  }
}

/**
 * A crystal is stable when its stiffness matrix is positive definite. For uniaxial constants the matrix falls apart
 * into the blocks checked here (Mouhat and Coudert, Phys. Rev. B 90, 224104 (2014)).
 */
function isStable({ c11, c12, c13, c33, c44, c14, c66 }: UniaxialConstants): boolean {
  return (
    c11 > Math.abs(c12) &&
    c33 * (c11 + c12) > 2 * c13 ** 2 &&
    c44 > 0 &&
    c66 > 0 &&
    (c11 - c12) * c44 > 2 * c14 ** 2
  );
}

/** The combinations of compliances that Reuss's averages need, from inverting the blocks of the stiffness matrix. */
function compliances({ c11, c12, c13, c33, c44, c14, c66 }: UniaxialConstants): {
  readonly diagonal: number;
  readonly offDiagonal: number;
  readonly shear: number;
} {
  const symmetric = c33 * (c11 + c12) - 2 * c13 ** 2;
  const sum11And12 = c33 / symmetric;
  const s13 = -c13 / symmetric;
  const s33 = (c11 + c12) / symmetric;
  const antisymmetric = (c11 - c12) * c44 - 2 * c14 ** 2;
  const difference11And12 = c44 / antisymmetric;
  const s44 = (c11 - c12) / antisymmetric;
  const s11 = 0.5 * (sum11And12 + difference11And12);
  const s12 = 0.5 * (sum11And12 - difference11And12);
  const s55 = s44;
  // C66 couples with C56 = C14 only in trigonal crystals, where S66 = 2(S11 − S12).
  const s66 = c14 === 0 ? 1 / c66 : 2 * difference11And12;
  return { diagonal: 2 * s11 + s33, offDiagonal: s12 + 2 * s13, shear: s44 + s55 + s66 };
}

/**
 * Voigt, Reuss and Hill averages of the bulk and shear modulus, Pa.
 *
 *   9 K_V = ΣC_ii + 2ΣC_ij,           1/K_R = ΣS_ii + 2ΣS_ij        (i, j = 1..3, i < j; k = 4..6)
 *   15 G_V = ΣC_ii − ΣC_ij + 3ΣC_kk,  15/G_R = 4ΣS_ii − 4ΣS_ij + 3ΣS_kk
 *   Hill: the arithmetic mean of the two.
 *
 * Voigt (equal strain) is an upper and Reuss (equal stress) a lower limit for a polycrystal without texture.
 * Source: Hill, Proc. Phys. Soc. A 65, 349 (1952).
 *
 * @throws RangeError when a constant is not finite, or no stable crystal has these constants.
 */
export function voigtReussHill(elastic: ElasticConstants): ElasticAverages {
  for (const [name, value] of Object.entries(elastic.constantsPa)) {
    if (!Number.isFinite(value))
      throw new RangeError(`constantsPa.${name} must be a finite number; it is ${value}.`);
  }
  const constants = toUniaxial(elastic);
  if (!isStable(constants)) {
    throw new RangeError(
      `constantsPa must be those of a stable ${elastic.system} crystal (stiffness matrix positive definite); ` +
        `they are ${JSON.stringify(elastic.constantsPa)}. Check signs and units.`,
    );
  }
  const { c11, c12, c13, c33, c44, c66 } = constants;
  const { diagonal, offDiagonal, shear } = compliances(constants);
  const bulkVoigtPa = (2 * c11 + c33 + 2 * (c12 + 2 * c13)) / 9;
  const shearVoigtPa = (2 * c11 + c33 - (c12 + 2 * c13) + 3 * (2 * c44 + c66)) / 15;
  const bulkReussPa = 1 / (diagonal + 2 * offDiagonal);
  const shearReussPa = 15 / (4 * diagonal - 4 * offDiagonal + 3 * shear);
  return {
    bulkVoigtPa,
    bulkReussPa,
    bulkHillPa: 0.5 * (bulkVoigtPa + bulkReussPa),
    shearVoigtPa,
    shearReussPa,
    shearHillPa: 0.5 * (shearVoigtPa + shearReussPa),
  };
}
