import type { EstimateRequest } from '#src/schemas/estimate.ts';

type Temperatures = EstimateRequest['temperatures_K'];

/** The temperatures a request names, K: a list as it stands, or a range from its first to its last value inclusive. */
export function expandTemperaturesK(temperatures: Temperatures): readonly number[] {
  if (!('from' in temperatures)) return temperatures;
  const { from, to, points, spacing } = temperatures;
  if (points === 1) return [from];
  return Array.from({ length: points }, (_, index) => {
    // The ends as given, free of rounding: 3000 must not become 3000.0000000000005.
    if (index === 0) return from;
    if (index === points - 1) return to;
    const part = index / (points - 1);
    return spacing === 'log' ? from * (to / from) ** part : from + (to - from) * part;
  });
}
