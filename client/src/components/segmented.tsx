import { Radio, RadioGroup } from '@headlessui/react';
import type { JSX, ReactNode } from 'react';

import { classNames } from '#client/lib/class-names.ts';

interface SegmentedProps<Value extends string> {
  label: string;
  options: readonly { value: Value; label: ReactNode; title?: string; isDisabled?: boolean }[];
  value: Value;
  onChange: (value: Value) => void;
  disabled?: boolean;
  className?: string;
}

/** A few choices side by side, one taken. */
export function Segmented<Value extends string>({
  label,
  options,
  value,
  onChange,
  disabled = false,
  className,
}: SegmentedProps<Value>): JSX.Element {
  return (
    <RadioGroup
      aria-label={label}
      value={value}
      onChange={onChange}
      disabled={disabled}
      className={classNames(
        'inline-flex divide-x divide-line rounded-control border border-line bg-raised text-small',
        className,
      )}
    >
      {options.map((option) => (
        <Radio
          key={option.value}
          value={option.value}
          disabled={option.isDisabled ?? false}
          title={option.title}
          className="cursor-pointer px-2.5 py-1 whitespace-nowrap text-soft first:rounded-l-control last:rounded-r-control hover:text-ink data-checked:bg-wash data-checked:font-medium data-checked:text-ink data-disabled:cursor-not-allowed data-disabled:opacity-55"
        >
          {option.label}
        </Radio>
      ))}
    </RadioGroup>
  );
}
