/**
 * W(x)/x² = x²eˣ/(eˣ−1)² = [(x/2)/sinh(x/2)]², the heat capacity of one mode in units of k_B.
 *
 * x = ħω/(k_B T). Written with sinh it neither cancels for small x nor overflows for large x (it becomes 0 above
 * x ≈ 1420). Accuracy: a few units in the last place. NaN for NaN.
 * Source: Einstein, Ann. Phys. 22, 180 (1907).
 */
export function modeHeatCapacityRatio(x: number): number {
  if (x === 0) return 1;
  const ratio = (0.5 * x) / Math.sinh(0.5 * x);
  return ratio * ratio;
}

/**
 * W(x) = x⁴eˣ/(eˣ−1)², the weight with which modes of linear dispersion carry heat.
 *
 * ∫₀^∞ W dx = 4π⁴/15. Source: Debye, Ann. Phys. 39, 789 (1912).
 */
export function boseWeight(x: number): number {
  return x * x * modeHeatCapacityRatio(x);
}
