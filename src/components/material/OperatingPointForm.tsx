import { useState, type ReactNode } from 'react';
import {
  allMechanisms,
  modelChoices,
  type Field,
  type LengthUnit,
  type OperatingPoint,
  type PieceChoice,
  type Problem,
} from '#src/components/material/operating-point.ts';
import { mechanismWords } from '#src/components/material/budget-words.ts';
import type { Model } from '#src/schemas/estimate.ts';

const pieceWords: Readonly<Record<PieceChoice, string>> = {
  'round-rod': 'round rod',
  'square-rod': 'square rod',
  grains: 'grains of a polycrystal',
  length: 'effective length',
  endless: 'no boundary',
};
const unitWords: Readonly<Record<LengthUnit, string>> = { nm: 'nm', um: 'µm', mm: 'mm', m: 'm' };
const modelWords: Readonly<Record<Model, string>> = {
  gray: 'gray, mean rates',
  branch: 'branch, by frequency',
  callaway: 'callaway, two branches',
};

interface Props {
  readonly formId: string;
  /** Where the form leads without a script: the page itself. */
  readonly action: string;
  readonly point: OperatingPoint;
  readonly defaults: OperatingPoint;
  readonly elements: readonly string[];
  readonly recommendedModel: Model | null;
  readonly problems: readonly Problem[];
  /** `control` names a control that is being typed in; null for a choice made at once. */
  readonly onChange: (point: OperatingPoint, control: string | null) => void;
  /** The reader has finished with a control. */
  readonly onSettle: () => void;
  readonly onReset: () => void;
}

interface FieldProps {
  readonly field: Field;
  readonly label: string;
  readonly problems: readonly Problem[];
  readonly formId: string;
  readonly children: ReactNode;
}

function problemId(formId: string, field: Field): string {
  return `${formId}-${field}-problem`;
}

/** A control under its name, with what is wrong beside it. */
function LabelledField({ field, label, problems, formId, children }: FieldProps): ReactNode {
  const own = problems.filter((problem) => problem.field === field);
  return (
    <div role="group" aria-label={label} className="min-w-0">
      <p className="text-margin text-soft" aria-hidden="true">
        {label}
      </p>
      <div className="text-[18px] leading-7">{children}</div>
      {own.length > 0 && (
        <p id={problemId(formId, field)} className="max-w-[42ch] text-margin text-ochre">
          {own.map(({ message }) => message).join(' ')}
        </p>
      )}
    </div>
  );
}

