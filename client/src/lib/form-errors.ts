import type { FieldValues, Path, UseFormSetError } from 'react-hook-form';

import { ApiError, messageOf } from '#client/lib/api-error.ts';

/**
 * Puts a failed request's fields beside the form's fields; what belongs to no field becomes the
 * form's own error (`errors.root.server`).
 *
 * @param byCode fields that an error code belongs to when the answer names none
 */
export function showFormError<Values extends FieldValues>(
  error: unknown,
  setError: UseFormSetError<Values>,
  fields: readonly Path<Values>[],
  byCode: Partial<Record<string, Path<Values>>> = {},
): void {
  const known = error instanceof ApiError ? error.fields : [];
  let isPlaced = false;
  for (const problem of known) {
    const field = fields.find((one) => one === problem.field);
    if (field !== undefined) {
      setError(field, { message: problem.message });
      isPlaced = true;
    }
  }
  const codeField = error instanceof ApiError ? byCode[error.code] : undefined;
  if (!isPlaced && codeField !== undefined) {
    setError(codeField, { message: messageOf(error) });
    isPlaced = true;
  }
  if (!isPlaced) {
    setError('root.server', { message: messageOf(error) });
  }
}
