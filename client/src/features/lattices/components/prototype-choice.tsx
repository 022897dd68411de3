import { Radio, RadioGroup } from '@headlessui/react';
import { Search } from 'lucide-react';
import { useState, type JSX } from 'react';

import type { PrototypeSummary } from '#common/schemas/prototype';
import { FormulaText } from '#client/components/chem/formula-text.tsx';
import { IonText } from '#client/components/chem/ion-text.tsx';
import { SpaceGroupText } from '#client/components/chem/space-group-text.tsx';
import { fieldLook } from '#client/components/field-frame.tsx';
import { classNames } from '#client/lib/class-names.ts';

/** Coordination of each role: Na⁺ 6, Cl⁻ 6. */
function Coordination({ prototype }: { prototype: PrototypeSummary }): JSX.Element {
  return (
    <span className="flex flex-wrap gap-x-3 text-small text-soft">
      {prototype.roles.map((role, index) => (
        <span key={index} className="whitespace-nowrap">
          <IonText element={role.element} charge={role.charge} /> {role.coordination}
        </span>
      ))}
    </span>
  );
}

function Card({ prototype }: { prototype: PrototypeSummary }): JSX.Element {
  return (
    <Radio
      value={prototype.id}
      className="flex cursor-pointer flex-col gap-0.5 rounded-control border border-line bg-raised px-3.5 py-2.5 hover:border-faint data-checked:border-ink data-checked:shadow-[inset_3px_0_0_var(--ink)]"
    >
      <span className="flex items-baseline justify-between gap-3">
        <span className="font-medium">{prototype.name}</span>
        <span className="text-soft">
          <FormulaText formula={prototype.example} />
        </span>
      </span>
      <span className="flex items-baseline justify-between gap-3 text-small text-soft">
        <span>
          <SpaceGroupText symbol={prototype.spaceGroupSymbol} /> · {prototype.spaceGroupNumber}
        </span>
        <Coordination prototype={prototype} />
      </span>
    </Radio>
  );
}

function fits(prototype: PrototypeSummary, wanted: string): boolean {
  const text = `${prototype.name} ${prototype.example} ${prototype.spaceGroupSymbol} ${prototype.spaceGroupNumber}`;
  return text.toLowerCase().includes(wanted.trim().toLowerCase());
}

interface PrototypeChoiceProps {
  prototypes: readonly PrototypeSummary[];
  chosen: string | null;
  onChoose: (id: string) => void;
}

/** The structure types as cards; the coordination stands behind each ion. */
export function PrototypeChoice({
  prototypes,
  chosen,
  onChoose,
}: PrototypeChoiceProps): JSX.Element {
  const [wanted, setWanted] = useState('');
  const found = prototypes.filter((prototype) => fits(prototype, wanted));
  return (
    <div className="grid gap-3">
      <label className="relative block">
        <span className="sr-only">Find a structure type</span>
        <Search aria-hidden className="absolute top-2.5 left-3 size-4 text-soft" />
        <input
          type="search"
          value={wanted}
          placeholder="Name, formula or space group"
          onChange={(event) => setWanted(event.target.value)}
          className={classNames(fieldLook, 'h-9 pr-3 pl-9')}
        />
      </label>
      {found.length === 0 && (
        <p className="text-soft">
          No structure type fits. Start from a CIF or a blank cell instead.
        </p>
      )}
      <RadioGroup
        aria-label="Structure type"
        value={chosen ?? ''}
        onChange={onChoose}
        className="grid gap-2 sm:grid-cols-2"
      >
        {found.map((prototype) => (
          <Card key={prototype.id} prototype={prototype} />
        ))}
      </RadioGroup>
    </div>
  );
}
