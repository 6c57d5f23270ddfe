import type { EstimatePoint, Mechanism } from '#src/schemas/estimate.ts';
import { allMechanisms } from '#src/components/material/operating-point.ts';

export const mechanismWords: Readonly<Record<Mechanism, string>> = {
  boundary: 'boundary',
  defect: 'defect',
  umklapp: 'Umklapp',
};

/** Whom each mechanism lets the phonons meet, as the end of a sentence. */
const culprits: Readonly<Record<Mechanism, string>> = {
  boundary: 'the crystal’s own surface',
  defect: 'isotopes and other point defects',
  umklapp: 'other phonons',
};

/** The mechanism with the largest share at a point; null when none is stated. */
export function limitedBy(point: EstimatePoint): { mechanism: Mechanism; share: number } | null {
  let largest: { mechanism: Mechanism; share: number } | null = null;
  for (const mechanism of allMechanisms) {
    const share = point.share[mechanism];
    if (share !== undefined && share > (largest?.share ?? 0)) largest = { mechanism, share };
  }
  return largest;
}

interface Reign {
  readonly mechanism: Mechanism;
  readonly fromK: number;
  readonly toK: number;
}

function reigns(points: readonly EstimatePoint[]): Reign[] {
  const list: Reign[] = [];
  for (const point of points) {
    const mechanism = limitedBy(point)?.mechanism;
    if (mechanism === undefined) continue;
    const last = list.at(-1);
    if (last?.mechanism === mechanism) list[list.length - 1] = { ...last, toK: point.T_K };
    else list.push({ mechanism, fromK: point.T_K, toK: point.T_K });
  }
  return list;
}

/** Two figures are as sharp as a crossover is. */
function about(temperatureK: number): string {
  return String(Number(temperatureK.toPrecision(2)));
}

/** Which mechanism turns back most heat, and where: "Below 22 K mostly the crystal’s own surface; above it other phonons." */
export function budgetInWords(points: readonly EstimatePoint[]): string {
  const list = reigns(points);
  const [first] = list;
  if (first === undefined) return '';
  if (list.length === 1) return `At every temperature drawn it is mostly ${culprits[first.mechanism]}.`;
  const parts = list.map((reign, index) => {
    const next = list[index + 1];
    const culprit = culprits[reign.mechanism];
    if (index === 0) return `Below ${about(next?.fromK ?? reign.toK)}\u202fK it is mostly ${culprit}`;
    if (next === undefined) return `above ${about(reign.fromK)}\u202fK ${culprit}`;
    return `from there to ${about(next.fromK)}\u202fK ${culprit}`;
  });
  return `${parts.join('; ')}.`;
}
