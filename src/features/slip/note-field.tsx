import { type KeyboardEvent, type RefObject, useState } from 'react';
import { type DrawnPart, LONGEST_NOTE } from '#shared/circuit/drawing';
import type { SheetCommands } from '../../live/sheet-commands';
import { EditedValue } from './editing';

type Note = Extract<DrawnPart, { kind: 'note' }>;

/** A note's text. Leaving the field keeps what was written; Escape takes it back. */
export function NoteField({
  part,
  commands,
  firstField,
}: {
  part: Note;
  commands: SheetCommands;
  firstField: RefObject<HTMLElement | null>;
}) {
  const [draft, setDraft] = useState<string>();
  const { text } = part.values;
  if (!commands.canEdit) return <p className="col-span-3 whitespace-pre-wrap">{text}</p>;
  const commit = () => {
    if (draft !== undefined && draft !== text) commands.setValue(part, 'text', draft);
    setDraft(undefined);
  };
  const press = (event: KeyboardEvent) => {
    if (event.key !== 'Escape' || draft === undefined || draft === text) return;
    event.stopPropagation();
    setDraft(undefined);
  };
  return (
    <EditedValue name="text">
      <textarea
        ref={(element) => {
          firstField.current = element;
        }}
        aria-label="text of the note"
        rows={6}
        maxLength={LONGEST_NOTE}
        className="col-span-2 w-full resize-none border border-edge bg-transparent p-1.5 outline-none focus:border-focus"
        value={draft ?? text}
        onChange={(event) => setDraft(event.target.value)}
        onFocus={(event) => event.target.select()}
        onBlur={commit}
        onKeyDown={press}
      />
    </EditedValue>
  );
}
