import type { JSX } from 'react';

import { EV_PER_CUBIC_ANGSTROM_IN_GPA } from '#common/units/constants';
import type { EvaluationResult } from '#common/schemas/evaluation';
import { CertainText } from '#client/components/chem/certain-number.tsx';
import { withCoulombUncertainty } from '#client/features/electrostatics/model/bounds.ts';

/** Places of xx, yy, zz, yz, xz, xy in the symmetric matrix. */
const places = [
  [0, 5, 4],
  [5, 1, 3],
  [4, 3, 2],
] as const;
const axes = ['x', 'y', 'z'] as const;

/** Electrostatic stress ∂E/∂ε / V in GPa, Cartesian axes. */
export function StressTable({ result }: { result: EvaluationResult }): JSX.Element {
  const valueAt = (at: number): number =>
    (result.stressEvPerA3[at] ?? 0) * EV_PER_CUBIC_ANGSTROM_IN_GPA;
  const bound = result.stressBoundEvPerA3 * EV_PER_CUBIC_ANGSTROM_IN_GPA;
  return (
    <>
      <p className="mb-3 max-w-prose text-small text-soft">
        Point charges alone: the attraction pulls the cell together, and only a repulsion would
        balance it. x lies along a, y in the plane of a and b.
      </p>
      <table className="border-collapse whitespace-nowrap">
        <thead>
          <tr className="border-b border-line text-small text-soft">
            <th scope="col" className="py-1.5 pr-4 text-left font-normal">
              GPa
            </th>
            {axes.map((axis) => (
              <th key={axis} scope="col" className="px-4 text-right font-normal">
                {axis}
              </th>
            ))}
          </tr>
        </thead>
        <tbody className="rule-list">
          {places.map((row, index) => (
            <tr key={axes[index]}>
              <th scope="row" className="py-1.5 pr-4 text-left font-normal text-soft">
                {axes[index]}
              </th>
              {row.map((at, column) => (
                <td key={column} className="px-4 text-right">
                  <CertainText
                    value={valueAt(at)}
                    bound={withCoulombUncertainty(valueAt(at), bound)}
                    unit="GPa"
                    maxDecimals={4}
                  />
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </>
  );
}
