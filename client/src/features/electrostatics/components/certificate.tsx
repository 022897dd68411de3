import type { JSX, ReactNode } from 'react';

import type { EvaluationResult } from '#common/schemas/evaluation';
import { formatFixed, formatPower } from '#common/units/format';

function Entry({ name, children }: { name: string; children: ReactNode }): JSX.Element {
  return (
    <div className="flex flex-wrap justify-between gap-x-6 py-1.5">
      <dt className="text-soft">{name}</dt>
      <dd className="text-right">{children}</dd>
    </div>
  );
}

/** How the digits were checked. */
export function CertificateList({ result }: { result: EvaluationResult }): JSX.Element {
  const { certificate } = result;
  const [first = 0, second = 0] = certificate.splittingPerA;
  return (
    <dl className="rule-list max-w-2xl">
      <Entry name="Splitting parameters of the two evaluations">
        {formatFixed(first, 4)} and {formatFixed(second, 4)} Å⁻¹
      </Entry>
      <Entry name="Difference of their energies, per cell">
        {formatPower(certificate.energyDifferenceEv, 2)} eV
      </Entry>
      <Entry name="Virial: |tr(σ)V + E|, per cell">
        {formatPower(certificate.virialResidualEv, 2)} eV
      </Entry>
      <Entry name="Potentials: |½Σqφ − E|, per cell">
        {formatPower(certificate.potentialSumResidualEv, 2)} eV
      </Entry>
      <Entry name="Sum of all forces |ΣF|">{formatPower(certificate.forceSumEvPerA, 2)} eV/Å</Entry>
      <Entry name="Terms summed, direct and reciprocal">
        {formatFixed(certificate.realTerms, 0)} and {formatFixed(certificate.reciprocalTerms, 0)}
      </Entry>
      <Entry name="Cut-offs, direct and reciprocal">
        {formatFixed(certificate.realCutoffA, 2)} Å and{' '}
        {formatFixed(certificate.reciprocalCutoffPerA, 2)} Å⁻¹
      </Entry>
      <Entry name="Tolerance asked for, relative to Σq²/d₀">
        {formatPower(result.method.toleranceRelative)}
      </Entry>
      <Entry name="Engine">{result.engine}</Entry>
    </dl>
  );
}
