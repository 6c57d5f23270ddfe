import { line } from 'd3';
import { useId, type ReactNode } from 'react';
import { chartFrame, kappaExtent, percent, ticksWithin } from '#src/components/material/chart-frame.ts';
import { Marker } from '#src/components/material/Marker.tsx';
import { formatQuantity } from '#src/lib/format.ts';
import type { EstimatePoint } from '#src/schemas/estimate.ts';
import type { MeasurementSeries } from '#src/schemas/measurement.ts';

interface Props {
  readonly name: string;
  readonly extentK: readonly [number, number];
  readonly estimate: readonly EstimatePoint[];
  readonly series: MeasurementSeries | null;
  readonly pointedK: number;
}

/** κ(T) small enough to stand beside a sentence: decades only, one measured series. */
export function KappaSparkline({ name, extentK, estimate, series, pointedK }: Props): ReactNode {
  const id = useId();
  const frame = chartFrame(extentK, kappaExtent([estimate], series === null ? [] : [series]));
  const path = line<EstimatePoint>()
    .x((point) => frame.x(point.T_K) * 10)
    .y((point) => frame.y(point.kappa_W_mK) * 10)
    .digits(0)(estimate);
  const x = percent(frame.x(pointedK));
  return (
    <svg className="plot spark-plot" role="img" aria-labelledby={`${id}-title`}>
      <title id={`${id}-title`}>{`κ(T) of ${name}, logarithmic axes: estimate and measured values`}</title>
      {ticksWithin(extentK)
        .filter(({ isDecade }) => isDecade)
        .map(({ value }) => (
          <g key={`T${value}`}>
            <line
              className="grid-decade"
              x1={percent(frame.x(value))}
              x2={percent(frame.x(value))}
              y1="0"
              y2="100%"
            />
            <text x={percent(frame.x(value))} y="100%" dy="16" textAnchor="middle">
              {formatQuantity(value, value === 100 ? { unit: 'K' } : {})}
            </text>
          </g>
        ))}
      {ticksWithin(frame.kappaExtent_W_mK)
        .filter(({ isDecade }) => isDecade)
        .map(({ value }) => (
          <g key={`k${value}`}>
            <line
              className="grid-decade"
              x1="0"
              x2="100%"
              y1={percent(frame.y(value))}
              y2={percent(frame.y(value))}
            />
            <text x="0" y={percent(frame.y(value))} dx="-6" dy="4" textAnchor="end">
              {formatQuantity(value)}
            </text>
          </g>
        ))}
      <line className="pointed" x1={x} x2={x} y1="0" y2="100%" />
      <svg viewBox="0 0 1000 1000" preserveAspectRatio="none" width="100%" height="100%">
        <path className="line-estimate" d={path ?? ''} />
      </svg>
      {series?.points
        .filter((point) => point.T_K >= extentK[0] && point.T_K <= extentK[1])
        .map((point, index) => (
          <svg
            key={index}
            x={percent(frame.x(point.T_K))}
            y={percent(frame.y(point.kappa_W_mK))}
            className="overflow-visible"
          >
            <g transform="scale(0.75)">
              <Marker index={0} />
            </g>
          </svg>
        ))}
    </svg>
  );
}
