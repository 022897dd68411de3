import type { JSX } from 'react';
import { Link } from 'react-router-dom';

import type { EvaluationResult } from '#common/schemas/evaluation';
import { formatFixed } from '#common/units/format';
import { Disclosure } from '#client/components/disclosure.tsx';
import { CertificateList } from '#client/features/electrostatics/components/certificate.tsx';
import { StressTable } from '#client/features/electrostatics/components/stress-table.tsx';
import { SublatticeTable } from '#client/features/electrostatics/components/sublattice-table.tsx';

/** For specialists: how the digits were checked, sublattices, stress. */
export function EnergyDetails({ result }: { result: EvaluationResult }): JSX.Element {
  const { certificate } = result;
  return (
    <div className="border-b border-line">
      <Disclosure
        title="Certificate"
        note={
          certificate.agrees
            ? 'two splitting parameters, virial and force sum agree'
            : 'the checks do not agree'
        }
      >
        <CertificateList result={result} />
      </Disclosure>
      <Disclosure title="Sublattice matrix" note={`${result.species.length} kinds of ion`}>
        <SublatticeTable result={result} />
      </Disclosure>
      <Disclosure title="Stress" note={`cell of ${formatFixed(result.volumeA3, 3)} Å³`}>
        <StressTable result={result} />
      </Disclosure>
      <p className="border-t border-line py-3 text-small">
        <Link to="/methods#electrostatics" className="underline underline-offset-4">
          How these numbers are made
        </Link>
      </p>
    </div>
  );
}
