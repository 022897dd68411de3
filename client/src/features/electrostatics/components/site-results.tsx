import type { JSX } from 'react';

import type { EvaluationResult, SiteResult } from '#common/schemas/evaluation';
import { formatFixed } from '#common/units/format';
import { CertainText } from '#client/components/chem/certain-number.tsx';
import { IonText } from '#client/components/chem/ion-text.tsx';
import { withCoulombUncertainty } from '#client/features/electrostatics/model/bounds.ts';

interface SiteResultsProps {
  result: EvaluationResult;
  /** Labels of the sites picked in the stage. */
  pickedLabels: ReadonlySet<string>;
  onPick: (site: SiteResult) => void;
}

const size = (vector: readonly number[]): number => Math.hypot(...vector);
const components = (vector: readonly number[], unit: string): string =>
  `x ${formatFixed(vector[0] ?? 0, 4)}, y ${formatFixed(vector[1] ?? 0, 4)}, z ${formatFixed(vector[2] ?? 0, 4)} ${unit}`;

function Row({
  site,
  result,
  isPicked,
  onPick,
}: {
  site: SiteResult;
  result: EvaluationResult;
  isPicked: boolean;
  onPick: (site: SiteResult) => void;
}): JSX.Element {
  const potentialBound = withCoulombUncertainty(site.potentialV, result.potentialBoundV);
  // Fields have no bound of their own in the result: a potential's error over the shortest distance,
  // with a factor of ten to spare.
  const fieldBound = (10 * potentialBound) / result.shortestDistanceA;
  const cell = 'px-2 py-1.5 text-right';
  return (
    <tr className={isPicked ? 'bg-raised shadow-[inset_3px_0_0_var(--ink)]' : undefined}>
      <th scope="row" className="py-1.5 pr-2 pl-2.5 text-left font-normal">
        <button
          type="button"
          aria-pressed={isPicked}
          title="Pick this ion in the stage"
          className="rounded-control font-medium underline-offset-4 hover:underline"
          onClick={() => onPick(site)}
        >
          {site.label}
        </button>
      </th>
      <td className="px-2 py-1.5">
        <IonText speciesKey={site.speciesKey} />
      </td>
      <td className={`${cell} text-soft`}>{site.multiplicity}</td>
      <td className={cell}>
        <CertainText value={site.potentialV} bound={potentialBound} unit="V" maxDecimals={6} />
      </td>
      <td className={cell} title={components(site.fieldVPerA, 'V/Å')}>
        <CertainText value={size(site.fieldVPerA)} bound={fieldBound} maxDecimals={4} />
      </td>
      <td className={cell} title={components(site.forceEvPerA, 'eV/Å')}>
        <CertainText
          value={size(site.forceEvPerA)}
          bound={fieldBound * Math.max(1, Math.abs(site.charge))}
          maxDecimals={4}
        />
      </td>
      <td className={cell}>
        <CertainText
          value={site.energyShareEv}
          bound={potentialBound * Math.abs(site.charge)}
          unit="eV"
          maxDecimals={5}
        />
      </td>
    </tr>
  );
}

const heads: readonly [string, string][] = [
  ['n', 'Symmetry copies in the cell'],
  ['φ, V', 'Potential of all other ions at the site'],
  ['|E|, V/Å', 'Size of the field −∇φ at the site'],
  ['|F|, eV/Å', 'Size of the electrostatic force on the ion'],
  ['½qφ, eV', 'Share of one ion in the energy of the cell'],
];

/** What every site of the asymmetric unit feels. */
export function SiteResults({ result, pickedLabels, onPick }: SiteResultsProps): JSX.Element {
  return (
    <div
      role="region"
      aria-label="Sites and what they feel"
      tabIndex={0}
      className="relative overflow-x-auto"
    >
      <table className="w-full border-collapse whitespace-nowrap">
        <thead>
          <tr className="border-b border-line text-small text-soft">
            <th scope="col" className="py-1.5 pl-2.5 text-left font-normal">
              site
            </th>
            <th scope="col" className="px-2 text-left font-normal">
              ion
            </th>
            {heads.map(([name, title]) => (
              <th key={name} scope="col" title={title} className="px-2 text-right font-normal">
                {name}
              </th>
            ))}
          </tr>
        </thead>
        <tbody className="rule-list">
          {result.sites.map((site) => (
            <Row
              key={site.label}
              site={site}
              result={result}
              isPicked={pickedLabels.has(site.label)}
              onPick={onPick}
            />
          ))}
        </tbody>
      </table>
    </div>
  );
}
