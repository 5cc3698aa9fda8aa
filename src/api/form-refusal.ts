import type { FieldValues, Path, UseFormSetError } from 'react-hook-form';
import { ApiError } from './client';

/**
 * Puts what the server said of each field beside that field of the form and returns what is left to say of the form
 * as a whole, or null.
 */
export function refuseForm<Values extends FieldValues>(
  error: unknown,
  fields: readonly Path<Values>[],
  setError: UseFormSetError<Values>,
): string | null {
  if (!(error instanceof ApiError)) throw error;
  let placed = false;
  for (const field of fields) {
    const message = error.fields[field];
    if (message === undefined) continue;
    setError(field, { type: 'server', message }, { shouldFocus: !placed });
    placed = true;
  }
  const elsewhere = Object.keys(error.fields).some((name) => !fields.some((field) => field === name));
  return placed && !elsewhere ? null : error.message;
}
