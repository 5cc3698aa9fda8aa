import { useDeferredValue, useState } from 'react';
import { can } from '#shared/access/roles';
import type { OwnTeam } from '#shared/api/accounts';
import type { ListedSheet } from '#shared/api/sheets';
import { useSheets } from '../../api/sheets';
import { Button } from '../../ui/button';
import { Empty, Failure } from '../../ui/notice';
import { Waiting } from '../../ui/waiting';
import { OrderSelect, SheetList } from './sheet-list';
import { answersTo, LAST_CHANGED_FIRST } from './sheet-order';
import { useSheetActions } from './use-sheet-actions';

interface TeamSheetsProps {
  readonly team: OwnTeam;
  readonly onBegin: () => void;
}

/** The team's sheets, to be sought and ordered; the archived ones folded away under them. */
export function TeamSheets({ team, onBegin }: TeamSheetsProps) {
  const sheets = useSheets(team.id);
  if (sheets.isPending) return <Waiting>Fetching the sheets</Waiting>;
  return (
    <>
      {sheets.isError && (
        <div className="mb-4">
          <Failure onRetry={() => sheets.refetch()}>The sheets could not be fetched. {sheets.error.message}</Failure>
        </div>
      )}
      {sheets.data?.length === 0 && <NoSheet mayBegin={can(team.role, 'edit-sheet')} onBegin={onBegin} />}
      {sheets.data && sheets.data.length > 0 && <FoundSheets team={team} sheets={sheets.data} onBegin={onBegin} />}
    </>
  );
}

function NoSheet({ mayBegin, onBegin }: { readonly mayBegin: boolean; readonly onBegin: () => void }) {
  return mayBegin ? (
    <Empty title="No sheet yet">
      <p>
        A sheet holds one drawing that the whole team sees live. Begin with a blank one, a ready-drawn stage or a
        circuit file.
      </p>
      <Button look="strong" className="max-lg:hidden" onClick={onBegin}>
        New sheet
      </Button>
    </Empty>
  ) : (
    <Empty title="No sheet yet">
      <p>Sheets that a designer of the team begins appear here.</p>
    </Empty>
  );
}

function FoundSheets({ team, sheets, onBegin }: TeamSheetsProps & { readonly sheets: readonly ListedSheet[] }) {
  const [sought, setSought] = useState('');
  const [order, setOrder] = useState(LAST_CHANGED_FIRST);
  const actions = useSheetActions(team);
  const seeking = useDeferredValue(sought.trim());
  const found = seeking === '' ? sheets : sheets.filter((sheet) => answersTo(sheet, seeking));
  const live = found.filter((sheet) => !sheet.archived);
  const archived = found.filter((sheet) => sheet.archived);
  const list = { order, onOrder: setOrder };
  return (
    <>
      <div className="mb-2 flex gap-3">
        <input
          type="search"
          aria-label="Find a sheet"
          placeholder="Name or author"
          autoComplete="off"
          className="h-9 w-full min-w-0 border border-edge bg-sheet px-2.5 sm:max-w-72"
          value={sought}
          onChange={(event) => setSought(event.target.value)}
        />
        <OrderSelect {...list} />
      </div>
      <p role="status" className="sr-only">
        {seeking === '' ? '' : `${found.length} found`}
      </p>
      {live.length > 0 && <SheetList label="Sheets" sheets={live} actions={actions.live} {...list} />}
      {live.length === 0 && seeking === '' && <NoSheet mayBegin={can(team.role, 'edit-sheet')} onBegin={onBegin} />}
      {found.length === 0 && (
        <Empty title={`Nothing found for “${seeking}”`}>
          <p>No sheet of {team.name} has that in its name, its state or the name of whoever began it.</p>
          <Button onClick={() => setSought('')}>Show all sheets</Button>
        </Empty>
      )}
      {archived.length > 0 && (
        // What is sought may be among the archived ones, so they come out then.
        <details className="mt-8" open={seeking !== '' || undefined}>
          <summary className="cursor-pointer py-1 text-faint">{archived.length} archived</summary>
          <SheetList label="Archived sheets" sheets={archived} actions={actions.archived} {...list} />
        </details>
      )}
    </>
  );
}
