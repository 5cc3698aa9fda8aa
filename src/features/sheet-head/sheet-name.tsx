import { useEffect, useRef, useState } from 'react';
import { useChangeSheet } from '../../api/sheets';
import { PageTitle } from '../../ui/page-title';

/** The sheet's name; whoever may edit the sheet changes it in place. */
export function SheetName({ sheetId, name, editable }: { sheetId: string; name: string; editable: boolean }) {
  const [draft, setDraft] = useState<string>();
  const change = useChangeSheet();
  const field = useRef<HTMLInputElement>(null);
  const editing = draft !== undefined;
  useEffect(() => {
    if (editing) field.current?.select();
  }, [editing]);

  const commit = () => {
    const wanted = draft?.trim();
    if (wanted === undefined || wanted === name) {
      setDraft(undefined);
      return;
    }
    change.mutate({ sheetId, name: wanted }, { onSuccess: () => setDraft(undefined) });
  };

  if (!editing) {
    return (
      <div className="flex min-w-0 items-center gap-2">
        <PageTitle className="truncate text-xl">{name}</PageTitle>
        {editable && (
          <button
            type="button"
            className="min-h-6 px-1 text-xs text-faint underline decoration-edge underline-offset-4 hover:text-ink"
            onClick={() => setDraft(name)}
          >
            rename
          </button>
        )}
      </div>
    );
  }
  return (
    <form
      className="min-w-0"
      onSubmit={(event) => {
        event.preventDefault();
        commit();
      }}
    >
      <input
        ref={field}
        aria-label="Name of the sheet"
        aria-invalid={change.isError}
        aria-describedby={change.isError ? 'sheet-name-error' : undefined}
        className="h-9 w-72 max-w-full border-b border-edge bg-transparent text-xl aria-invalid:border-missed"
        value={draft}
        maxLength={200}
        onChange={(event) => setDraft(event.target.value)}
        onBlur={commit}
        onKeyDown={(event) => {
          if (event.key === 'Escape') setDraft(undefined);
        }}
      />
      {change.isError && (
        <p id="sheet-name-error" role="alert" className="text-xs text-missed">
          {change.error.message}
        </p>
      )}
    </form>
  );
}
