import { positive, requireInside } from './domain.ts';

export type PieceForm = 'round-rod' | 'square-rod' | 'grains';

/**
 * Effective length for boundary scattering, m.
 *
 * - round rod: its diameter (Casimir, Physica 5, 495 (1938));
 * - square rod of side d: 2d/√π, the diameter of the circle of equal area (Berman, Foster, Ziman, Proc. R. Soc. A 231, 130 (1955));
 * - polycrystal: the grain size.
 *
 * @throws RangeError for a size that is not positive.
 */
export function effectiveLengthM(piece: { readonly form: PieceForm; readonly sizeM: number }): number {
  const sizeM = requireInside('sizeM', piece.sizeM, positive);
  return piece.form === 'square-rod' ? (2 * sizeM) / Math.sqrt(Math.PI) : sizeM;
}
