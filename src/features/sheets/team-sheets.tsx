import { can } from '#shared/access/roles';
import type { OwnTeam } from '#shared/api/accounts';
import type { Sheet } from '#shared/api/sheets';
import { useChangeSheet, useSheets } from '../../api/sheets';
import { Button } from '../../ui/button';
import { Empty, Failure } from '../../ui/notice';
import { useStatus } from '../../ui/status';
import { Waiting } from '../../ui/waiting';
import { RowAction, SheetList } from './sheet-list';

interface TeamSheetsProps {
  readonly team: OwnTeam;
  readonly onBegin: () => void;
}

/** The team's sheets, last changed first; the archived ones folded away under them. */
export function TeamSheets({ team, onBegin }: TeamSheetsProps) {
  const sheets = useSheets(team.id);
  const change = useChangeSheet();
  const { say, warn } = useStatus();
  if (sheets.isPending) return <Waiting>Fetching the sheets</Waiting>;
  if (sheets.isError) {
    return <Failure onRetry={() => sheets.refetch()}>The sheets could not be fetched. {sheets.error.message}</Failure>;
  }

  const archive = (sheet: Sheet, archived: boolean) =>
    change.mutate(
      { sheetId: sheet.id, archived },
      {
        onSuccess: () =>
          say(archived ? `“${sheet.name}” is archived, under the list.` : `“${sheet.name}” is back in the list.`),
        onError: (error) =>
          warn(`“${sheet.name}” could not be ${archived ? 'archived' : 'brought back'}. ${error.message}`),
      },
    );
  const action = (text: string, archived: boolean) =>
    can(team.role, 'archive-sheet')
      ? (sheet: Sheet) => (
          <RowAction
            sheet={sheet}
            text={text}
            busy={change.isPending && change.variables.sheetId === sheet.id}
            onClick={() => archive(sheet, archived)}
          />
        )
      : null;

  const live = sheets.data.filter((sheet) => !sheet.archived);
  const archived = sheets.data.filter((sheet) => sheet.archived);
  return (
    <>
      {live.length > 0 ? (
        <SheetList label="Sheets" sheets={live} action={action('Archive', true)} />
      ) : can(team.role, 'edit-sheet') ? (
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
      )}
      {archived.length > 0 && (
        <details className="mt-8">
          <summary className="cursor-pointer py-1 text-faint">{archived.length} archived</summary>
          <SheetList label="Archived sheets" sheets={archived} action={action('Bring back', false)} />
        </details>
      )}
    </>
  );
}
