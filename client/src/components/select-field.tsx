import { Listbox, ListboxButton, ListboxOption, ListboxOptions } from '@headlessui/react';
import { Check, ChevronDown } from 'lucide-react';
import { useId, type JSX, type ReactNode } from 'react';

import { describedBy, FieldFrame, fieldLook } from '#client/components/field-frame.tsx';
import { classNames } from '#client/lib/class-names.ts';

export interface SelectOption<Value extends string> {
  value: Value;
  label: string;
  /** A second line in the list. */
  hint?: string;
  isDisabled?: boolean;
}

interface SelectFieldProps<Value extends string> {
  label: string;
  isLabelHidden?: boolean;
  options: readonly SelectOption<Value>[];
  value: Value;
  onChange: (value: Value) => void;
  error?: string | null;
  hint?: ReactNode;
  disabled?: boolean;
  className?: string;
}

function Option<Value extends string>({ option }: { option: SelectOption<Value> }): JSX.Element {
  return (
    <ListboxOption
      value={option.value}
      disabled={option.isDisabled ?? false}
      className="group flex cursor-pointer items-start gap-2 rounded-control px-2 py-1.5 data-disabled:opacity-55 data-focus:bg-wash"
    >
      <Check aria-hidden className="invisible mt-0.5 size-4 shrink-0 group-data-selected:visible" />
      <span>
        <span className="block group-data-selected:font-medium">{option.label}</span>
        {option.hint !== undefined && (
          <span className="block text-small text-soft">{option.hint}</span>
        )}
      </span>
    </ListboxOption>
  );
}

/** One of a few named choices. */
export function SelectField<Value extends string>({
  label,
  isLabelHidden = false,
  options,
  value,
  onChange,
  error,
  hint,
  disabled = false,
  className,
}: SelectFieldProps<Value>): JSX.Element {
  const id = useId();
  const current = options.find((option) => option.value === value);
  return (
    <Listbox value={value} onChange={onChange} disabled={disabled}>
      <FieldFrame {...{ id, label, isLabelHidden, error, hint, className }}>
        <ListboxButton
          id={id}
          aria-label={`${label}: ${current?.label ?? 'none'}`}
          aria-invalid={error ? true : undefined}
          aria-describedby={describedBy(id, error, hint)}
          className={classNames(
            fieldLook,
            'flex h-9 items-center justify-between gap-2 px-3 text-left',
          )}
        >
          <span className="truncate">{current?.label}</span>
          <ChevronDown aria-hidden className="size-4 shrink-0 text-soft" />
        </ListboxButton>
      </FieldFrame>
      <ListboxOptions
        modal={false}
        anchor={{ to: 'bottom start', gap: 4, padding: 8 }}
        className="z-50 w-max max-w-80 min-w-(--button-width) rounded-control border border-line bg-raised p-1 shadow-sheet focus:outline-none"
      >
        {options.map((option) => (
          <Option key={option.value} option={option} />
        ))}
      </ListboxOptions>
    </Listbox>
  );
}
