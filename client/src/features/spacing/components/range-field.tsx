import { useState, type JSX, type ReactNode } from 'react';

import type { ValueRange } from '#common/schemas/energetics';
import { TextField } from '#client/components/text-field.tsx';
import {
  readRange,
  writeRange,
  type RangeLimits,
} from '#client/features/spacing/model/range-text.ts';

interface RangeFieldProps {
  label: string;
  limits: RangeLimits;
  value: ValueRange | null;
  /** Null clears the field, where that is allowed. */
  onChange: ((value: ValueRange | null) => void) | null;
  isOptional?: boolean;
  hint?: ReactNode;
  className?: string;
}

/** A number or a range; takes effect as soon as it can be read, says beside it why it can't. */
export function RangeField({
  label,
  limits,
  value,
  onChange,
  isOptional = false,
  hint,
  className,
}: RangeFieldProps): JSX.Element {
  const shown = value === null ? '' : writeRange(value);
  const [typed, setTyped] = useState<{ text: string; for: string } | null>(null);
  // A value that came from elsewhere (undo, a colleague) replaces what was typed.
  const text = typed !== null && typed.for === shown ? typed.text : shown;
  const isEmpty = text.trim() === '';
  const read = isEmpty ? null : readRange(text, limits);
  const missing = isEmpty && !isOptional ? `Write ${limits.name}.` : null;
  const error = read === null ? missing : read.ok ? null : read.message;

  const take = (next: string): void => {
    const parsed = next.trim() === '' ? null : readRange(next, limits);
    if (parsed === null ? isOptional : parsed.ok) {
      const range = parsed !== null && parsed.ok ? parsed.range : null;
      setTyped({ text: next, for: range === null ? '' : writeRange(range) });
      onChange?.(range);
    } else {
      setTyped({ text: next, for: shown });
    }
  };
  return (
    <TextField
      label={label}
      value={text}
      error={error}
      hint={hint}
      suffix={limits.unit}
      readOnly={onChange === null}
      inputMode="decimal"
      autoComplete="off"
      onChange={(event) => take(event.target.value)}
      className={className ?? ''}
    />
  );
}
