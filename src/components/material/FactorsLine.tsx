import type { ReactNode } from 'react';
import { factorFigures, kappaFigures } from '#src/components/material/factors.ts';
import { Figures } from '#src/components/text/Figures.tsx';
import { Third } from '#src/components/text/Third.tsx';
import { formatLengthM, formatQuantity } from '#src/lib/format.ts';
import type { EstimatePoint } from '#src/schemas/estimate.ts';

interface Factor {
  readonly symbol: ReactNode;
  readonly name: string;
  readonly value: ReactNode;
  readonly aside?: string;
}

/** κ = ⅓ C v l with the numbers of one temperature; porosity is a fourth factor where there is some. */
export function FactorsLine({ point }: { readonly point: EstimatePoint }): ReactNode {
  const significant = factorFigures(point);
  const factors: Factor[] = [
    {
      symbol: <i>C</i>,
      name: 'heat capacity',
      value: (
        <Figures text={formatQuantity(point.heat_capacity_J_m3K, { significant, unit: 'J/(m³\u2009K)' })} />
      ),
    },
    {
      symbol: <i>v</i>,
      name: 'velocity',
      value: <Figures text={formatQuantity(point.velocity_m_s, { significant, unit: 'm/s' })} />,
    },
    {
      symbol: <i>l</i>,
      name: 'mean free path',
      value: <Figures text={formatQuantity(point.mean_free_path_m, { significant, unit: 'm' })} />,
      aside: formatLengthM(point.mean_free_path_m),
    },
    ...(point.porosity_factor === 1
      ? []
      : [
          {
            symbol: 'pores',
            name: 'porosity factor',
            value: <Figures text={formatQuantity(point.porosity_factor, { significant })} />,
          },
        ]),
  ];
  return (
    <div className="factors figures">
      <div className="factor">
        <span className="factor-value">
          <Third />
        </span>
        <span className="factor-name">three dimensions</span>
      </div>
      {factors.map(({ symbol, name, value, aside }) => (
        <div className="factor" key={name}>
          <span className="factor-value">
            <span className="factor-sign">×</span> {value}
          </span>
          <span className="factor-name">
            {symbol}, {name}
            {aside !== undefined && (
              <>
                {' '}
                (<Figures text={aside} />)
              </>
            )}
          </span>
        </div>
      ))}
      <div className="factor">
        <span className="factor-value">
          <span className="factor-sign">=</span>{' '}
          <span className="text-tide">
            <Figures
              text={formatQuantity(point.kappa_W_mK, { significant: kappaFigures, unit: 'W/(m\u2009K)' })}
            />
          </span>
        </span>
        <span className="factor-name">κ, estimated</span>
      </div>
    </div>
  );
}
