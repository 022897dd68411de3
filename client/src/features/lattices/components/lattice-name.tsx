import { Pencil } from 'lucide-react';
import { useState, type FormEvent, type JSX } from 'react';

import { updateLatticeRequest } from '#common/schemas/lattice';
import { Button, IconButton } from '#client/components/button.tsx';
import { fieldLook } from '#client/components/field-frame.tsx';
import { useToast } from '#client/components/toast.tsx';
import { useRenameLattice } from '#client/features/lattices/api/lattice.ts';
import { messageOf } from '#client/lib/api-error.ts';
import { classNames } from '#client/lib/class-names.ts';
import type { LatticeRef } from '#client/lib/lattice-keys.ts';

interface LatticeNameProps {
  latticeRef: LatticeRef;
  name: string;
  mayRename: boolean;
}

function RenameForm({
  name,
  onDone,
  onName,
}: {
  name: string;
  onDone: () => void;
  onName: (name: string) => void;
}): JSX.Element {
  const [error, setError] = useState<string | null>(null);
  const submit = (event: FormEvent<HTMLFormElement>): void => {
    event.preventDefault();
    const typed = new FormData(event.currentTarget).get('name');
    const parsed = updateLatticeRequest.safeParse({ name: typed });
    if (!parsed.success || parsed.data.name === undefined) {
      setError(parsed.error?.issues[0]?.message ?? 'Give the lattice a name.');
      return;
    }
    if (parsed.data.name !== name) {
      onName(parsed.data.name);
    }
    onDone();
  };
  return (
    <form
      onSubmit={submit}
      onKeyDown={(event) => {
        if (event.key === 'Escape') {
          onDone();
        }
      }}
      className="flex flex-wrap items-center gap-2"
    >
      <h1 className="sr-only">{name}</h1>
      <input
        name="name"
        // Opened by the button beside the title: the field is where one goes on.
        autoFocus
        defaultValue={name}
        maxLength={120}
        aria-label="Name of the lattice"
        aria-invalid={error === null ? undefined : true}
        aria-describedby={error === null ? undefined : 'name-error'}
        onFocus={(event) => event.target.select()}
        className={classNames(fieldLook, 'h-10 w-80! max-w-full px-2.5 text-lead font-bold')}
      />
      <Button type="submit" size="small">
        Rename
      </Button>
      <Button size="small" variant="quiet" onClick={onDone}>
        Cancel
      </Button>
      {error !== null && (
        <p id="name-error" role="alert" className="text-small text-fails">
          {error}
        </p>
      )}
    </form>
  );
}

/** The title of the page; turns into a field where one may rename. */
export function LatticeName({ latticeRef, name, mayRename }: LatticeNameProps): JSX.Element {
  const [isEditing, setEditing] = useState(false);
  const show = useToast();
  const rename = useRenameLattice(latticeRef);
  if (isEditing) {
    return (
      <RenameForm
        name={name}
        onDone={() => setEditing(false)}
        onName={(next) =>
          rename.mutate(next, {
            onError: (error) => show({ message: messageOf(error), tone: 'failure' }),
          })
        }
      />
    );
  }
  return (
    <div className="group relative flex min-w-0 items-center gap-1">
      <h1 className="min-w-0 text-title tracking-[-0.02em]">{name}</h1>
      {mayRename && (
        <IconButton
          label="Rename"
          icon={<Pencil aria-hidden className="size-3.5" />}
          onClick={() => setEditing(true)}
          className="size-6! md:absolute md:left-full md:opacity-0 md:group-hover:opacity-100 md:focus-visible:opacity-100"
        />
      )}
    </div>
  );
}
