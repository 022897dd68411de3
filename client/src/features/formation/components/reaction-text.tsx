import { Fragment, type JSX } from 'react';

import type { FormationParticle } from '#common/physics/energetics/formation-steps';
import { formatCharge, formatTidy } from '#common/units/format';
import { FormulaText } from '#client/components/chem/formula-text.tsx';

function coefficientText(coefficient: number): string {
  if (Math.abs(coefficient - 1) < 1e-9) {
    return '';
  }
  const halves = coefficient * 2;
  const isHalf = Math.abs(halves - Math.round(halves)) < 1e-9 && Math.round(halves) % 2 === 1;
  if (!isHalf) {
    return `${formatTidy(coefficient, 3)} `;
  }
  const whole = Math.floor(coefficient);
  return `${whole === 0 ? '' : whole}½ `;
}

function Particle({ particle }: { particle: FormationParticle }): JSX.Element {
  const { coefficient, formula, chargeE, phase } = particle;
  const charge = formatCharge(chargeE);
  return (
    <span className="whitespace-nowrap">
      {coefficientText(coefficient)}
      <FormulaText formula={formula} />
      {charge !== '' && <sup className="leading-none">{charge}</sup>}
      {phase !== null && `(${phase})`}
    </span>
  );
}

function Side({ particles }: { particles: readonly FormationParticle[] }): JSX.Element {
  return (
    <>
      {particles.map((particle, index) => (
        <Fragment key={index}>
          {index > 0 && ' + '}
          <Particle particle={particle} />
        </Fragment>
      ))}
    </>
  );
}

/** A step as chemists write it: ½ Cl₂(g) → Cl(g). */
export function ReactionText({
  from,
  to,
}: {
  from: readonly FormationParticle[];
  to: readonly FormationParticle[];
}): JSX.Element {
  return (
    <span>
      <Side particles={from} /> <span aria-label="to">→</span> <Side particles={to} />
    </span>
  );
}
