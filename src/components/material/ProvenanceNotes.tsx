import type { ReactNode } from 'react';
import { kappaFigures } from '#src/components/material/factors.ts';
import {
  measuredAt,
  seriesVerification,
  seriesWords,
  type MeasuredAt,
} from '#src/components/material/measured-series.ts';
import { SourceLine } from '#src/components/material/SourceLine.tsx';
import { Figures } from '#src/components/text/Figures.tsx';
import { formatLengthM, formatQuantity, formatWithUncertainty } from '#src/lib/format.ts';
import type { EstimatePoint, EstimateResponse, Model } from '#src/schemas/estimate.ts';
import type { MeasurementSeries } from '#src/schemas/measurement.ts';

const kappaUnit = 'W/(m\u2009K)';

/** κ as measured at a temperature: as stated at a measured point, three figures between points. */
export function measuredText(measured: MeasuredAt): string {
  if (measured.isInterpolated) {
    return formatQuantity(measured.kappa_W_mK, { significant: kappaFigures, unit: kappaUnit });
  }
  return formatWithUncertainty(measured.kappa_W_mK, measured.uncertainty_W_mK, kappaUnit);
}

export function estimateText(point: EstimatePoint): string {
  return formatQuantity(point.kappa_W_mK, { significant: kappaFigures, unit: kappaUnit });
}

interface AtProps {
  readonly pointedK: number;
  readonly point: EstimatePoint | null;
  readonly series: MeasurementSeries | null;
}

/** What estimate and measurement say at the temperature pointed at. */
export function AtNote({ pointedK, point, series }: AtProps): ReactNode {
  const measured = series === null ? null : measuredAt(series, pointedK);
  return (
    <div data-note="at">
      <strong>
        At <Figures text={formatQuantity(pointedK, { unit: 'K' })} />
      </strong>
      {point !== null && (
        <span className="block">
          estimate{' '}
          <span className="text-tide" data-value="estimate">
            <Figures text={estimateText(point)} />
          </span>
        </span>
      )}
      <span className="block">
        {measured === null ? (
          'no measured value near'
        ) : (
          <>
            measured{' '}
            <span className="text-ember">
              <Figures text={measuredText(measured)} />
            </span>
            {measured.isInterpolated && ', between points'}
          </>
        )}
      </span>
      {point !== null && (
        <span className="block">
          mean free path <Figures text={formatLengthM(point.mean_free_path_m, 2)} />
        </span>
      )}
      {point !== null && (
        <span className="block">
          floor{' '}
          {point.floor_W_mK === null ? (
            'not known'
          ) : (
            <Figures text={formatQuantity(point.floor_W_mK, { significant: 2, unit: kappaUnit })} />
          )}
        </span>
      )}
    </div>
  );
}

/** Where the measured values come from. */
export function MeasuredNote({ series }: { readonly series: MeasurementSeries | null }): ReactNode {
  if (series === null) {
    return (
      <p>
        <strong>Measured</strong> No measured series of the bulk crystal is stored.
      </p>
    );
  }
  return (
    <p>
      <strong>Measured</strong> {seriesWords(series)}
      {series.method !== null && `, ${series.method}`}: <SourceLine source={series.source} />{' '}
      <i>{seriesVerification(series)}</i>
    </p>
  );
}

const modelMeanings: Readonly<Record<Model, string>> = {
  gray: 'each rate averaged over the branch before the rates add',
  branch: 'rates add at each frequency, every collision resists',
  callaway: 'rates add at each frequency, N-processes only redistribute',
};

interface EstimateNoteProps {
  readonly estimate: EstimateResponse;
  readonly recommendedModel: Model | null;
}

/** How the estimate was made. */
export function EstimateNote({ estimate, recommendedModel }: EstimateNoteProps): ReactNode {
  const { isotopes, defects, total } = estimate.mass_variance;
  const gamma = (value: number): ReactNode => <Figures text={formatQuantity(value, { significant: 3 })} />;
  return (
    <p data-note="estimate">
      <strong>Estimate</strong> {estimate.model}
      {estimate.model === recommendedModel ? ', recommended' : ''}: {modelMeanings[estimate.model]}. Umklapp
      scale <i>s</i>
      {'\u2009'}={'\u2009'}
      <Figures text={formatQuantity(estimate.umklapp_scale)} />
      {estimate.umklapp_scale === 1 ? ', nothing fitted' : ', set by you'}.{' '}
      {estimate.effective_length_m === null ? (
        'No boundary.'
      ) : (
        <>
          Effective length <Figures text={formatLengthM(estimate.effective_length_m)} />.
        </>
      )}{' '}
      Γ{'\u2009'}={'\u2009'}
      {total === 0 ? '0' : gamma(total)}
      {defects > 0 && isotopes > 0 && (
        <>
          {' '}
          (isotopes {gamma(isotopes)}, other defects {gamma(defects)})
        </>
      )}
      .
    </p>
  );
}
