import { line } from 'd3';
import { memo, useId, type ReactNode } from 'react';
import { percent, ticksWithin, type ChartFrame } from '#src/components/material/chart-frame.ts';
import { placeLabels, type LabelRequest, type Spot } from '#src/components/material/label-placement.ts';
import { Marker } from '#src/components/material/Marker.tsx';
import { seriesWords } from '#src/components/material/measured-series.ts';
import { formatQuantity } from '#src/lib/format.ts';
import type { EstimatePoint } from '#src/schemas/estimate.ts';
import type { MeasurementSeries } from '#src/schemas/measurement.ts';

export interface DrawnSeries {
  readonly series: MeasurementSeries;
  /** Which marker; the same wherever the series is named. */
  readonly marker: number;
}

interface Props {
  readonly frame: ChartFrame;
  readonly title: string;
  readonly description: string;
  readonly estimate: readonly EstimatePoint[] | null;
  /** The estimate at the default operating point, drawn thin when the reader has left it. */
  readonly reference: readonly EstimatePoint[] | null;
  readonly drawn: readonly DrawnSeries[];
  readonly isDimmed: boolean;
}

type Pick = (point: EstimatePoint) => number | null;

function spotsOf(frame: ChartFrame, points: readonly EstimatePoint[], pick: Pick): Spot[] {
  return points.flatMap((point) => {
    const value = pick(point);
    if (value === null || value <= 0 || value < frame.kappaExtent_W_mK[0] * 0.8) return [];
    return [{ x: frame.x(point.T_K), y: frame.y(value) }];
  });
}

function pathOf(spots: readonly Spot[]): string {
  return (
    line<Spot>()
      .x((spot) => spot.x * 10)
      .y((spot) => spot.y * 10)
      .digits(1)(spots) ?? ''
  );
}

function seriesSpots(frame: ChartFrame, series: MeasurementSeries): Spot[] {
  return series.points
    .filter((point) => point.T_K >= frame.extentK[0] && point.T_K <= frame.extentK[1])
    .map((point) => ({ x: frame.x(point.T_K), y: frame.y(point.kappa_W_mK) }));
}

