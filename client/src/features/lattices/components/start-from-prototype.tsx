import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useState, type JSX, type ReactNode } from 'react';

import type { CellDefinition } from '#common/schemas/cell';
import type { PrototypeSummary } from '#common/schemas/prototype';
import { formatNetCharge } from '#common/units/format';
import { ErrorState } from '#client/components/error-state.tsx';
import { SkeletonLines } from '#client/components/skeleton.tsx';
import {
  appliedPrototypeQuery,
  prototypesQuery,
} from '#client/features/lattices/api/starting-points.ts';
import { CreateForm } from '#client/features/lattices/components/create-form.tsx';
import { IonField, type IonChoice } from '#client/features/lattices/components/ion-field.tsx';
import { PrototypeChoice } from '#client/features/lattices/components/prototype-choice.tsx';

interface StartFromPrototypeProps {
  chosen: string | null;
  onChoose: (id: string) => void;
  preview: (cell: CellDefinition) => ReactNode;
}

const exampleIons = (prototype: PrototypeSummary): IonChoice[] =>
  prototype.roles.map(({ element, charge }) => ({ element, charge }));

function ChargeBalance({
  prototype,
  ions,
}: {
  prototype: PrototypeSummary;
  ions: readonly IonChoice[];
}): JSX.Element | null {
  const sum = prototype.roles.reduce(
    (total, role, index) => total + role.perFormulaUnit * (ions[index]?.charge ?? 0),
    0,
  );
  return !Number.isFinite(sum) || Math.abs(sum) < 1e-9 ? null : (
    <p className="border-l-3 border-doubtful bg-wash px-3 py-2 text-small">
      These charges add up to {formatNetCharge(sum)} per formula unit. Without balance the cell has
      no energy.
    </p>
  );
}

function Filled({
  prototype,
  preview,
}: {
  prototype: PrototypeSummary;
  preview: StartFromPrototypeProps['preview'];
}): JSX.Element {
  const [ions, setIons] = useState(() => exampleIons(prototype));
  const isComplete = ions.every((ion) => Number.isFinite(ion.charge) && Math.abs(ion.charge) <= 9);
  const applied = useQuery({
    ...appliedPrototypeQuery(prototype.id, ions),
    enabled: isComplete,
    placeholderData: keepPreviousData,
  });
  return (
    <div className="grid gap-5">
      <div>
        <h2 className="text-lead">{prototype.name}</h2>
        <p className="text-soft">{prototype.description}</p>
      </div>
      <div className="grid gap-3">
        {prototype.roles.map((role, index) => (
          <IonField
            key={index}
            role={role}
            ion={ions[index] ?? role}
            onChange={(ion) => setIons(ions.with(index, ion))}
          />
        ))}
        <ChargeBalance prototype={prototype} ions={ions} />
      </div>
      {applied.isError && (
        <ErrorState error={applied.error} onRetry={() => void applied.refetch()} />
      )}
      {applied.isPending && isComplete && <SkeletonLines lines={3} label="Fitting the cell" />}
      {applied.data !== undefined && !applied.isError && (
        <CreateForm
          key={prototype.id}
          suggestedName={applied.data.suggestedName}
          cell={applied.data.cell}
          prototype={applied.data.prototype}
          warnings={applied.data.warnings}
          guess={applied.data.guess}
          isBusy={!isComplete || applied.isPlaceholderData}
          preview={preview}
        />
      )}
    </div>
  );
}

/** A published structure type, filled with one's own ions. */
export function StartFromPrototype(props: StartFromPrototypeProps): JSX.Element {
  const query = useQuery(prototypesQuery);
  if (query.isPending) {
    return <SkeletonLines lines={8} label="Loading structure types" />;
  }
  if (query.isError) {
    return <ErrorState error={query.error} onRetry={() => void query.refetch()} />;
  }
  const prototype = query.data.find((one) => one.id === props.chosen);
  return (
    <div className="grid items-start gap-8 wide:grid-cols-[minmax(0,1fr)_minmax(24rem,36rem)]">
      <PrototypeChoice prototypes={query.data} chosen={props.chosen} onChoose={props.onChoose} />
      <div className="wide:border-l wide:border-line wide:pl-8">
        {prototype === undefined ? (
          <p className="text-soft">Choose a structure type; its ions can then be replaced.</p>
        ) : (
          <Filled key={prototype.id} prototype={prototype} preview={props.preview} />
        )}
      </div>
    </div>
  );
}
