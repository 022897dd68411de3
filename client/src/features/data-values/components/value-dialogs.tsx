import { useState, type JSX } from 'react';

import { shippedValue } from '#common/chemistry/data-catalogue';
import { dataKinds, readDataKey, type DataKind } from '#common/chemistry/data-key';
import type { OwnDataValue } from '#common/schemas/data-values';
import { Dialog } from '#client/components/dialog.tsx';
import { SelectField } from '#client/components/select-field.tsx';
import { TextField } from '#client/components/text-field.tsx';
import { ValueForm } from '#client/features/data-values/components/value-form.tsx';
import { useDataValueChanges } from '#client/features/data-values/hooks/use-data-value-changes.ts';
import type { DataRow } from '#client/features/data-values/model/data-rows.ts';
import { subjectText } from '#client/features/data-values/model/subject.ts';

interface DialogProps {
  workspace: string;
  onClose: () => void;
}

/** Puts, changes or takes back the workspace's own value of one row. */
export function EditValueDialog({
  workspace,
  row,
  onClose,
}: DialogProps & { row: DataRow }): JSX.Element {
  const { set, restore, isBusy, error } = useDataValueChanges(workspace);
  const { key, own } = row;
  return (
    <Dialog open onClose={onClose} title={`${row.facts.name}: ${subjectText(row)}`}>
      <ValueForm
        of={row}
        shipped={row.shipped}
        initial={own}
        isBusy={isBusy}
        error={error}
        onCancel={onClose}
        onSave={(typed) => set({ key, ...typed }, own, onClose)}
        onRestore={own === null ? undefined : () => restore(own, onClose)}
      />
    </Dialog>
  );
}

const kindOptions = dataKinds.map(({ kind, name }) => ({ value: kind, label: name }));

function subjectFault(subject: string, isKnown: boolean, isTried: boolean): string | null {
  if (subject.trim() === '') {
    return isTried ? 'Say which element or ion.' : null;
  }
  return isKnown ? null : 'There is no such element or ion in this form.';
}

/** Gives a value to a quantity that the tables lack. */
export function AddValueDialog({
  workspace,
  own,
  onClose,
}: DialogProps & { own: readonly OwnDataValue[] }): JSX.Element {
  const { set, isBusy, error } = useDataValueChanges(workspace);
  const [kind, setKind] = useState<DataKind>('born-exponent');
  const [subject, setSubject] = useState('');
  const key = `${kind}:${subject.trim()}`;
  const read = readDataKey(key);
  const example = dataKinds.find((facts) => facts.kind === kind)?.example ?? '';
  const earlier = own.find((value) => value.key === key) ?? null;
  return (
    <Dialog open onClose={onClose} title="Add a value">
      <ValueForm
        of={read}
        shipped={shippedValue(key)}
        initial={null}
        isBusy={isBusy}
        error={error}
        onCancel={onClose}
        onSave={(typed) => set({ key, ...typed }, earlier, onClose)}
        before={(isTried) => (
          <>
            <SelectField label="Quantity" options={kindOptions} value={kind} onChange={setKind} />
            <TextField
              label="Of what"
              data-autofocus
              autoComplete="off"
              value={subject}
              onChange={(event) => setSubject(event.target.value)}
              hint={`Written as in ${example.slice(kind.length + 1)}`}
              error={subjectFault(subject, read !== null, isTried)}
            />
          </>
        )}
      />
    </Dialog>
  );
}
