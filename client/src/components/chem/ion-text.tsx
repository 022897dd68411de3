import { Fragment, type JSX } from 'react';

import { formatCharge, formatTidy } from '#common/units/format';
import { parseSpeciesKey, type SpeciesPart } from '#client/components/chem/species-key.ts';

type IonTextProps = { speciesKey: string } | { element: string; charge: number };

function Ion({ part }: { part: SpeciesPart }): JSX.Element {
  const charge = formatCharge(part.charge);
  return (
    <span className="whitespace-nowrap">
      {part.element}
      {charge !== '' && <sup className="leading-none">{charge}</sup>}
      {part.occupancy !== 1 && (
        <span className="ml-0.5 text-small text-soft">{formatTidy(part.occupancy, 3)}</span>
      )}
    </span>
  );
}

/** An ion as chemists write it: Mg²⁺; the ions of a mixed site with their shares. */
export function IonText(props: IonTextProps): JSX.Element {
  const parts: readonly SpeciesPart[] =
    'speciesKey' in props
      ? parseSpeciesKey(props.speciesKey)
      : [{ element: props.element, charge: props.charge, occupancy: 1 }];
  return (
    <span>
      {parts.map((part, index) => (
        <Fragment key={`${part.element}${part.charge}`}>
          {index > 0 && <span className="text-soft"> / </span>}
          <Ion part={part} />
        </Fragment>
      ))}
    </span>
  );
}

/** Two ions with a dash between: Mg²⁺ – O²⁻. */
export function IonPairText({
  speciesA,
  speciesB,
}: {
  speciesA: string;
  speciesB: string;
}): JSX.Element {
  return (
    <span>
      <IonText speciesKey={speciesA} /> – <IonText speciesKey={speciesB} />
    </span>
  );
}
