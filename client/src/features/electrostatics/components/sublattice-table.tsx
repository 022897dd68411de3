import type { JSX } from 'react';

import type { EvaluationResult } from '#common/schemas/evaluation';
import { CertainText } from '#client/components/chem/certain-number.tsx';
import { IonText } from '#client/components/chem/ion-text.tsx';
import { withCoulombUncertainty } from '#client/features/electrostatics/model/bounds.ts';

/** Energy by pairs of sublattices, each in its own uniform background. */
export function SublatticeTable({ result }: { result: EvaluationResult }): JSX.Element {
  const { speciesKeys, energiesEv, boundEv } = result.sublatticeMatrix;
  return (
    <>
      <p className="mb-3 max-w-prose text-small text-soft">
        Each sublattice sits in its own uniform compensating background, so like sublattices come
        out negative and the cross term may be positive. Only sums over neutral combinations are
        physical; the sum over all of them is the energy of the formula unit.
      </p>
      <div
        role="region"
        aria-label="Sublattice matrix"
        tabIndex={0}
        className="relative overflow-x-auto"
      >
        <table className="border-collapse whitespace-nowrap">
          <thead>
            <tr className="border-b border-line text-small">
              <th scope="col" className="py-1.5 pr-4 text-left font-normal text-soft">
                eV per formula unit
              </th>
              {speciesKeys.map((key) => (
                <th key={key} scope="col" className="px-3 text-right font-normal">
                  <IonText speciesKey={key} />
                </th>
              ))}
            </tr>
          </thead>
          <tbody className="rule-list">
            {speciesKeys.map((key, row) => (
              <tr key={key}>
                <th scope="row" className="py-1.5 pr-4 text-left font-normal">
                  <IonText speciesKey={key} />
                </th>
                {speciesKeys.map((other, column) => {
                  const value = energiesEv[row]?.[column];
                  return (
                    <td key={other} className="px-3 text-right">
                      {column < row || value === undefined ? (
                        <span className="sr-only">as above the diagonal</span>
                      ) : (
                        <CertainText
                          value={value}
                          bound={withCoulombUncertainty(value, boundEv)}
                          unit="eV"
                          maxDecimals={5}
                        />
                      )}
                    </td>
                  );
                })}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </>
  );
}
