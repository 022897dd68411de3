import { useState, type FormEvent, type JSX, type ReactNode } from 'react';
import { useNavigate } from 'react-router-dom';

import { createLatticeRequest } from '#common/schemas/lattice';
import type { CellDefinition } from '#common/schemas/cell';
import { Button } from '#client/components/button.tsx';
import { InlineError } from '#client/components/error-state.tsx';
import { TextField } from '#client/components/text-field.tsx';
import { useToast } from '#client/components/toast.tsx';
import { useCreateLattice } from '#client/features/lattices/api/starting-points.ts';
import { useWorkspace } from '#client/lib/session.ts';

interface CreateFormProps {
  suggestedName: string;
  cell: CellDefinition;
  prototype: string | null;
  warnings: readonly { code: string; message: string }[];
  /** How the lattice parameters were guessed; null where they are given. */
  guess: string | null;
  isBusy?: boolean;
  preview: ((cell: CellDefinition) => ReactNode) | null;
}

const symbols = { a: 'a', b: 'b', c: 'c', alpha: 'α', beta: 'β', gamma: 'γ' } as const;

function Parameters({ cell, guess }: { cell: CellDefinition; guess: string | null }): JSX.Element {
  const names = Object.keys(symbols) as (keyof typeof symbols)[];
  return (
    <div className="rounded-control bg-wash px-4 py-3">
      <dl className="flex flex-wrap gap-x-5 gap-y-1">
        {names.map((name) => (
          <div key={name} className="flex gap-1.5">
            <dt className="text-soft italic">{symbols[name]}</dt>
            <dd>
              {cell.lattice[name]}
              <span className="text-soft"> {'abc'.includes(name) ? 'Å' : '°'}</span>
            </dd>
          </div>
        ))}
      </dl>
      {guess !== null && (
        <p className="mt-1.5 text-small text-soft">
          <strong className="font-medium text-ink">A guess to start from. </strong>
          {guess}
        </p>
      )}
    </div>
  );
}

/** The last step of every start: what the cell looks like, its name, and creating it. */
export function CreateForm(props: CreateFormProps): JSX.Element {
  const { workspaceSlug } = useWorkspace();
  const navigate = useNavigate();
  const show = useToast();
  const create = useCreateLattice(workspaceSlug);
  const [typedName, setTypedName] = useState<string | null>(null);
  const [nameError, setNameError] = useState<string | null>(null);
  const name = typedName ?? props.suggestedName;

  const submit = (event: FormEvent): void => {
    event.preventDefault();
    const parsed = createLatticeRequest.safeParse({
      name,
      cell: props.cell,
      prototype: props.prototype,
    });
    if (!parsed.success) {
      const issue = parsed.error.issues.find((one) => one.path[0] === 'name');
      setNameError(issue?.message ?? 'The cell is larger than this server takes.');
      return;
    }
    setNameError(null);
    create.mutate(parsed.data, {
      onSuccess: (lattice) => {
        show({ message: `${lattice.name} is created.` });
        void navigate(`/w/${workspaceSlug}/lattices/${lattice.id}?section=cell`);
      },
    });
  };
  return (
    <form onSubmit={submit} className="grid gap-4">
      <Parameters cell={props.cell} guess={props.guess} />
      {props.warnings.map((warning) => (
        <p
          key={`${warning.code}${warning.message}`}
          className="border-l-3 border-doubtful bg-wash px-3 py-2 text-small"
        >
          {warning.message}
        </p>
      ))}
      <div className="flex flex-wrap items-start gap-3">
        <TextField
          label="Name"
          value={name}
          maxLength={120}
          error={nameError}
          onChange={(event) => setTypedName(event.target.value)}
          className="grow basis-56"
        />
        <Button
          type="submit"
          variant="primary"
          isBusy={create.isPending}
          disabled={props.isBusy ?? false}
          className="sm:mt-[22px]"
        >
          Create the lattice
        </Button>
      </div>
      <InlineError error={create.error} />
      {props.preview?.(props.cell)}
    </form>
  );
}
