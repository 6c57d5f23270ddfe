import type { ReactNode } from 'react';
import { Figures } from '#src/components/text/Figures.tsx';
import { Unit } from '#src/components/text/Unit.tsx';
import { formatWithUncertainty } from '#src/lib/format.ts';
import type { EstimateInput } from '#src/schemas/estimate.ts';

interface Quantity {
  readonly name: string;
  readonly symbol: ReactNode;
  readonly unit: string;
}

const lowered = (letter: string, index: string): ReactNode => (
  <>
    <i>{letter}</i>
    <sub>{index}</sub>
  </>
);

const quantities: Readonly<Record<EstimateInput['name'], Quantity>> = {
  cell_volume_A3: { name: 'primitive cell', symbol: lowered('V', 'c'), unit: 'angstrom^3' },
  atoms_per_cell: { name: 'atoms in it', symbol: <i>n</i>, unit: '' },
  mean_mass_u: { name: 'mean atomic mass', symbol: <i>M̄</i>, unit: 'u' },
  debye_temperature_K: { name: 'Debye temperature', symbol: lowered('θ', 'D'), unit: 'K' },
  v_L_m_s: { name: 'sound velocity', symbol: lowered('v', 'L'), unit: 'm/s' },
  v_T_m_s: { name: 'sound velocity', symbol: lowered('v', 'T'), unit: 'm/s' },
  theta_L_K: { name: 'zone boundary', symbol: lowered('θ', 'L'), unit: 'K' },
  theta_T_K: { name: 'zone boundary', symbol: lowered('θ', 'T'), unit: 'K' },
  gamma_L: { name: 'Grüneisen parameter', symbol: lowered('γ', 'L'), unit: '' },
  gamma_T: { name: 'Grüneisen parameter', symbol: lowered('γ', 'T'), unit: '' },
  mass_variance: { name: 'isotope scattering', symbol: 'Γ', unit: '' },
  average_v_L_m_s: { name: 'average velocity', symbol: lowered('v', 'L'), unit: 'm/s' },
  average_v_T_m_s: { name: 'average velocity', symbol: lowered('v', 'T'), unit: 'm/s' },
};

interface Props {
  readonly inputs: readonly EstimateInput[];
  /** Those of the default operating point; what differs from them is marked. */
  readonly reference: readonly EstimateInput[] | null;
  readonly isDimmed: boolean;
}

function isChanged(input: EstimateInput, reference: Props['reference']): boolean {
  if (input.basis === 'given') return true;
  const usual = reference?.find(({ name }) => name === input.name);
  return usual !== undefined && usual.value !== input.value;
}

/** Every number the estimate takes, with where it comes from in the margin. */
export function InputsTable({ inputs, reference, isDimmed }: Props): ReactNode {
  return (
    <table className={isDimmed ? 'ruled stacks dims dimmed' : 'ruled stacks dims'}>
      <thead>
        <tr>
          <th scope="col">quantity</th>
          <th scope="col" className="number">
            value
          </th>
          <th scope="col">unit</th>
          <th scope="col">kind</th>
          <th scope="col">basis · verification</th>
          <th scope="col" className="in-margin">
            source
          </th>
        </tr>
      </thead>
      <tbody>
        {inputs.map((input) => {
          const { name, symbol, unit } = quantities[input.name];
          const hasChanged = isChanged(input, reference);
          return (
            <tr key={input.name} data-input={input.name} className={hasChanged ? 'text-ember' : ''}>
              <th scope="row" className={hasChanged ? 'changed' : ''}>
                {name} <span className="whitespace-nowrap">{symbol}</span>
              </th>
              <td className="number">
                <Figures text={formatWithUncertainty(input.value, input.uncertainty)} />
              </td>
              <td>
                <Unit unit={unit} />
              </td>
              <td className="own-line">{input.kind ?? 'kind not stated'}</td>
              <td className="own-line">
                {input.basis === 'given' ? 'given by you' : input.basis}
                {input.verification !== null && ` · ${input.verification}`}
                {hasChanged && input.basis !== 'given' && ' · changed'}
              </td>
              <td className="in-margin own-line">
                {input.source}
                {input.note !== null && <span className="block italic">{input.note}</span>}
              </td>
            </tr>
          );
        })}
      </tbody>
    </table>
  );
}
