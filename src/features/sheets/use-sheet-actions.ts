import { can } from '#shared/access/roles';
import type { OwnTeam } from '#shared/api/accounts';
import type { ListedSheet } from '#shared/api/sheets';
import { useChangeSheet, useCreateSheet } from '../../api/sheets';
import { useStatus } from '../../ui/status';
import type { SheetActions } from './sheet-row';

const LONGEST_NAME = 80;
const OF_COPY = ', copy';

/** What this role may do with sheets from the list; each says what became of it. */
export function useSheetActions(team: OwnTeam): { live: SheetActions; archived: SheetActions } {
  const change = useChangeSheet();
  const create = useCreateSheet(team.id);
  const { say, warn } = useStatus();
  const edits = can(team.role, 'edit-sheet');
  const archives = can(team.role, 'archive-sheet');

  const copy = (sheet: ListedSheet) => {
    const name = [...sheet.name].slice(0, LONGEST_NAME - OF_COPY.length).join('') + OF_COPY;
    create.mutate(
      { name, copyOf: sheet.id },
      {
        onSuccess: () => say(`“${name}” is in the list.`),
        onError: (error) => warn(`“${sheet.name}” could not be copied. ${error.message}`),
      },
    );
  };
  const setArchived = (archived: boolean) => (sheet: ListedSheet) =>
    change.mutate(
      { sheetId: sheet.id, archived },
      {
        onSuccess: () =>
          say(archived ? `“${sheet.name}” is archived, under the list.` : `“${sheet.name}” is back in the list.`),
        onError: (error) =>
          warn(`“${sheet.name}” could not be ${archived ? 'archived' : 'brought back'}. ${error.message}`),
      },
    );

  const both = { rename: edits, copy: edits ? copy : undefined };
  return {
    live: { ...both, archive: archives ? setArchived(true) : undefined, bringBack: undefined },
    archived: { ...both, rename: false, archive: undefined, bringBack: archives ? setArchived(false) : undefined },
  };
}
