import { type KeyboardEvent, type Ref, useId, useState } from 'react';

export type Read<T> = { ok: true; value: T } | { ok: false; reason: string };
export type Committed = { ok: true } | { ok: false; reason: string };

/**
 * A field for one value that people write in their own way. Enter or leaving it commits, Escape restores. Text that cannot be
 * read, or that is refused, stays with the reason under it, and the last good value is kept. A value that changes elsewhere
 * shows at once unless this field is being edited.
 */
export function ValueField<T>({
  label,
  hideLabel = false,
  value,
  show,
  read,
  onCommit,
  disabled = false,
  className = '',
  inputRef,
}: {
  label: string;
  /** For a field whose place says what it is; the label is still read out. */
  hideLabel?: boolean;
  value: T;
  show: (value: T) => string;
  read: (text: string) => Read<T>;
  /** May refuse a value that was read, with the reason. */
  onCommit: ((value: T) => void) | ((value: T) => Committed);
  disabled?: boolean;
  /** Set on the input. */
  className?: string;
  inputRef?: Ref<HTMLInputElement>;
}) {
  const id = useId();
  const [draft, setDraft] = useState<string>();
  const [reason, setReason] = useState<string>();

  const restore = () => {
    setDraft(undefined);
    setReason(undefined);
  };
  const commit = () => {
    if (draft === undefined) return;
    if (draft === show(value)) return restore();
    const reading = read(draft);
    if (!reading.ok) return setReason(reading.reason);
    const answer = onCommit(reading.value);
    if (answer && !answer.ok) return setReason(answer.reason);
    restore();
  };
  const change = (text: string) => {
    setDraft(text);
    // The reason goes as soon as it no longer holds, but never comes up in the middle of a word.
    if (reason !== undefined && read(text).ok) setReason(undefined);
  };
  const press = (event: KeyboardEvent) => {
    if (event.key === 'Enter') commit();
    if (event.key === 'Escape' && draft !== undefined) {
      // The first Escape takes the typing back; only the next one is for whatever the field stands in.
      event.stopPropagation();
      restore();
    }
  };

  return (
    <>
      <label htmlFor={id} className={hideLabel ? 'sr-only' : 'text-faint'}>
        {label}
      </label>
      <span className="min-w-0">
        <input
          ref={inputRef}
          id={id}
          type="text"
          autoComplete="off"
          autoCapitalize="off"
          spellCheck={false}
          disabled={disabled}
          value={draft ?? show(value)}
          aria-invalid={reason !== undefined}
          aria-describedby={reason === undefined ? undefined : `${id}-reason`}
          className={`w-full border-b bg-transparent outline-none focus:border-focus focus:shadow-[0_1px_var(--focus)] ${
            reason === undefined ? 'border-edge' : 'border-missed'
          } ${className}`}
          onChange={(event) => change(event.target.value)}
          onFocus={(event) => event.target.select()}
          onBlur={commit}
          onKeyDown={press}
        />
        {reason !== undefined && (
          <span id={`${id}-reason`} role="alert" className="block pt-1 text-missed text-xs">
            {reason}
          </span>
        )}
      </span>
    </>
  );
}
