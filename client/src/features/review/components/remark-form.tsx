import { zodResolver } from '@hookform/resolvers/zod';
import type { JSX } from 'react';
import { useForm } from 'react-hook-form';

import { replyRequest } from '#common/schemas/review';
import { Button } from '#client/components/button.tsx';
import { InlineError } from '#client/components/error-state.tsx';
import { TextAreaField } from '#client/components/text-area-field.tsx';

interface RemarkFormProps {
  label: string;
  submitLabel: string;
  placeholder?: string;
  /** Settles when the text is saved; the field is then emptied. */
  onSubmit: (text: string) => Promise<unknown>;
  error: unknown;
  onCancel?: () => void;
}

/** A text and a button; Ctrl+Return sends it. */
export function RemarkForm(props: RemarkFormProps): JSX.Element {
  const form = useForm({ resolver: zodResolver(replyRequest), defaultValues: { text: '' } });
  const { errors, isSubmitting } = form.formState;
  const send = form.handleSubmit(async ({ text }) => {
    try {
      await props.onSubmit(text);
      form.reset();
    } catch {
      // The failure is shown below by the owner's `error`; the text stays.
    }
  });
  return (
    <form onSubmit={(event) => void send(event)} className="grid gap-2">
      <TextAreaField
        label={props.label}
        rows={2}
        placeholder={props.placeholder}
        error={errors.text?.message ?? null}
        {...form.register('text')}
        onKeyDown={(event) => {
          if (event.key === 'Enter' && (event.ctrlKey || event.metaKey)) {
            void send(event);
          }
        }}
      />
      <InlineError error={props.error} />
      <div className="flex gap-2">
        <Button type="submit" size="small" isBusy={isSubmitting}>
          {props.submitLabel}
        </Button>
        {props.onCancel !== undefined && (
          <Button size="small" variant="quiet" onClick={props.onCancel}>
            Cancel
          </Button>
        )}
      </div>
    </form>
  );
}
