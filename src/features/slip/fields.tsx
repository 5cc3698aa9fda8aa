import { type ReactNode, type Ref, useId } from 'react';
import { type Committed, type Read, ValueField } from '../../ui/value-field';
import { EditedValue } from './editing';

/** What a value is called, the value, and over its end who else is at it. */
export function FieldGrid({ children }: { children: ReactNode }) {
  return <div className="grid grid-cols-[4.75rem_minmax(0,1fr)_0] items-baseline gap-y-1.5">{children}</div>;
}

/** A value to be typed, or for those who only look, its text. */
export function TypedField<T>({
  name,
  label,
  value,
  show,
  canEdit,
  ...rest
}: {
  /** Of the value in the part. */
  name: string;
  label: string;
  value: T;
  show: (value: T) => string;
  read: (text: string) => Read<T>;
  onCommit: ((value: T) => void) | ((value: T) => Committed);
  canEdit: boolean;
  inputRef?: Ref<HTMLInputElement>;
}) {
  if (!canEdit) return <ShownValue label={label}>{show(value)}</ShownValue>;
  return (
    <EditedValue name={name}>
      <ValueField label={label} value={value} show={show} {...rest} />
    </EditedValue>
  );
}

/** A value chosen from a few. An empty value stands for none. */
export function ChosenField({
  name,
  label,
  value,
  options,
  onChoose,
  canEdit,
  note,
}: {
  /** Of the value in the part. */
  name: string;
  label: string;
  value: string;
  options: readonly { readonly value: string; readonly text: string }[];
  onChoose: (value: string) => void;
  canEdit: boolean;
  /** A remark on the present choice. */
  note?: string | undefined;
}) {
  const id = useId();
  const text = options.find((option) => option.value === value)?.text ?? value;
  if (!canEdit) return <ShownValue label={label}>{note === undefined ? text : `${text}, ${note}`}</ShownValue>;
  return (
    <EditedValue name={name}>
      <label htmlFor={id} className="text-faint">
        {label}
      </label>
      <span>
        <select
          id={id}
          value={value}
          aria-describedby={note === undefined ? undefined : `${id}-note`}
          className="-ml-1 w-[calc(100%+0.25rem)] border-edge border-b bg-sheet outline-none focus:border-focus focus:shadow-[0_1px_var(--focus)]"
          onChange={(event) => onChoose(event.target.value)}
        >
          {options.map((option) => (
            <option key={option.value} value={option.value}>
              {option.text}
            </option>
          ))}
        </select>
        {note !== undefined && (
          <span id={`${id}-note`} className="block pt-0.5 text-faint">
            {note}
          </span>
        )}
      </span>
    </EditedValue>
  );
}

export function ShownValue({ label, children }: { label: string; children: ReactNode }) {
  return (
    <>
      <span className="text-faint">{label}</span>
      <span className="col-span-2">{children}</span>
    </>
  );
}
