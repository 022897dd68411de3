import { CircleAlert } from 'lucide-react';
import type { JSX } from 'react';

import type { BoundedOrReason, EvaluationResult } from '#common/schemas/evaluation';
import { formatBound } from '#common/units/format';
import { CertainNumber, NoNumber } from '#client/components/chem/certain-number.tsx';
import { energyBoundEv } from '#client/features/electrostatics/model/bounds.ts';
import {
  conventions,
  madelungConventions,
} from '#client/features/electrostatics/model/conventions.ts';

function Total({ result }: { result: EvaluationResult }): JSX.Element {
  const bound = energyBoundEv(result.energyEvPerFormulaUnit);
  const { agrees } = result.certificate;
  const notes = [
    `certain to ± ${formatBound(bound)} eV`,
    result.hasPolarAxis ? 'conducting boundary (the cell has a polar axis)' : 'conducting boundary',
    agrees ? 'two cut-offs agree' : 'two cut-offs do not agree',
    ...(result.method.uniformBackground ? ['uniform background'] : []),
  ];
  return (
    <div>
      <p className="flex flex-wrap items-baseline gap-x-2">
        <CertainNumber
          value={result.energyEvPerFormulaUnit.value}
          bound={bound}
          unit="eV per formula unit"
          convention={conventions.energy}
          isUnitHidden
          className="text-[clamp(28px,7.6vw,38px)] leading-[1.08] font-bold tracking-[-0.03em]"
        />
        <span aria-hidden className="text-lead text-soft">
          eV per formula unit
        </span>
      </p>
      <p className="mt-1 text-small text-soft">{notes.join(' · ')}</p>
      {!agrees && (
        <p role="alert" className="mt-1 flex gap-1.5 text-small text-fails">
          <CircleAlert aria-hidden className="mt-0.5 size-3.5 shrink-0" />
          Treat these digits as doubtful: see the certificate below.
        </p>
      )}
    </div>
  );
}

/** Symbol of a constant; the tilde of M̃ is drawn here, since the font has none to set over a letter. */
function Symbol({ symbol }: { symbol: string }): JSX.Element {
  if (symbol !== 'M̃') {
    return <span className="text-ink">{symbol}</span>;
  }
  return (
    <span className="relative text-ink">
      <span className="sr-only">M tilde</span>
      <span aria-hidden>M</span>
      <span aria-hidden className="absolute inset-x-0 -top-[0.3em] text-center leading-none">
        ~
      </span>
    </span>
  );
}

function Constant({
  symbol,
  caption,
  convention,
  constant,
  align,
}: {
  symbol: string;
  caption: string;
  convention: string;
  constant: BoundedOrReason;
  align: 'start' | 'end';
}): JSX.Element {
  return (
    <div className="min-w-0">
      <dd className="text-lead font-medium">
        {constant.value === null || constant.bound === null ? (
          <NoNumber reason={constant.reason ?? 'It means nothing for this cell.'} align={align} />
        ) : (
          <CertainNumber
            value={constant.value}
            bound={constant.bound}
            convention={convention}
            align={align}
          />
        )}
      </dd>
      <dt className="text-small text-soft" title={convention}>
        <Symbol symbol={symbol} /> {caption}
      </dt>
    </div>
  );
}

function ShortestDistance({ result }: { result: EvaluationResult }): JSX.Element {
  const isUnlike = result.shortestUnlikeDistanceA !== null;
  const value = result.shortestUnlikeDistanceA ?? result.shortestDistanceA;
  return (
    <div className="min-w-0">
      <dd className="text-lead font-medium">
        <CertainNumber
          value={value}
          bound={value * 1e-14}
          maxDecimals={4}
          unit="Å"
          convention={isUnlike ? conventions.distance : 'Shortest distance between any two sites.'}
        />
      </dd>
      <dt className="text-small text-soft">
        {isUnlike ? (
          <>
            <span className="text-ink">d₀</span> {result.shortestUnlikePair?.join('–')}
          </>
        ) : (
          'shortest distance'
        )}
      </dt>
    </div>
  );
}

/** The total in large figures, the four Madelung constants and the shortest distance. */
export function EnergyFigures({ result }: { result: EvaluationResult }): JSX.Element {
  return (
    <section aria-label="Energy">
      <Total result={result} />
      <dl className="mt-3.5 mb-4 grid grid-cols-[repeat(auto-fit,minmax(9.2rem,1fr))] gap-x-6 gap-y-2.5">
        {madelungConventions.map(({ name, ...words }, index) => (
          <Constant
            key={name}
            {...words}
            constant={result.madelung[name]}
            align={index === 2 ? 'end' : 'start'}
          />
        ))}
        <ShortestDistance result={result} />
      </dl>
    </section>
  );
}
