/** Where the names of curves stand: close to what they name, on nothing else, on a wide screen and on a phone. */

export interface Spot {
  /** Per cent of the plot's width and height; y runs downwards. */
  readonly x: number;
  readonly y: number;
}

export interface LabelRequest {
  readonly key: string;
  /** Characters shown on a wide plot and on a narrow one. */
  readonly length: { readonly wide: number; readonly narrow: number };
  /** Points of what the label names. */
  readonly own: readonly Spot[];
}

interface PlotSize {
  readonly kind: 'wide' | 'narrow';
  readonly widthPx: number;
  readonly heightPx: number;
}

/** The plot at 1280 and at 390 px; the styles of `.kappa-plot` give the heights. */
const plotSizes: readonly PlotSize[] = [
  { kind: 'wide', widthPx: 680, heightPx: 400 },
  { kind: 'narrow', widthPx: 284, heightPx: 320 },
];

const characterPx = 7.2;
const ascentPx = 12;
const descentPx = 4;
const clearancePx = 8;

interface Box {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

function boxAt(spot: Spot, characters: number, size: PlotSize): Box {
  const left = (spot.x / 100) * size.widthPx;
  const baseline = (spot.y / 100) * size.heightPx;
  return {
    left,
    right: left + characters * characterPx,
    top: baseline - ascentPx,
    bottom: baseline + descentPx,
  };
}

function distancePx(box: Box, spot: Spot, size: PlotSize): number {
  const x = (spot.x / 100) * size.widthPx;
  const y = (spot.y / 100) * size.heightPx;
  return Math.hypot(Math.max(box.left - x, 0, x - box.right), Math.max(box.top - y, 0, y - box.bottom));
}

function overlaps(a: Box, b: Box): boolean {
  return (
    a.left < b.right + clearancePx &&
    b.left < a.right + clearancePx &&
    a.top < b.bottom + clearancePx &&
    b.top < a.bottom + clearancePx
  );
}

function candidates(): Spot[] {
  const spots: Spot[] = [];
  for (let x = 2; x <= 92; x += 3) for (let y = 6; y <= 97; y += 3) spots.push({ x, y });
  return spots;
}

/**
 * One spot for each label, by key, text running right from it. A label for which no free spot exists is left out:
 * the list under the chart names every curve as well.
 */
export function placeLabels(
  requests: readonly LabelRequest[],
  everything: readonly Spot[],
): ReadonlyMap<string, Spot> {
  const placed = new Map<string, Spot>();
  const taken = new Map<PlotSize, Box[]>(plotSizes.map((size) => [size, []]));
  const spots = candidates();
  for (const request of requests) {
    let best: { spot: Spot; score: number } | null = null;
    for (const spot of spots) {
      const isFree = plotSizes.every((size) => {
        const box = boxAt(spot, request.length[size.kind], size);
        return (
          box.right <= size.widthPx - 4 &&
          box.bottom <= size.heightPx - 4 &&
          (taken.get(size) ?? []).every((other) => !overlaps(box, other)) &&
          everything.every((obstacle) => distancePx(box, obstacle, size) >= clearancePx)
        );
      });
      if (!isFree) continue;
      const score = plotSizes.reduce((sum, size) => {
        const box = boxAt(spot, request.length[size.kind], size);
        return sum + Math.min(...request.own.map((own) => distancePx(box, own, size)));
      }, 0);
      if (best === null || score < best.score) best = { spot, score };
    }
    if (best === null) continue;
    placed.set(request.key, best.spot);
    for (const size of plotSizes) {
      taken.get(size)?.push(boxAt(best.spot, request.length[size.kind], size));
    }
  }
  return placed;
}