/** The still part of the κ(T) chart: grid, curves, markers, names. The pointed temperature is drawn over it. */
export const KappaPlot = memo(function KappaPlot({
  frame,
  title,
  description,
  estimate,
  reference,
  drawn,
  isDimmed,
}: Props): ReactNode {
  const id = useId();
  const temperatureTicks = ticksWithin(frame.extentK);
  const kappaTicks = ticksWithin(frame.kappaExtent_W_mK);
  const decades = Math.log10(frame.kappaExtent_W_mK[1] / frame.kappaExtent_W_mK[0]);

  const estimateSpots = spotsOf(frame, estimate ?? [], (point) => point.kappa_W_mK);
  const floorSpots = spotsOf(frame, estimate ?? [], (point) => point.floor_W_mK);
  const referenceSpots = spotsOf(frame, reference ?? [], (point) => point.kappa_W_mK);
  const markers = drawn.map(({ series, marker }) => ({
    series,
    marker,
    spots: seriesSpots(frame, series),
  }));
  const named = markers.length <= 3 ? markers : markers.filter(({ series }) => series.preferred);
  const requests: LabelRequest[] = [
    ...(estimateSpots.length > 0
      ? [{ key: 'estimate', length: { wide: 8, narrow: 8 }, own: estimateSpots }]
      : []),
    ...(floorSpots.length > 1 ? [{ key: 'floor', length: { wide: 5, narrow: 5 }, own: floorSpots }] : []),
    ...(referenceSpots.length > 0
      ? [{ key: 'reference', length: { wide: 19, narrow: 7 }, own: referenceSpots }]
      : []),
    ...named
      .filter(({ spots }) => spots.length > 0)
      .map(({ series, spots }) => ({
        key: `series ${series.series}`,
        length: { wide: 10 + seriesWords(series).length, narrow: 8 },
        own: spots,
      })),
  ];
  const labels = placeLabels(requests, [
    ...estimateSpots,
    ...floorSpots,
    ...referenceSpots,
    ...markers.flatMap(({ spots }) => spots),
  ]);
  const labelAt = (key: string, className: string, words: ReactNode): ReactNode => {
    const spot = labels.get(key);
    return spot === undefined ? null : (
      <text x={percent(spot.x)} y={percent(spot.y)} className={`${className} halo`}>
        {words}
      </text>
    );
  };

  return (
    <svg className="plot kappa-plot" role="img" aria-labelledby={`${id}-title ${id}-description`}>
      <title id={`${id}-title`}>{title}</title>
      <desc id={`${id}-description`}>{description}</desc>

      {temperatureTicks.map(({ value, isDecade }) => (
        <g key={`T${value}`}>
          <line
            x1={percent(frame.x(value))}
            x2={percent(frame.x(value))}
            y1="0"
            y2="100%"
            className={isDecade ? 'grid-decade' : 'grid-minor'}
          />
          <text
            x={percent(frame.x(value))}
            y="100%"
            dy="20"
            textAnchor="middle"
            className={isDecade || value === frame.extentK[0] ? '' : 'narrow-hidden'}
          >
            {formatQuantity(value)}
          </text>
        </g>
      ))}
      {kappaTicks.map(({ value, isDecade }) => (
        <g key={`k${value}`}>
          <line
            x1="0"
            x2="100%"
            y1={percent(frame.y(value))}
            y2={percent(frame.y(value))}
            className={isDecade ? 'grid-decade' : 'grid-minor'}
          />
          {(isDecade || decades <= 3) && (
            <text x="0" y={percent(frame.y(value))} dx="-9" dy="4" textAnchor="end">
              {formatQuantity(value)}
            </text>
          )}
        </g>
      ))}
      <svg x="0" y="50%" className="narrow-hidden overflow-visible">
        <text transform="translate(-56 0) rotate(-90)" textAnchor="middle">
          κ, W/(m{'\u202f'}K)
        </text>
      </svg>
      <text x="0" y="0" dx="-46" dy="-22" className="wide-hidden">
        κ, W/(m{'\u202f'}K)
      </text>

      <svg viewBox="0 0 1000 1000" preserveAspectRatio="none" width="100%" height="100%">
        <path className="line-reference" d={pathOf(referenceSpots)} data-curve="reference" />
        <path className="line-floor" d={pathOf(floorSpots)} data-curve="floor" />
        <path
          className={isDimmed ? 'line-estimate dims dimmed' : 'line-estimate dims'}
          d={pathOf(estimateSpots)}
          data-curve="estimate"
        />
      </svg>

      {markers.map(({ series, marker }) => (
        <g key={series.series} data-series={series.series}>
          {series.points
            .filter((point) => point.T_K >= frame.extentK[0] && point.T_K <= frame.extentK[1])
            .map((point, index) => {
              const x = percent(frame.x(point.T_K));
              const uncertainty = point.uncertainty_W_mK;
              return (
                <g key={index}>
                  {uncertainty !== null && (
                    <line
                      className="error-bar"
                      x1={x}
                      x2={x}
                      y1={percent(frame.y(point.kappa_W_mK + uncertainty))}
                      y2={percent(
                        frame.y(Math.max(point.kappa_W_mK - uncertainty, frame.kappaExtent_W_mK[0])),
                      )}
                    />
                  )}
                  <svg x={x} y={percent(frame.y(point.kappa_W_mK))} className="overflow-visible">
                    <Marker index={marker} />
                  </svg>
                </g>
              );
            })}
        </g>
      ))}

      {labelAt('estimate', 'label-estimate', 'estimate')}
      {labelAt('floor', 'label-floor', 'floor')}
      {labelAt(
        'reference',
        'label-estimate',
        <>
          default<tspan className="narrow-hidden"> as it stands</tspan>
        </>,
      )}
      {named.map(({ series }) => (
        <g key={series.series}>
          {labelAt(
            `series ${series.series}`,
            'label-measured',
            <>
              measured<tspan className="narrow-hidden">, {seriesWords(series)}</tspan>
            </>,
          )}
        </g>
      ))}
    </svg>
  );
});
