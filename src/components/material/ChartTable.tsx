import type { ReactNode } from 'react';
import type { DrawnSeries } from '#src/components/material/KappaPlot.tsx';
import { kappaFigures } from '#src/components/material/factors.ts';
import { mechanismWords } from '#src/components/material/budget-words.ts';
import { seriesWords } from '#src/components/material/measured-series.ts';
import { isTableTemperature } from '#src/components/material/temperatures.ts';
import { allMechanisms } from '#src/components/material/operating-point.ts';
import { Figures } from '#src/components/text/Figures.tsx';
import { formatPercent, formatQuantity, formatWithUncertainty } from '#src/lib/format.ts';
import type { EstimatePoint } from '#src/schemas/estimate.ts';

interface Props {
  readonly estimate: readonly EstimatePoint[] | null;
  readonly pointedK: number;
  readonly drawn: readonly DrawnSeries[];
}

/** The chart in numbers, for reading, copying and screen readers. */
export function ChartTable({ estimate, pointedK, drawn }: Props): ReactNode {
  const rows = (estimate ?? []).filter(
    (point, index, all) =>
      isTableTemperature(point.T_K) || point.T_K === pointedK || index === 0 || index === all.length - 1,
  );
  return (
    <details className="mt-3 text-table">
      <summary>The chart as a table</summary>
      {rows.length > 0 && (
        <div className="mt-3">
          <table className="ruled dense">
            <caption className="pb-1 text-left text-margin text-soft">
              Estimate, floor and shares of the scattering
            </caption>
            <thead>
              <tr>
                <th scope="col" className="number">
                  T, K
                </th>
                <th scope="col" className="number">
                  κ, W/(m{'\u2009'}K)
                </th>
                <th scope="col" className="number">
                  floor
                </th>
                {allMechanisms.map((mechanism) => (
                  <th scope="col" className="number" key={mechanism}>
                    {mechanismWords[mechanism]}
                  </th>
                ))}
              </tr>
            </thead>
            <tbody>
              {rows.map((point) => (
                <tr key={point.T_K}>
                  <th scope="row" className="number">
                    <Figures text={formatQuantity(point.T_K)} />
                  </th>
                  <td className="number">
                    <Figures text={formatQuantity(point.kappa_W_mK, { significant: kappaFigures })} />
                  </td>
                  <td className="number">
                    {point.floor_W_mK === null ? (
                      'not known'
                    ) : (
                      <Figures text={formatQuantity(point.floor_W_mK, { significant: 2 })} />
                    )}
                  </td>
                  {allMechanisms.map((mechanism) => (
                    <td className="number" key={mechanism}>
                      {point.share[mechanism] === undefined
                        ? 'left out'
                        : formatPercent(point.share[mechanism])}
                    </td>
                  ))}
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      )}
      {drawn.length > 0 && (
        <div className="mt-4">
          <table className="ruled dense">
            <caption className="pb-1 text-left text-margin text-soft">
              Measured points of the series drawn
            </caption>
            <thead>
              <tr>
                <th scope="col">series</th>
                <th scope="col" className="number">
                  T, K
                </th>
                <th scope="col" className="number">
                  κ, W/(m{'\u2009'}K)
                </th>
                <th scope="col">uncertainty</th>
                <th scope="col">verification</th>
              </tr>
            </thead>
            <tbody>
              {drawn.flatMap(({ series }) =>
                series.points.map((point, index) => (
                  <tr key={`${series.series} ${index}`}>
                    <th scope="row">{seriesWords(series)}</th>
                    <td className="number">
                      <Figures text={formatQuantity(point.T_K)} />
                    </td>
                    <td className="number">
                      <Figures
                        text={
                          point.uncertainty_W_mK === null
                            ? formatQuantity(point.kappa_W_mK)
                            : formatWithUncertainty(point.kappa_W_mK, point.uncertainty_W_mK)
                        }
                      />
                    </td>
                    <td>{point.uncertainty_W_mK === null ? 'not stated' : 'as stated'}</td>
                    <td>{point.verification ?? 'not stated'}</td>
                  </tr>
                )),
              )}
            </tbody>
          </table>
        </div>
      )}
    </details>
  );
}
