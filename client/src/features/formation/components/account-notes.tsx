import type { JSX } from 'react';

import type { FormationLedger } from '#common/physics/energetics/formation-ledger';
import { Disclosure } from '#client/components/disclosure.tsx';
import { lineValueOn, rangeOn } from '#client/features/formation/model/energy-scale.ts';
import type { EnergyScale } from '#client/lib/energy-unit.ts';
import {
  capitalised,
  originWords,
  quantityWords,
  statusOf,
} from '#client/features/formation/model/words.ts';

type NotesProps = { ledger: FormationLedger; scale: EnergyScale };

function SourceTable({ ledger, scale }: NotesProps): JSX.Element {
  return (
    <dl className="rule-list">
      {[...ledger.lines, ledger.formation].map((line) => (
        <div key={line.key} className="py-2">
          <dt className="flex flex-wrap justify-between gap-x-4">
            <span>{capitalised(line.name)}</span>
            <span className="text-soft">
              {line.valueKjPerMol === null
                ? 'no value'
                : `${lineValueOn(scale, line)} ${scale.unit}`}
            </span>
          </dt>
          <dd className="text-small text-soft">
            {[
              originWords[line.origin],
              line.origin === 'missing' ? line.reason : line.source,
              statusOf(line.status),
              quantityWords[line.quantity],
            ]
              .filter((text) => text !== null && text !== '')
              .join(' · ')}
          </dd>
        </div>
      ))}
    </dl>
  );
}

function Conventions({ ledger, scale }: NotesProps): JSX.Element {
  const heat = ledger.latticeHeatKjPerMol;
  return (
    <ul className="grid max-w-2xl list-disc gap-1.5 pl-5 text-small">
      <li>
        Energy put in is positive and opposes; energy given off is negative and binds. Affinities
        are enthalpies of gain: negative where the atom gives energy off. The lattice line runs from
        gas ions to the crystal.
      </li>
      <li>
        Values stand per mole of atoms or ions; times the number in the formula they give the share
        on the right. ½ D is half the bond enthalpy of a gas of two atoms.
      </li>
      <li>
        Atomisation, lattice and formation enthalpies are those at 298 K and 1 bar. Ionisation
        energies and affinities are energies at 0 K: in enthalpies every electron that leaves adds
        5/2 RT and every one that joins takes it back, so for a neutral compound the sum is the
        same.
      </li>
      <li>
        A lattice energy from the model is one of ions at rest, 0 K, without zero-point motion. As
        an enthalpy at 298 K it is ½ RT per gas ion less negative, here{' '}
        {rangeOn(scale, { low: heat, high: heat }, true)} {scale.unit}: ΔH = U + Σ ν (2 − c/2) RT
        with c = 3 for single atoms, the crystal’s vibrations taken as classical. It has its own
        line. A typed, measured or solved lattice line is an enthalpy at 298 K.
      </li>
      <li>
        Second and higher affinities belong to ions that don’t exist free: they are estimates, given
        quite differently by different tables, and worth trying over a range.
      </li>
      {ledger.isMixed && (
        <li>
          Shared and partly empty sites count with their occupancies: the account is that of the
          mean composition and knows nothing of how the ions are ordered.
        </li>
      )}
    </ul>
  );
}

/** Where every number comes from, and what the columns mean. */
export function AccountNotes(props: NotesProps): JSX.Element {
  return (
    <div className="mt-6 border-b border-line">
      <Disclosure title="Sources" note="of every value">
        <SourceTable {...props} />
      </Disclosure>
      <Disclosure title="Conventions" note="signs, 0 K and 298 K">
        <Conventions {...props} />
      </Disclosure>
    </div>
  );
}
