import { Description, Field, Label, Switch } from '@headlessui/react';
import type { JSX, ReactNode } from 'react';

interface SwitchFieldProps {
  label: string;
  hint?: ReactNode;
  isOn: boolean;
  onChange: (isOn: boolean) => void;
  disabled?: boolean;
}

/** Something that is on or off, and takes effect at once. */
export function SwitchField({
  label,
  hint,
  isOn,
  onChange,
  disabled = false,
}: SwitchFieldProps): JSX.Element {
  return (
    <Field disabled={disabled} className="flex items-start justify-between gap-6">
      <span>
        <Label className="block font-medium">{label}</Label>
        {hint !== undefined && (
          <Description className="mt-0.5 text-small text-soft">{hint}</Description>
        )}
      </span>
      <Switch
        checked={isOn}
        onChange={onChange}
        className="group mt-0.5 inline-flex h-6 w-10 shrink-0 items-center rounded-full border border-faint bg-raised p-0.5 transition-colors duration-100 data-checked:border-ink data-checked:bg-ink data-disabled:opacity-55"
      >
        <span className="size-4.5 rounded-full bg-soft transition-transform duration-100 group-data-checked:translate-x-4 group-data-checked:bg-paper" />
      </Switch>
    </Field>
  );
}
