import { type InputHTMLAttributes, type ReactNode, type Ref, type SelectHTMLAttributes, useId } from 'react';
import { Select } from './select';

interface FieldNotes {
  readonly label: string;
  /** What is wrong with the value, and what to do. */
  readonly error?: string | undefined;
  readonly hint?: string | undefined;
}

const BOX = 'h-9 w-full min-w-0 border border-edge bg-sheet px-2.5 aria-invalid:border-missed read-only:bg-paper';

interface TextFieldProps extends InputHTMLAttributes<HTMLInputElement>, FieldNotes {
  readonly ref?: Ref<HTMLInputElement>;
  /** A control that belongs to the field, at its right end. */
  readonly after?: ReactNode;
}

export function TextField({ label, error, hint, after, className = '', ...input }: TextFieldProps) {
  const id = useId();
  return (
    <div className={className}>
      <FieldLabel id={id} label={label} />
      <div className="flex gap-2">
        <input
          {...input}
          id={id}
          className={BOX}
          aria-invalid={error !== undefined}
          {...describedBy(id, error, hint)}
        />
        {after}
      </div>
      <FieldNotesBelow id={id} error={error} hint={hint} />
    </div>
  );
}

interface SelectFieldProps extends SelectHTMLAttributes<HTMLSelectElement>, FieldNotes {
  readonly ref?: Ref<HTMLSelectElement>;
}

export function SelectField({ label, error, hint, className = '', children, ...select }: SelectFieldProps) {
  const id = useId();
  return (
    <div className={className}>
      <FieldLabel id={id} label={label} />
      <Select
        {...select}
        id={id}
        className="h-9 w-full"
        aria-invalid={error !== undefined}
        {...describedBy(id, error, hint)}
      >
        {children}
      </Select>
      <FieldNotesBelow id={id} error={error} hint={hint} />
    </div>
  );
}

function FieldLabel({ id, label }: { readonly id: string; readonly label: string }) {
  return (
    <label htmlFor={id} className="mb-1 block text-xs text-faint">
      {label}
    </label>
  );
}

function FieldNotesBelow({ id, error, hint }: Omit<FieldNotes, 'label'> & { readonly id: string }) {
  return (
    <>
      {hint !== undefined && (
        <p id={`${id}-hint`} className="mt-1 text-xs text-faint">
          {hint}
        </p>
      )}
      {error !== undefined && (
        <p id={`${id}-error`} className="mt-1 text-xs text-missed">
          {error}
        </p>
      )}
    </>
  );
}

function describedBy(id: string, error: string | undefined, hint: string | undefined) {
  const ids = [error === undefined ? '' : `${id}-error`, hint === undefined ? '' : `${id}-hint`].filter(Boolean);
  return ids.length === 0 ? {} : { 'aria-describedby': ids.join(' ') };
}
