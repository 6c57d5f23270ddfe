import { keepPreviousData, QueryClient, QueryClientProvider, useQuery } from '@tanstack/react-query';
import { useCallback, useId, useMemo, useState, type ReactNode } from 'react';
import { budgetInWords } from '#src/components/material/budget-words.ts';
import { chartFrame, kappaExtent } from '#src/components/material/chart-frame.ts';
import { ChartTable } from '#src/components/material/ChartTable.tsx';
import { fetchEstimate } from '#src/components/material/estimate-request.ts';
import { FactorsLine } from '#src/components/material/FactorsLine.tsx';
import type { Folio, Refusal } from '#src/components/material/folio.ts';
import { InputsTable } from '#src/components/material/InputsTable.tsx';
import { KappaChart } from '#src/components/material/KappaChart.tsx';
import { measuredAt, readDrawnSeries, writeDrawnSeries } from '#src/components/material/measured-series.ts';
import {
  fieldOfPath,
  readOperatingPoint,
  readQuestion,
  writeOperatingPoint,
  type OperatingPoint,
  type Problem,
} from '#src/components/material/operating-point.ts';
import { OperatingPointForm } from '#src/components/material/OperatingPointForm.tsx';
import {
  AtNote,
  EstimateNote,
  estimateText,
  MeasuredNote,
  measuredText,
} from '#src/components/material/ProvenanceNotes.tsx';
import { RateBudget } from '#src/components/material/RateBudget.tsx';
import { SeriesTable } from '#src/components/material/SeriesTable.tsx';
import { curveTemperaturesK, nearestIndex } from '#src/components/material/temperatures.ts';
import { useHydrated } from '#src/components/material/use-hydrated.ts';
import { useLasting } from '#src/components/material/use-lasting.ts';
import { usePageAddress } from '#src/components/material/use-page-address.ts';
import { useSettled } from '#src/components/material/use-settled.ts';
import { percent } from '#src/components/material/chart-frame.ts';
import { AppError } from '#src/lib/errors.ts';
import { formatQuantity } from '#src/lib/format.ts';
import type { EstimateRequestInput, EstimateResponse } from '#src/schemas/estimate.ts';

/** A pause this long ends a word; shorter ones would ask the server for half a number. */
const settleAfterMs = 180;
/** What is quicker needs no word. */
const mentionAfterMs = 200;

/** The folio of a material: operating point, κ(T), rate budget, factors, inputs, measured series. */
export function MaterialEstimator(folio: Folio): ReactNode {
  // Each root has its own client: a module-level one would be shared by all readers while rendering on the server.
  const [client] = useState(() => new QueryClient());
  return (
    <QueryClientProvider client={client}>
      <FolioBody {...folio} />
    </QueryClientProvider>
  );
}

interface Answer {
  /** The last answer that can be shown, for this operating point or an earlier one. */
  readonly shown: EstimateResponse | null;
  readonly refusal: Refusal | null;
  readonly isComputing: boolean;
  readonly retry: () => void;
}

function useEstimate(folio: Folio, request: EstimateRequestInput | null): Answer {
  const [initialRequest] = useState(() => JSON.stringify(request));
  const requestKey = JSON.stringify(request);
  const isInitial = requestKey === initialRequest;
  const query = useQuery<EstimateResponse>({
    queryKey: ['estimate', requestKey],
    queryFn: ({ signal }) => {
      if (request === null) throw new AppError('INVALID_INPUT', 'Nothing is asked.');
      return fetchEstimate(request, signal);
    },
    enabled: request !== null && !(isInitial && folio.refusal !== null),
    placeholderData: keepPreviousData,
    staleTime: Number.POSITIVE_INFINITY,
    retry: (failures, error) => failures < 1 && error instanceof AppError && error.status >= 500,
    retryDelay: 800,
    ...(isInitial && folio.estimate !== null ? { initialData: folio.estimate } : {}),
  });

  // An answer outlives a later refusal: the curve stays, dimmed, while the words say why.
  const [shown, setShown] = useState(folio.estimate);
  if (query.data !== undefined && query.data !== shown) setShown(query.data);

  const refusal = ((): Refusal | null => {
    if (isInitial && folio.refusal !== null) return folio.refusal;
    if (query.error === null) return null;
    if (query.error instanceof AppError) return { message: query.error.message, fields: query.error.fields };
    return { message: 'The estimate failed. Try again.', fields: [] };
  })();
  return {
    shown: query.data ?? shown,
    refusal,
    isComputing: query.isFetching,
    retry: () => {
      void query.refetch();
    },
  };
}

