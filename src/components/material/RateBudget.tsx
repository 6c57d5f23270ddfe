import { area, line } from 'd3';
import { memo, useId, type ReactNode } from 'react';
import { percent, type ChartFrame } from '#src/components/material/chart-frame.ts';
import { mechanismWords } from '#src/components/material/budget-words.ts';
import { allMechanisms } from '#src/components/material/operating-point.ts';
import { Figures } from '#src/components/text/Figures.tsx';
import { formatPercent } from '#src/lib/format.ts';
import type { EstimatePoint, Mechanism } from '#src/schemas/estimate.ts';

interface Props {
  readonly frame: ChartFrame;
  readonly points: readonly EstimatePoint[];
  readonly description: string;
  readonly isDimmed: boolean;
}

interface Layer {
  readonly mechanism: Mechanism;
  /** Per cent of the width; shares from below. */
  readonly edges: readonly { readonly x: number; readonly lower: number; readonly upper: number }[];
}

function layersOf(frame: ChartFrame, points: readonly EstimatePoint[]): Layer[] {
  const below = points.map(() => 0);
  return allMechanisms.flatMap((mechanism) => {
    if (points.every((point) => (point.share[mechanism] ?? 0) === 0)) return [];
    const edges = points.map((point, index) => {
      const lower = below[index] ?? 0;
      const upper = Math.min(1, lower + (point.share[mechanism] ?? 0));
      below[index] = upper;
      return { x: frame.x(point.T_K), lower, upper };
    });
    return [{ mechanism, edges }];
  });
}

/** Of the plot's height: a name of 14 px and its air in 92 px. */
const labelHeight = 0.24;
/** Of the width of a phone's plot, per letter of 14 px. */
const letterWidthPercent = 2.8;

/** Where a name fits inside its own area: the middle of the widest stretch that is high enough. */
function labelSpot(layer: Layer): { x: number; y: number } | null {
  let best: { from: number; to: number } | null = null;
  let from: number | null = null;
  layer.edges.forEach(({ x, lower, upper }, index) => {
    const isHigh = upper - lower >= labelHeight;
    if (isHigh && from === null) from = x;
    if (from === null || (isHigh && index < layer.edges.length - 1)) return;
    if (best === null || x - from > best.to - best.from) best = { from, to: x };
    from = null;
  });
  const stretch = best as { from: number; to: number } | null;
  const needed = mechanismWords[layer.mechanism].length * letterWidthPercent;
  if (stretch === null || stretch.to - stretch.from < needed) return null;
  const middle = (stretch.from + stretch.to) / 2;
  // A slanted edge may cut the name: it stands at the height that its own stretch leaves free.
  const under = layer.edges.filter(({ x }) => Math.abs(x - middle) <= needed / 2);
  const lowest = Math.max(...under.map(({ lower }) => lower));
  const highest = Math.min(...under.map(({ upper }) => upper));
  if (highest - lowest < labelHeight * 0.75) return null;
  return { x: middle, y: (1 - (lowest + highest) / 2) * 100 };
}

/** Shares of the scattering by mechanism over the same temperature axis as κ(T), stacked to the whole. */
export const RateBudget = memo(function RateBudget({
  frame,
  points,
  description,
  isDimmed,
}: Props): ReactNode {
  const id = useId();
  const layers = layersOf(frame, points).map((layer) => ({ ...layer, spot: labelSpot(layer) }));
  const first = points[0];
  const last = points.at(-1);
  if (first === undefined || last === undefined) return null;
  const left = frame.x(first.T_K);
  const width = frame.x(last.T_K) - left;
  const beside = layers.filter(({ spot }) => spot === null);

  return (
    <>
      <svg
        className={isDimmed ? 'plot budget-plot dims dimmed' : 'plot budget-plot dims'}
        role="img"
        aria-labelledby={`${id}-title ${id}-description`}
      >
        <title id={`${id}-title`}>Rate budget</title>
        <desc id={`${id}-description`}>{description}</desc>
        <text x="0" y="50%" dx="-12" dy="-4" textAnchor="end">
          rate
        </text>
        <text x="0" y="50%" dx="-12" dy="12" textAnchor="end">
          budget
        </text>
        <svg viewBox="0 0 1000 1000" preserveAspectRatio="none" width="100%" height="100%">
          {layers.map(({ mechanism, edges }) => (
            <path
              key={mechanism}
              className={`area-${mechanism}`}
              data-share={mechanism}
              d={
                area<(typeof edges)[number]>()
                  .x(({ x }) => x * 10)
                  .y0(({ lower }) => (1 - lower) * 1000)
                  .y1(({ upper }) => (1 - upper) * 1000)
                  .digits(1)(edges) ?? ''
              }
            />
          ))}
          {layers.slice(0, -1).map(({ mechanism, edges }) => (
            <path
              key={mechanism}
              className="area-edge"
              d={
                line<(typeof edges)[number]>()
                  .x(({ x }) => x * 10)
                  .y(({ upper }) => (1 - upper) * 1000)
                  .digits(1)(edges) ?? ''
              }
            />
          ))}
        </svg>
        <rect className="area-frame" x={percent(left)} y="0" width={percent(width)} height="100%" />
        {layers.map(
          ({ mechanism, spot }) =>
            spot !== null && (
              <text
                key={mechanism}
                className={`on-${mechanism}`}
                x={percent(spot.x)}
                y={percent(spot.y)}
                dy="5"
                textAnchor="middle"
              >
                {mechanismWords[mechanism]}
              </text>
            ),
        )}
      </svg>
      {beside.length > 0 && (
        <p className="mt-6 text-margin text-soft">
          {beside.map(({ mechanism }, index) => {
            const most = Math.max(...points.map((point) => point.share[mechanism] ?? 0));
            return (
              <span key={mechanism}>
                {index > 0 && ', '}
                <svg width="11" height="11" aria-hidden="true" className="mr-1 inline-block">
                  <rect width="11" height="11" className={`area-${mechanism}`} />
                </svg>
                {mechanismWords[mechanism]} at most <Figures text={formatPercent(most)} />
              </span>
            );
          })}
        </p>
      )}
    </>
  );
});
