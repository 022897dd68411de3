import { Combobox, ComboboxInput, ComboboxOption, ComboboxOptions } from '@headlessui/react';
import { useId, useState, type JSX } from 'react';

import { elements, findElement } from '#common/chemistry/elements';
import { commonOxidationStates } from '#common/chemistry/oxidation-states';
import type { PrototypeRole } from '#common/schemas/prototype';
import { formatNetCharge } from '#common/units/format';
import { IonText } from '#client/components/chem/ion-text.tsx';
import { fieldLook } from '#client/components/field-frame.tsx';
import { classNames } from '#client/lib/class-names.ts';

export interface IonChoice {
  readonly element: string;
  readonly charge: number;
}

interface IonFieldProps {
  role: PrototypeRole;
  ion: IonChoice;
  onChange: (ion: IonChoice) => void;
}

const listed = 12;

function findElements(typed: string): readonly { symbol: string; name: string }[] {
  const wanted = typed.trim().toLowerCase();
  if (wanted === '') {
    return elements;
  }
  const rank = (element: { symbol: string; name: string }): number =>
    element.symbol.toLowerCase() === wanted
      ? 0
      : element.symbol.toLowerCase().startsWith(wanted)
        ? 1
        : element.name.toLowerCase().startsWith(wanted)
          ? 2
          : 3;
  return elements
    .filter((element) => rank(element) < 3)
    .toSorted((one, other) => rank(one) - rank(other));
}

/** Charge that an element most likely has in a role: the role's own if common, else one of its sign. */
function likelyCharge(element: string, role: PrototypeRole): number {
  const states = commonOxidationStates(element);
  if (states.includes(role.charge)) {
    return role.charge;
  }
  return states.find((state) => Math.sign(state) === Math.sign(role.charge)) ?? role.charge;
}

function ElementField({ role, ion, onChange }: IonFieldProps): JSX.Element {
  const [typed, setTyped] = useState('');
  return (
    <Combobox
      value={ion.element}
      immediate
      onClose={() => setTyped('')}
      onChange={(element: string | null) =>
        element !== null && onChange({ element, charge: likelyCharge(element, role) })
      }
    >
      <ComboboxInput
        aria-label={`Element in place of ${role.element}`}
        autoComplete="off"
        spellCheck={false}
        displayValue={(symbol: string) => {
          const name = findElement(symbol)?.name;
          return name === undefined ? symbol : `${symbol}, ${name}`;
        }}
        onFocus={(event) => event.target.select()}
        onChange={(event) => setTyped(event.target.value)}
        className={classNames(fieldLook, 'h-9 px-3')}
      />
      <ComboboxOptions
        anchor={{ to: 'bottom start', gap: 4 }}
        className="z-50 max-h-72! w-(--input-width) overflow-y-auto rounded-control border border-line bg-raised p-1 shadow-sheet empty:hidden"
      >
        {findElements(typed)
          .slice(0, typed === '' ? undefined : listed)
          .map((element) => (
            <ComboboxOption
              key={element.symbol}
              value={element.symbol}
              className="flex cursor-pointer gap-3 rounded-control px-2.5 py-1 data-focus:bg-wash data-selected:font-medium"
            >
              <span className="w-7">{element.symbol}</span>
              <span className="text-soft">{element.name}</span>
            </ComboboxOption>
          ))}
      </ComboboxOptions>
    </Combobox>
  );
}

function ChargeField({ ion, onChange, id }: IonFieldProps & { id: string }): JSX.Element {
  const states = commonOxidationStates(ion.element).filter((state) => state !== 0);
  return (
    <>
      <input
        type="number"
        step="any"
        min={-9}
        max={9}
        aria-label={`Charge of ${ion.element}`}
        list={id}
        value={Number.isFinite(ion.charge) ? ion.charge : ''}
        onChange={(event) => onChange({ ...ion, charge: event.target.valueAsNumber })}
        className={classNames(fieldLook, 'h-9 px-3')}
      />
      <datalist id={id}>
        {states.map((state) => (
          <option key={state} value={state}>
            {formatNetCharge(state)}
          </option>
        ))}
      </datalist>
    </>
  );
}

/** The ion that takes a role of the structure type. */
export function IonField(props: IonFieldProps): JSX.Element {
  const { role, ion } = props;
  const id = useId();
  return (
    <fieldset>
      <legend className="mb-1 text-small text-soft">
        In place of <IonText element={role.element} charge={role.charge} />, {role.coordination}{' '}
        neighbours
      </legend>
      <div className="grid grid-cols-[1fr_6rem] gap-2">
        <ElementField {...props} />
        <ChargeField {...props} id={id} />
      </div>
      {!Number.isFinite(ion.charge) && (
        <p className="mt-1 text-small text-fails">Write the charge as a number, such as 2 or -1.</p>
      )}
    </fieldset>
  );
}
