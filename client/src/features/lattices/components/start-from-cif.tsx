import { FileUp } from 'lucide-react';
import { useId, useState, type DragEvent, type JSX, type ReactNode } from 'react';

import type { CellDefinition } from '#common/schemas/cell';
import { readCifRequest } from '#common/schemas/prototype';
import { Button } from '#client/components/button.tsx';
import { TextAreaField } from '#client/components/text-area-field.tsx';
import { useReadCif } from '#client/features/lattices/api/starting-points.ts';
import { CreateForm } from '#client/features/lattices/components/create-form.tsx';
import { ApiError, messageOf } from '#client/lib/api-error.ts';
import { classNames } from '#client/lib/class-names.ts';

/** What could not be read, with the line of the file where it stands. */
function ReadFailure({ error, text }: { error: unknown; text: string }): JSX.Element {
  const line = error instanceof ApiError ? error.details.line : undefined;
  const shown = line === undefined ? undefined : text.split(/\r\n|\r|\n/)[line - 1];
  return (
    <div role="alert" className="border-l-3 border-fails bg-wash px-4 py-3">
      <p className="font-medium">{messageOf(error)}</p>
      {line !== undefined && (
        <p className="mt-1.5 flex gap-3 overflow-x-auto rounded-control bg-raised px-3 py-1.5 whitespace-pre">
          <span className="text-soft">line {line}</span>
          <span>{shown}</span>
        </p>
      )}
      {error instanceof ApiError && error.fields.length > 0 && (
        <ul className="mt-1.5 list-disc pl-5 text-small">
          {error.fields.map((field) => (
            <li key={`${field.field}${field.code}`}>{field.message}</li>
          ))}
        </ul>
      )}
    </div>
  );
}

function useDrop(onText: (text: string) => void): {
  isOver: boolean;
  handlers: {
    onDragOver: (event: DragEvent) => void;
    onDragLeave: () => void;
    onDrop: (event: DragEvent) => void;
  };
} {
  const [isOver, setOver] = useState(false);
  return {
    isOver,
    handlers: {
      onDragOver: (event) => {
        event.preventDefault();
        setOver(true);
      },
      onDragLeave: () => setOver(false),
      onDrop: (event) => {
        event.preventDefault();
        setOver(false);
        const file = event.dataTransfer.files[0];
        if (file === undefined) {
          onText(event.dataTransfer.getData('text'));
        } else {
          void file.text().then(onText);
        }
      },
    },
  };
}

/** A structure file: dropped, chosen or pasted, read by the server. */
export function StartFromCif({
  preview,
}: {
  preview: (cell: CellDefinition) => ReactNode;
}): JSX.Element {
  const fileId = useId();
  const [text, setText] = useState('');
  const [tooLong, setTooLong] = useState(false);
  const read = useReadCif();
  const send = (next: string): void => {
    setText(next);
    const parsed = readCifRequest.safeParse({ text: next });
    setTooLong(!parsed.success);
    if (parsed.success && next.trim() !== '') {
      read.mutate(next);
    }
  };
  const drop = useDrop(send);
  return (
    <div className="grid items-start gap-8 wide:grid-cols-[minmax(0,1fr)_minmax(24rem,36rem)]">
      <div className="grid gap-4">
        <div
          {...drop.handlers}
          className={classNames(
            'grid gap-3 rounded-control border border-dashed p-5 text-center',
            drop.isOver ? 'border-ink bg-wash' : 'border-faint',
          )}
        >
          <FileUp aria-hidden className="mx-auto size-6 text-soft" strokeWidth={1.5} />
          <p>Drop a CIF here, or</p>
          <label
            htmlFor={fileId}
            className="mx-auto inline-flex h-9 cursor-pointer items-center rounded-control border border-line bg-raised px-3.5 font-medium hover:border-faint has-focus-visible:outline-2"
          >
            choose a file
            <input
              id={fileId}
              type="file"
              accept=".cif,chemical/x-cif,text/plain"
              className="sr-only"
              onChange={(event) => void event.target.files?.[0]?.text().then(send)}
            />
          </label>
        </div>
        <TextAreaField
          label="Or paste its text"
          rows={12}
          spellCheck={false}
          value={text}
          error={
            tooLong ? 'The text is longer than the two million signs this server takes.' : null
          }
          placeholder={'data_periclase\n_cell_length_a 4.212\n…'}
          onChange={(event) => setText(event.target.value)}
        />
        <Button
          className="justify-self-start"
          isBusy={read.isPending}
          disabled={text.trim() === ''}
          onClick={() => send(text)}
        >
          Read it
        </Button>
      </div>
      <div className="wide:border-l wide:border-line wide:pl-8">
        {read.isIdle && <p className="text-soft">What is read from the file is shown here.</p>}
        {read.isError && <ReadFailure error={read.error} text={read.variables} />}
        {read.isSuccess && (
          <CreateForm
            key={read.submittedAt}
            suggestedName={read.data.suggestedName}
            cell={read.data.cell}
            prototype={null}
            warnings={read.data.warnings}
            guess={null}
            preview={preview}
          />
        )}
      </div>
    </div>
  );
}
