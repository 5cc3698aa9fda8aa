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
  const left: string[] = [];
  let placed = false;
  for (const [name, message] of Object.entries(error.fields)) {
    const field = fields.find((one) => one === name);
    if (field === undefined) {
      left.push(message);
      continue;
    }
    setError(field, { type: 'server', message }, { shouldFocus: !placed });
    placed = true;
  }
  return placed && left.length === 0 ? null : [error.message, ...left].join(' ');
}