/** The operating point: a row of words that are the controls. A plain GET form where scripts do not run. */
export function OperatingPointForm(props: Props): ReactNode {
  const { formId, point, defaults, problems, onChange, onSettle } = props;
  const model = point.model === props.recommendedModel ? 'recommended' : point.model;
  const hasProblem = (field: Field): boolean => problems.some((problem) => problem.field === field);
  const describe = (field: Field): Record<string, string | boolean> =>
    hasProblem(field) ? { 'aria-invalid': true, 'aria-describedby': problemId(formId, field) } : {};
  const term = (isChanged: boolean): string => (isChanged ? 'term changed' : 'term');

  const textTerm = (
    name: 'size' | 'defects' | 'porosity' | 'scale' | 'specularity' | 'at',
    label: string,
  ): ReactNode => (
    <input
      type="text"
      inputMode="decimal"
      autoComplete="off"
      spellCheck={false}
      name={name}
      aria-label={label}
      className={`${term(point[name] !== defaults[name])} figures min-w-[1.5ch]`}
      size={Math.max(2, Math.min(point[name].length, 12))}
      value={point[name]}
      {...describe(name)}
      onChange={(event) => {
        onChange({ ...point, [name]: event.target.value }, name);
      }}
      onBlur={onSettle}
    />
  );

  // Decided once: a fold that closes while its field is being typed in would take the focus with it.
  const [isMoreOpen] = useState(
    () =>
      point.scale !== defaults.scale ||
      point.specularity !== defaults.specularity ||
      point.mechanisms.length < allMechanisms.length,
  );

  return (
    <form
      id={formId}
      method="get"
      action={props.action}
      className="border-b border-t border-b-rule border-t-ink py-3"
      onSubmit={(event) => {
        event.preventDefault();
        onSettle();
      }}
    >
      <div className="flex flex-wrap gap-x-9 gap-y-3">
        <LabelledField field="size" label="size of the crystal" problems={problems} formId={formId}>
          {point.form !== 'endless' && (
            <>
              {textTerm('size', 'size')}{' '}
              <select
                name="unit"
                aria-label="unit of the size"
                className={term(point.unit !== defaults.unit)}
                value={point.unit}
                onChange={(event) => {
                  const unit = (['nm', 'um', 'mm', 'm'] as const).find((u) => u === event.target.value);
                  if (unit !== undefined) onChange({ ...point, unit }, null);
                }}
              >
                {(['nm', 'um', 'mm', 'm'] as const).map((unit) => (
                  <option key={unit} value={unit}>
                    {unitWords[unit]}
                  </option>
                ))}
              </select>
              ,{' '}
            </>
          )}
          <select
            name="form"
            aria-label="form of the piece"
            className={term(point.form !== defaults.form)}
            value={point.form}
            onChange={(event) => {
              const form = (Object.keys(pieceWords) as PieceChoice[]).find((f) => f === event.target.value);
              if (form !== undefined) onChange({ ...point, form }, null);
            }}
          >
            {Object.entries(pieceWords).map(([form, words]) => (
              <option key={form} value={form}>
                {words}
              </option>
            ))}
          </select>
        </LabelledField>

        <LabelledField field="isotopes" label="isotopes" problems={problems} formId={formId}>
          <select
            name="isotopes"
            aria-label="isotopes"
            className={term(point.isotopes !== defaults.isotopes)}
            value={point.isotopes}
            {...describe('isotopes')}
            onChange={(event) => {
              const isotopes = (['natural', 'pure', 'enriched'] as const).find(
                (choice) => choice === event.target.value,
              );
              if (isotopes !== undefined) onChange({ ...point, isotopes }, null);
            }}
          >
            <option value="natural">natural</option>
            <option value="pure">pure, one each</option>
            <option value="enriched">enriched</option>
          </select>
          {point.isotopes === 'enriched' &&
            props.elements.map((element) => (
              <span key={element} className="block text-table">
                {element}:{' '}
                <input
                  type="text"
                  autoComplete="off"
                  spellCheck={false}
                  name={`iso-${element}`}
                  aria-label={`abundances of ${element}: mass number and per cent, separated by semicolons`}
                  placeholder="mass number and %; …"
                  className={`${term(true)} figures`}
                  size={20}
                  value={point.abundances[element] ?? ''}
                  {...describe('isotopes')}
                  onChange={(event) => {
                    onChange(
                      { ...point, abundances: { ...point.abundances, [element]: event.target.value } },
                      `iso-${element}`,
                    );
                  }}
                  onBlur={onSettle}
                />
              </span>
            ))}
        </LabelledField>

        <LabelledField field="defects" label="other defects" problems={problems} formId={formId}>
          Γ{'\u2009'}={'\u2009'}
          {textTerm('defects', 'Γ of other point defects')}
        </LabelledField>

        <LabelledField field="porosity" label="porosity" problems={problems} formId={formId}>
          {textTerm('porosity', 'porosity in per cent')}
          {'\u2009'}%
        </LabelledField>

        <LabelledField field="model" label="model" problems={problems} formId={formId}>
          <select
            name="model"
            aria-label="model"
            className={term(model !== defaults.model)}
            value={model}
            onChange={(event) => {
              const chosen = (['recommended', ...modelChoices] as const).find(
                (choice) => choice === event.target.value,
              );
              if (chosen !== undefined) onChange({ ...point, model: chosen }, null);
            }}
          >
            <option value="recommended">
              {props.recommendedModel === null
                ? 'recommended'
                : `${modelWords[props.recommendedModel]} (recommended)`}
            </option>
            {modelChoices
              .filter((choice) => choice !== props.recommendedModel)
              .map((choice) => (
                <option key={choice} value={choice}>
                  {modelWords[choice]}
                </option>
              ))}
          </select>
        </LabelledField>

        <LabelledField field="at" label="read at" problems={problems} formId={formId}>
          {textTerm('at', 'temperature in kelvin')}
          {'\u2009'}K
        </LabelledField>
      </div>

      <details className="mt-2 text-table" open={isMoreOpen}>
        <summary className="no-print text-margin">surface, Umklapp scale and mechanisms</summary>
        <div className="flex flex-wrap gap-x-9 gap-y-3 pt-2">
          <LabelledField
            field="specularity"
            label="specular fraction of the surface"
            problems={problems}
            formId={formId}
          >
            <i>p</i>
            {'\u2009'}={'\u2009'}
            {textTerm('specularity', 'specular fraction of the surface')}
          </LabelledField>
          <LabelledField field="scale" label="Umklapp scale" problems={problems} formId={formId}>
            <i>s</i>
            {'\u2009'}={'\u2009'}
            {textTerm('scale', 'Umklapp scale')}
          </LabelledField>
          <LabelledField field="mechanisms" label="mechanisms" problems={problems} formId={formId}>
            <span className="flex flex-wrap gap-x-5">
              {allMechanisms.map((mechanism) => (
                <label key={mechanism} className="cursor-pointer">
                  <input
                    type="checkbox"
                    name="mechanism"
                    value={mechanism}
                    className="tick"
                    checked={point.mechanisms.includes(mechanism)}
                    {...describe('mechanisms')}
                    onChange={(event) => {
                      const isOn = event.target.checked;
                      onChange(
                        {
                          ...point,
                          mechanisms: allMechanisms.filter((other) =>
                            other === mechanism ? isOn : point.mechanisms.includes(other),
                          ),
                        },
                        null,
                      );
                    }}
                  />
                  {mechanismWords[mechanism]}
                </label>
              ))}
            </span>
          </LabelledField>
        </div>
      </details>

      <p className="no-print mt-2 flex items-baseline gap-x-6 text-margin">
        <noscript>
          <button type="submit" className="quiet-button">
            Draw the curve
          </button>
        </noscript>
        <a
          href={props.action}
          onClick={(event) => {
            if (event.ctrlKey || event.metaKey || event.shiftKey) return;
            event.preventDefault();
            props.onReset();
          }}
        >
          back to the defaults
        </a>
      </p>
    </form>
  );
}
