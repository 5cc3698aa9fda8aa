import { useEffect, useRef, useState } from 'react';
import { nameField } from '#shared/api/fields';
import type { Sheet } from '#shared/api/sheets';
import { useChangeSheet } from '../../api/sheets';
import { TextField } from '../../ui/field';

interface RenameFieldProps {
  readonly sheet: Sheet;
  /** The name was changed or left as it was; `byKey` when the focus is still here. */
  readonly onDone: (byKey: boolean) => void;
}

/** A sheet's name in its row, to be typed anew: Enter or leaving it keeps it, Escape leaves the name as it was. */
export function RenameField({ sheet, onDone }: RenameFieldProps) {
  const [draft, setDraft] = useState(sheet.name);
  const [reason, setReason] = useState<string>();
  const change = useChangeSheet();
  const field = useRef<HTMLInputElement>(null);
  useEffect(() => field.current?.select(), []);

  const commit = (byKey: boolean) => {
    if (change.isPending) return;
    const read = nameField.safeParse(draft);
    if (!read.success) {
      setReason(read.error.issues[0]?.message ?? 'Give another name.');
      return;
    }
    if (read.data === sheet.name) {
      onDone(byKey);
      return;
    }
    change.mutate(
      { sheetId: sheet.id, name: read.data },
      { onSuccess: () => onDone(byKey), onError: (error) => setReason(error.message) },
    );
  };

  return (
    <form
      noValidate
      className="pb-1"
      onSubmit={(event) => {
        event.preventDefault();
        commit(true);
      }}
    >
      <TextField
        label="New name"
        ref={field}
        autoComplete="off"
        value={draft}
        error={reason}
        onChange={(event) => {
          setDraft(event.target.value);
          setReason(undefined);
        }}
        onBlur={() => commit(false)}
        onKeyDown={(event) => {
          if (event.key === 'Escape') onDone(true);
        }}
      />
    </form>
  );
}
