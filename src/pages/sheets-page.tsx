import { lazy, Suspense, useState } from 'react';
import { can } from '#shared/access/roles';
import type { OwnTeam } from '#shared/api/accounts';
import { BeginSheet } from '../features/sheets/begin-sheet';
import type { Beginning } from '../features/sheets/beginning';
import { TeamSheets } from '../features/sheets/team-sheets';
import { OwnRole } from '../features/teams/role-notes';
import { Button } from '../ui/button';
import { PageTitle } from '../ui/page-title';
import { TeamFrame } from './team-frame';

// Most visits open a sheet that is there already.
const NewSheetDialog = lazy(async () => ({
  default: (await import('../features/sheets/new-sheet-dialog')).NewSheetDialog,
}));

/** The team's sheets, and the ways to begin one. */
export function SheetsPage() {
  const [begin, setBegin] = useState<Beginning | null>(null);
  const beginBlank = () => setBegin({ kind: 'blank' });
  const mayBegin = (team: OwnTeam) => can(team.role, 'edit-sheet');
  return (
    <TeamFrame margin={(team) => (mayBegin(team) ? <BeginSheet onChoose={setBegin} /> : <OwnRole role={team.role} />)}>
      {(team) => (
        <>
          <div className="mb-4 flex items-center justify-between gap-4">
            <PageTitle windowTitle={`Sheets of ${team.name}`}>Sheets</PageTitle>
            {mayBegin(team) && (
              <Button look="strong" className="lg:hidden" onClick={beginBlank}>
                New sheet
              </Button>
            )}
          </div>
          <TeamSheets key={team.id} team={team} onBegin={beginBlank} />
          {begin !== null && (
            <Suspense fallback={null}>
              <NewSheetDialog teamId={team.id} begin={begin} onBegin={setBegin} onClose={() => setBegin(null)} />
            </Suspense>
          )}
        </>
      )}
    </TeamFrame>
  );
}
