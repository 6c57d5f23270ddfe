import type { ReactNode } from 'react';
import { MarkerGlyph } from '#src/components/material/Marker.tsx';
import type { DrawnSeries } from '#src/components/material/KappaPlot.tsx';
import { seriesVerification, seriesWords } from '#src/components/material/measured-series.ts';
import { SourceLine } from '#src/components/material/SourceLine.tsx';
import { Figures } from '#src/components/text/Figures.tsx';
import { formatLengthM, formatQuantity } from '#src/lib/format.ts';
import type { MeasurementSeries } from '#src/schemas/measurement.ts';

interface Props {
  readonly list: readonly DrawnSeries[];
  readonly drawn: readonly string[];
  /** Checkboxes belong to the form of the operating point, so that they work without a script too. */
  readonly formId: string;
  readonly onDraw: (series: string, isDrawn: boolean) => void;
}

function range({ points }: MeasurementSeries): string {
  const temperatures = points.map((point) => point.T_K);
  const [least, most] = [Math.min(...temperatures), Math.max(...temperatures)];
  const count = points.length === 1 ? '1 point' : `${points.length} points`;
  const span =
    least === most
      ? formatQuantity(least, { unit: 'K' })
      : `${formatQuantity(least)}–${formatQuantity(most, { unit: 'K' })}`;
  return `${count}, ${span}`;
}

const quantityWords: Readonly<Record<MeasurementSeries['quantity'], string>> = {
  total: 'whole conductivity',
  lattice: 'lattice part',
  'not-stated': 'whole or lattice part: not stated',
};

/** Every measured series of the store for this material, the drawn ones ticked. */
export function SeriesTable({ list, drawn, formId, onDraw }: Props): ReactNode {
  return (
    <table className="ruled stacks">
      <thead>
        <tr>
          <th scope="col">draw</th>
          <th scope="col">sample</th>
          <th scope="col">method</th>
          <th scope="col">points</th>
          <th scope="col" className="in-margin">
            source · verification
          </th>
        </tr>
      </thead>
      <tbody>
        {list.map(({ series, marker }) => (
          <tr key={series.series} data-series-row={series.series}>
            <th scope="row" className="w-[30%]">
              <label className="cursor-pointer">
                <input
                  type="checkbox"
                  name="series"
                  value={series.series}
                  form={formId}
                  className="tick no-print"
                  checked={drawn.includes(series.series)}
                  onChange={(event) => {
                    onDraw(series.series, event.target.checked);
                  }}
                />
                <MarkerGlyph index={marker} />
                {seriesWords(series)}
              </label>
              {series.preferred && <span className="block text-margin italic text-ember">preferred</span>}
            </th>
            <td className="own-line">
              {series.sample.description === '' ? series.sample.form : series.sample.description}
              <span className="block text-margin text-soft">
                {series.sample.form}, {series.sample.isotopes} isotopes
                {series.direction !== null && `, ${series.direction}`}
                {series.sample.size_m !== null && `, ${formatLengthM(series.sample.size_m)}`};{' '}
                {quantityWords[series.quantity]}
              </span>
            </td>
            <td className="own-line">{series.method ?? 'method not stated'}</td>
            <td className="own-line">
              <Figures text={range(series)} />
            </td>
            <td className="in-margin own-line">
              <SourceLine source={series.source} /> <i>{seriesVerification(series)}</i>
              {series.note !== null && <span className="block">{series.note}</span>}
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