function FolioBody(folio: Folio): ReactNode {
  const formId = useId();
  const isHydrated = useHydrated();
  const initialQuery = useMemo(() => new URLSearchParams(folio.query), [folio.query]);
  const [point, setPoint] = useState(() => readOperatingPoint(initialQuery, folio.defaults));
  const [drawnNames, setDrawnNames] = useState(() => readDrawnSeries(initialQuery, folio.series));
  const [previewK, setPreviewK] = useState<number | null>(null);

  const address = usePageAddress(
    useCallback(
      (query: URLSearchParams) => {
        setPoint(readOperatingPoint(query, folio.defaults));
        setDrawnNames(readDrawnSeries(query, folio.series));
      },
      [folio.defaults, folio.series],
    ),
  );
  const change = (next: OperatingPoint, drawn: readonly string[], control: string | null): void => {
    setPoint(next);
    setDrawnNames([...drawn]);
    const query = writeOperatingPoint(next, folio.defaults);
    writeDrawnSeries(query, drawn, folio.series);
    address.write(query.toString(), control);
  };

  const canEstimate = folio.obstacles.length === 0;
  const curveK = useMemo(() => curveTemperaturesK(folio.extentK), [folio.extentK]);
  const asked = useMemo(
    () =>
      readQuestion({
        material: folio.slug,
        elements: folio.elements,
        point,
        temperaturesK: curveK,
        extentK: folio.extentK,
      }),
    [folio.slug, folio.elements, folio.extentK, point, curveK],
  );
  const settled = useSettled(asked, settleAfterMs);
  const [request, setRequest] = useState(asked.kind === 'request' ? asked.request : null);
  if (settled.kind === 'request' && settled.request !== request) setRequest(settled.request);
  const answer = useEstimate(folio, canEstimate ? request : null);
  const isWaiting = useLasting(answer.isComputing, mentionAfterMs);

  // The server's complaint about one field stands beside that control, the rest under the controls.
  const mine: readonly Problem[] = asked.kind === 'problems' ? asked.problems : [];
  const refused = asked.kind === 'request' ? answer.refusal : null;
  const refusedFields = (refused?.fields ?? []).flatMap(({ path, message }) => {
    const field = fieldOfPath(path);
    return field === null ? [] : [{ field, message }];
  });
  const problems = [...mine, ...refusedFields];
  const general = refused !== null && refusedFields.length === 0 ? refused.message : null;
  const isStale = problems.length > 0 || refused !== null;
  const estimate = canEstimate ? answer.shown : null;
  const isDimmed = estimate !== null && (isStale || isWaiting);

  const reference = folio.reference;
  const isDefault =
    writeOperatingPoint({ ...point, at: folio.defaults.at }, folio.defaults).toString() === '';
  const ghost = isDefault ? null : (reference?.points ?? null);

  const list = useMemo(() => folio.series.map((series, marker) => ({ series, marker })), [folio.series]);
  const drawn = useMemo(
    () => list.filter(({ series }) => drawnNames.includes(series.series)),
    [list, drawnNames],
  );
  const frame = useMemo(
    () =>
      chartFrame(
        folio.extentK,
        kappaExtent(
          [estimate?.points ?? [], ghost ?? []].filter((points) => points.length > 0),
          drawn.map(({ series }) => series),
        ),
      ),
    [folio.extentK, estimate, ghost, drawn],
  );

  const pointsK = useMemo(() => estimate?.points.map((p) => p.T_K) ?? curveK, [estimate, curveK]);
  const typedK = Number(point.at);
  const wishedK = previewK ?? (typedK > 0 ? typedK : Number(folio.defaults.at));
  const index = nearestIndex(pointsK, wishedK);
  const pointedK = pointsK[index] ?? wishedK;
  const pointed = estimate?.points[index] ?? null;
  const notedSeries =
    drawn.find(({ series }) => series.preferred)?.series ??
    drawn.find(({ series }) => measuredAt(series, pointedK) !== null)?.series ??
    drawn[0]?.series ??
    null;
  const measured = notedSeries === null ? null : measuredAt(notedSeries, pointedK);

  const temperatureText = formatQuantity(pointedK, { unit: 'K' });
  const readOut = [
    temperatureText,
    pointed === null ? null : `estimated ${estimateText(pointed)}`,
    measured === null ? null : `measured ${measuredText(measured)}`,
  ]
    .filter((part) => part !== null)
    .join(', ');
  const title = `Thermal conductivity of ${folio.name} over temperature`;
  const description = `Logarithmic axes, ${formatQuantity(folio.extentK[0])} to ${formatQuantity(folio.extentK[1], { unit: 'K' })}. ${
    estimate === null ? 'No estimate is drawn.' : 'The estimate is a solid line, the floor a dotted one.'
  } ${drawn.length === 1 ? 'One measured series is' : `${drawn.length} measured series are`} drawn with open markers. A table follows.`;
  const budgetWords = budgetInWords(estimate?.points ?? []);

  return (
    <>
      {canEstimate && (
        <section aria-label="Operating point">
          <OperatingPointForm
            formId={formId}
            action={`/materials/${folio.slug}`}
            point={point}
            defaults={folio.defaults}
            elements={folio.elements}
            recommendedModel={folio.recommendedModel}
            problems={problems}
            onChange={(next, control) => {
              change(next, drawnNames, control);
            }}
            onSettle={address.settle}
            onReset={() => {
              change(folio.defaults, readDrawnSeries(new URLSearchParams(), folio.series), null);
            }}
          />
        </section>
      )}
      {!canEstimate && (
        <section
          aria-label="Why there is no estimate"
          className="border-b border-t border-b-rule border-t-ink py-3"
        >
          <p>No estimate of this material can be made from what is stored:</p>
          <ul className="ml-5 list-disc">
            {folio.obstacles.map((obstacle) => (
              <li key={obstacle}>{obstacle}</li>
            ))}
          </ul>
        </section>
      )}
      <p role="status" aria-live="polite" className="min-h-[24px] pt-1 text-margin text-soft">
        {general !== null && <span className="text-ochre">{general} </span>}
        {isStale && estimate !== null && 'The curve drawn is the last one that could be computed.'}
        {!isStale && isWaiting && 'computing…'}
        {refused !== null && isHydrated && (
          <>
            {' '}
            <button type="button" className="word-button" onClick={answer.retry}>
              Try again
            </button>
          </>
        )}
      </p>

      <div className="folio-row">
        <figure className="folio-main" aria-label="Thermal conductivity">
          <KappaChart
            frame={frame}
            title={title}
            description={description}
            estimate={estimate?.points ?? null}
            reference={ghost}
            drawn={drawn}
            isDimmed={isDimmed}
            temperaturesK={pointsK}
            pointedK={pointedK}
            pointedEstimate={pointed}
            readOut={readOut}
            {...(isHydrated
              ? {
                  onPoint: (temperatureK: number) => {
                    setPreviewK(null);
                    change({ ...point, at: String(temperatureK) }, drawnNames, 'at');
                  },
                  onPreview: setPreviewK,
                }
              : {})}
          />
        </figure>
        <aside className="margin-note figures pb-4" aria-label="Notes on the chart">
          <AtNote pointedK={pointedK} point={pointed} series={notedSeries} />
          <MeasuredNote series={notedSeries} />
          {estimate !== null && (
            <EstimateNote estimate={estimate} recommendedModel={folio.recommendedModel} />
          )}
          {(estimate?.cautions ?? []).map(({ code, message }) => (
            <p className="caution" key={code}>
              <strong>Caution</strong> {message}
            </p>
          ))}
        </aside>
      </div>

      {estimate !== null && (
        <div className="folio-row">
          <div className="folio-main">
            <div className="budget-frame">
              <RateBudget
                frame={frame}
                points={estimate.points}
                description={budgetWords}
                isDimmed={isDimmed}
              />
              <svg className="plot-over" aria-hidden="true">
                <line
                  className="pointed-on-areas"
                  x1={percent(frame.x(pointedK))}
                  x2={percent(frame.x(pointedK))}
                  y1="0"
                  y2="100%"
                />
              </svg>
            </div>
            <p className="pb-1 pl-[52px] text-center text-axis text-soft sm:pl-[70px]">temperature, K</p>
          </div>
          <aside className="margin-note pb-4" aria-label="Notes on the rate budget">
            <p>
              <strong>Rate budget</strong> Which mechanism turns phonons back, weighted by the heat they
              carry. {budgetWords}
            </p>
          </aside>
        </div>
      )}

      <div className="folio-row">
        <div className="folio-main pb-6">
          <ChartTable estimate={estimate?.points ?? null} pointedK={pointedK} drawn={drawn} />
        </div>
        <div className="margin-note hidden lg:block" />
      </div>

      {pointed !== null && (
        <div className="folio-row keep-together">
          <section className="folio-main pb-8">
            <h2 className="pb-3">
              One third of <i className="font-normal">C v l</i> at {temperatureText}
            </h2>
            <FactorsLine point={pointed} />
          </section>
          <aside className="margin-note pb-4" aria-label="Notes on the factors">
            <p>
              <strong>Factors</strong> <i>C</i> counts the acoustic modes below the zone boundary, <i>v</i> is
              their mean velocity, <i>l</i> the way a phonon goes between collisions that resist. More figures
              are shown than are known, so that the product can be checked.
            </p>
          </aside>
        </div>
      )}

      {estimate !== null && (
        <section className="folio-full" aria-labelledby={`${formId}-inputs`}>
          <h2 id={`${formId}-inputs`} className="pb-1">
            What the estimate stands on
          </h2>
          <InputsTable inputs={estimate.inputs} reference={reference?.inputs ?? null} isDimmed={isDimmed} />
        </section>
      )}

      <section className="folio-full pt-8" aria-labelledby={`${formId}-series`}>
        <h2 id={`${formId}-series`} className="pb-1">
          Measured series
        </h2>
        {folio.series.length === 0 ? (
          <p className="border-t border-ink pt-2">No measured conductivity of this material is stored.</p>
        ) : (
          <SeriesTable
            list={list}
            drawn={drawnNames}
            formId={formId}
            onDraw={(series, isDrawn) => {
              const next = folio.series
                .map((other) => other.series)
                .filter((other) => (other === series ? isDrawn : drawnNames.includes(other)));
              change(point, next, null);
            }}
          />
        )}
      </section>
    </>
  );
}
