import type { EstimatePoint } from '#src/schemas/estimate.ts';

/** Figures of κ: an estimate is good for two, the third keeps neighbouring temperatures apart. */
export const kappaFigures = 3;
const fewestFigures = 4;
const mostFigures = 9;

function rounded(value: number, figures: number): number {
  return Number(value.toPrecision(figures));
}

/**
 * How many figures C, v, l and the porosity factor must show so that a reader who multiplies what is displayed,
 * with ⅓, gets the displayed κ.
 */
export function factorFigures(point: EstimatePoint): number {
  const displayed = rounded(point.kappa_W_mK, kappaFigures);
  for (let figures = fewestFigures; figures < mostFigures; figures += 1) {
    const product =
      (rounded(point.heat_capacity_J_m3K, figures) *
        rounded(point.velocity_m_s, figures) *
        rounded(point.mean_free_path_m, figures) *
        rounded(point.porosity_factor, figures)) /
      3;
    if (rounded(product, kappaFigures) === displayed) return figures;
  }
  return mostFigures;
}
