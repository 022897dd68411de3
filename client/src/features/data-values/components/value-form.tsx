import { useState, type FormEvent, type JSX } from 'react';

import { valueFault, type DataKey } from '#common/chemistry/data-key';
import type { Sourced } from '#common/chemistry/sourced';
import { Button } from '#client/components/button.tsx';
import { InlineError } from '#client/components/error-state.tsx';
import { TextField } from '#client/components/text-field.tsx';
import { statusWord } from '#client/features/data-values/model/data-rows.ts';
import { readValue, valueText } from '#client/features/data-values/model/value-text.ts';
import { messageOf } from '#client/lib/api-error.ts';

/** Value and note as they are sent. */
export interface TypedValue {
  readonly value: number;
  readonly note: string;
}

interface ValueFormProps {
  /** What the value is of; null while that is not yet written down. */
  of: DataKey | null;
  shipped: Sourced | null;
  /** The workspace's own value so far. */
  initial: TypedValue | null;
  onSave: (typed: TypedValue) => void;
  onCancel: () => void;
  /** Offered where there is something to go back from. */
  onRestore?: (() => void) | undefined;
  isBusy: boolean;
  error: unknown;
  /** Fields before the value; told whether someone tried to save. */
  before?: (isTried: boolean) => JSX.Element;
}

function faultOf(of: DataKey | null, value: number): string | null {
  if (Number.isNaN(value)) {
    return 'Write a number.';
  }
  return of === null ? null : valueFault(of.facts, value);
}

function ShippedLine({ shipped, unit }: { shipped: Sourced | null; unit: string }): JSX.Element {
  return (
    <p className="text-soft">
      {shipped === null ? (
        'No value is shipped.'
      ) : (
        <>
          Shipped:{' '}
          <span className="whitespace-nowrap text-ink tabular-nums">
            {valueText(shipped.value, unit)} {unit}
          </span>
          , {shipped.source} ({statusWord(shipped.status)}).
        </>
      )}
    </p>
  );
}

/** The workspace's own value and where it comes from. */
export function ValueForm(props: ValueFormProps): JSX.Element {
  const { of, shipped, initial, onSave, onCancel, onRestore, isBusy, error, before } = props;
  const [text, setText] = useState(initial === null ? '' : valueText(initial.value));
  const [note, setNote] = useState(initial?.note ?? '');
  const [isTried, setTried] = useState(false);
  const value = readValue(text);
  const fault = faultOf(of, value);
  const save = (event: FormEvent): void => {
    event.preventDefault();
    setTried(true);
    if (fault === null && of !== null) {
      onSave({ value, note: note.trim() });
    }
  };
  return (
    <form noValidate className="grid gap-4" onSubmit={save}>
      {before?.(isTried)}
      {of !== null && <ShippedLine shipped={shipped} unit={of.facts.unit} />}
      <TextField
        label="Our value"
        inputMode="decimal"
        autoComplete="off"
        data-autofocus={before === undefined ? true : undefined}
        suffix={of?.facts.unit}
        value={text}
        onChange={(event) => setText(event.target.value)}
        error={isTried ? fault : null}
      />
      <TextField
        label="Where it comes from"
        maxLength={300}
        value={note}
        onChange={(event) => setNote(event.target.value)}
        hint="Paper, handbook, own measurement. Shown wherever the value is used."
      />
      <InlineError error={error === null ? undefined : messageOf(error)} />
      <div className="mt-2 flex flex-wrap justify-end gap-2">
        {onRestore !== undefined && (
          <Button className="mr-auto max-sm:w-full" onClick={onRestore} disabled={isBusy}>
            {shipped === null ? 'Take ours away' : 'Back to the shipped value'}
          </Button>
        )}
        <Button onClick={onCancel}>Cancel</Button>
        <Button type="submit" variant="primary" isBusy={isBusy}>
          Save
        </Button>
      </div>
    </form>
  );
}
