import { useCallback, useMemo, useState } from 'react';
import { Link } from 'react-router-dom';
import { can } from '#shared/access/roles';
import type { SheetAnswer } from '#shared/api/sheets';
import { type DrawnPart, isComponent, type PartId } from '#shared/circuit/drawing';
import { useSession } from '../api/session';
import { Canvas } from '../features/canvas/canvas';
import { Ledger } from '../features/ledger/ledger';
import { MastheadFigures } from '../features/masthead/masthead-figures';
import { OtherPointFrame } from '../features/masthead/other-point-frame';
import { PersonMenu } from '../features/person/person-menu';
import { DrawingNotices } from '../features/sheet-head/drawing-notices';
import { PeopleHere } from '../features/sheet-head/people-here';
import { SafeState } from '../features/sheet-head/safe-state';
import { SheetName } from '../features/sheet-head/sheet-name';
import { UndoRedo } from '../features/sheet-head/undo-redo';
import { SeveralSlip } from '../features/slip/several-slip';
import { SheetPartsProvider } from '../features/slip/sheet-parts';
import { Slip } from '../features/slip/slip';
import { FetTag } from '../features/tag/fet-tag';
import { NetVoltage } from '../features/tag/net-voltage';
import { PartProblem } from '../features/tag/part-problem';
import { SolutionAnnouncer } from '../features/tag/solution-announcer';
import { initialsOf } from '../formats/initials';
import { useFieldEditors, useOthers, usePresence } from '../live/presence';
import type { Room, RoomState } from '../live/room';
import { useSheetCommands } from '../live/sheet-commands';
import { useDrawing } from '../live/use-drawing';
import { Mark } from '../ui/mark';
import { SkipLink } from '../ui/page-frame';
import { SolutionProvider, useFetRegion, useTerminalCurrent } from '../workers/solution';
import { useSelection } from './use-selection';

type SheetDeskProps = { room: Room; state: RoomState; answer: SheetAnswer };

/** The sheet as it is worked on: masthead, drawing with tray and slip, ledger. */
export function SheetDesk({ room, state, answer: { sheet, team } }: SheetDeskProps) {
  const { person } = useSession();
  const canEdit = can(team.role, 'edit-sheet') && !sheet.archived;
  const { drawing, nets, circuit, setAside } = useDrawing(room);
  const commands = useSheetCommands(room, canEdit);
  const { selection, select, slip: openedSlip, openSlip, closeSlip } = useSelection();
  const [lit, setLit] = useState<ReadonlySet<PartId>>(new Set());
  const [frame, setFrame] = useState<{ part: PartId; request: number }>();
  const [announcement, setAnnouncement] = useState('');
  const others = useOthers(room);
  const { tellPointer, tellView, tellEditing } = usePresence(room, selection);
  const [followedId, setFollowedId] = useState<number>();
  const followed = others.find(({ id }) => id === followedId);
  const leaveFollowed = useCallback(() => setFollowedId(undefined), []);

  const shown = drawing.parts.find(({ id }) => id === openedSlip?.part);
  const light = useCallback((part: PartId | undefined) => setLit(new Set(part === undefined ? [] : [part])), []);
  const bringIntoView = useCallback(
    (part: PartId) => setFrame((before) => ({ part, request: (before?.request ?? 0) + 1 })),
    [],
  );
  const editSelected = () => {
    const first = drawing.parts.find((part) => isComponent(part) && selection.parts.has(part.id));
    if (first) openSlip(first.id);
  };
  const editors = useFieldEditors(others, shown?.id);
  const slip = useMemo(() => {
    const about = drawing.parts.filter(({ id }) => openedSlip?.parts.has(id));
    if (!shown) return undefined;
    return (
      <SheetPartsProvider value={drawing.parts}>
        {about.length > 1 ? (
          <SeveralSlip parts={about} settings={drawing.settings} commands={commands} onClose={closeSlip} />
        ) : (
          <Slip
            key={shown.id}
            part={shown}
            settings={drawing.settings}
            nets={nets}
            commands={commands}
            onClose={closeSlip}
            editors={editors}
            onEditing={(field) => tellEditing(field === undefined ? undefined : { part: shown.id, field })}
          />
        )}
      </SheetPartsProvider>
    );
  }, [shown, openedSlip, drawing, nets, commands, closeSlip, editors, tellEditing]);

  return (
    <SolutionProvider circuit={circuit}>
      <div className="flex h-dvh flex-col">
        <SkipLink />
        <header className="flex min-h-13 flex-wrap items-center gap-x-4 gap-y-1 border-b border-rule px-4 py-1 sm:px-6">
          <Link
            to={`/?team=${team.id}`}
            aria-label={`Stillpoint, the sheets of ${team.name}`}
            className="flex h-10 items-center"
          >
            <Mark />
          </Link>
          <SheetName sheetId={sheet.id} name={sheet.name} editable={canEdit} />
          <p className="text-faint">{sheet.state.replace('-', ' ')}</p>
          <SafeState state={state} />
          <PeopleHere
            own={{ name: person.name, initials: initialsOf(person.name) }}
            others={others}
            followed={followedId}
            onFollow={setFollowedId}
          />
          {followed && <p className="text-xs text-faint">following {followed.name} until you move the view</p>}
          {canEdit ? (
            <UndoRedo commands={commands} />
          ) : (
            <p className="border border-edge px-2 text-xs">
              {sheet.archived ? 'archived' : `looking on as ${team.role}`}
            </p>
          )}
          <div className="ml-auto">
            <MastheadFigures settings={drawing.settings} commands={commands} />
          </div>
          <PersonMenu />
        </header>
        <DrawingNotices namesMeet={nets.namesMeet} setAside={setAside} />
        <main id="main" tabIndex={-1} className="relative min-h-40 flex-1 outline-none [container-type:size]">
          <OtherPointFrame />
          <Canvas
            drawing={drawing}
            nets={nets}
            commands={commands}
            selection={selection}
            onSelect={select}
            Tag={FetTag}
            NetVoltage={NetVoltage}
            PartProblem={PartProblem}
            useRegion={useRegionOf}
            useTerminalCurrent={useTerminalCurrent}
            slip={slip}
            slipPart={shown?.id}
            onOpenSlip={openSlip}
            onCloseSlip={closeSlip}
            others={others}
            lit={lit}
            frame={frame}
            announce={setAnnouncement}
            onPointer={tellPointer}
            followed={followed?.view}
            onView={tellView}
            onLeaveFollowed={leaveFollowed}
          />
        </main>
        <Ledger
          drawing={drawing}
          nets={nets}
          selection={selection}
          onSelect={select}
          onLight={light}
          onFrame={bringIntoView}
          onOpen={openSlip}
          onEditSelected={canEdit ? editSelected : undefined}
        />
      </div>
      <p role="status" className="sr-only">
        {announcement}
      </p>
      <SolutionAnnouncer announce={setAnnouncement} />
    </SolutionProvider>
  );
}

function useRegionOf(part: Extract<DrawnPart, { kind: 'nfet' | 'pfet' }>) {
  return useFetRegion(part.ref);
}
