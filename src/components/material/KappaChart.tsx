import type { KeyboardEvent, PointerEvent, ReactNode } from 'react';
import { percent, type ChartFrame } from '#src/components/material/chart-frame.ts';
import { KappaPlot, type DrawnSeries } from '#src/components/material/KappaPlot.tsx';
import { nearestIndex } from '#src/components/material/temperatures.ts';
import { formatQuantity } from '#src/lib/format.ts';
import type { EstimatePoint } from '#src/schemas/estimate.ts';

interface Props {
  readonly frame: ChartFrame;
  readonly title: string;
  readonly description: string;
  readonly estimate: readonly EstimatePoint[] | null;
  readonly reference: readonly EstimatePoint[] | null;
  readonly drawn: readonly DrawnSeries[];
  readonly isDimmed: boolean;
  /** Temperatures that can be pointed at, K, ascending. */
  readonly temperaturesK: readonly number[];
  readonly pointedK: number;
  readonly pointedEstimate: EstimatePoint | null;
  /** What a screen reader says of the pointed temperature. */
  readonly readOut: string;
  /** Left out without a script: then the temperature is a field of the form. */
  readonly onPoint?: (temperatureK: number) => void;
  readonly onPreview?: (temperatureK: number | null) => void;
}

const coarseSteps = 10;

/** κ(T) with a temperature that pointer and keyboard move. */
export function KappaChart(props: Props): ReactNode {
  const { frame, temperaturesK, pointedK, pointedEstimate, onPoint, onPreview } = props;

  const temperatureUnder = (event: PointerEvent<HTMLElement>): number => {
    const { left, width } = event.currentTarget.getBoundingClientRect();
    const under = frame.temperatureAt((event.clientX - left) / width);
    return temperaturesK[nearestIndex(temperaturesK, under)] ?? pointedK;
  };
  const step = (by: number): void => {
    const index = nearestIndex(temperaturesK, pointedK) + by;
    const next = temperaturesK[Math.min(Math.max(index, 0), temperaturesK.length - 1)];
    if (next !== undefined) onPoint?.(next);
  };
  const onKeyDown = (event: KeyboardEvent<HTMLElement>): void => {
    const steps: Readonly<Record<string, number>> = {
      ArrowRight: 1,
      ArrowUp: 1,
      ArrowLeft: -1,
      ArrowDown: -1,
      PageUp: coarseSteps,
      PageDown: -coarseSteps,
      Home: -temperaturesK.length,
      End: temperaturesK.length,
    };
    const by = steps[event.key];
    if (by === undefined || event.altKey || event.ctrlKey || event.metaKey) return;
    event.preventDefault();
    step(by);
  };

  const x = frame.x(pointedK);
  const isInside = x >= 0 && x <= 100;
  return (
    <div className="chart-frame">
      <KappaPlot
        frame={frame}
        title={props.title}
        description={props.description}
        estimate={props.estimate}
        reference={props.reference}
        drawn={props.drawn}
        isDimmed={props.isDimmed}
      />
      {isInside && (
        <svg className="plot-over" aria-hidden="true">
          <line className="pointed" x1={percent(x)} x2={percent(x)} y1="0" y2="100%" />
          <text className="pointed-label" x={percent(x)} y="0" dy="-7" textAnchor={x > 93 ? 'end' : 'middle'}>
            {formatQuantity(pointedK, { unit: 'K' })}
          </text>
          {pointedEstimate !== null && (
            <circle
              className="pointed-estimate"
              cx={percent(x)}
              cy={percent(frame.y(pointedEstimate.kappa_W_mK))}
              r="4"
            />
          )}
        </svg>
      )}
      {onPoint !== undefined && (
        <div
          className="pointer-field no-print"
          role="slider"
          tabIndex={0}
          aria-label="Temperature pointed at"
          aria-orientation="horizontal"
          aria-valuemin={temperaturesK[0] ?? frame.extentK[0]}
          aria-valuemax={temperaturesK.at(-1) ?? frame.extentK[1]}
          aria-valuenow={pointedK}
          aria-valuetext={props.readOut}
          onKeyDown={onKeyDown}
          onPointerDown={(event) => {
            event.currentTarget.setPointerCapture(event.pointerId);
            onPoint(temperatureUnder(event));
          }}
          onPointerMove={(event) => {
            if (event.buttons === 1) onPoint(temperatureUnder(event));
            else onPreview?.(temperatureUnder(event));
          }}
          onPointerLeave={() => onPreview?.(null)}
        />
      )}
    </div>
  );
}
