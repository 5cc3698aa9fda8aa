// @vitest-environment jsdom
import { cleanup, render, screen } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { useState } from 'react';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import * as Y from 'yjs';
import { OWN_EDIT, sheetMaps } from '#shared/doc/sheet-maps';
import { writeDrawing } from '#shared/doc/write-drawing';
import { BLANK_DRAWING } from '#shared/starters/starters';
import { Canvas } from '../../../src/features/canvas/canvas';
import type { Room } from '../../../src/live/room';
import { NOTHING_SELECTED, type Selection } from '../../../src/live/selection';
import { useSheetCommands } from '../../../src/live/sheet-commands';
import { useDrawing } from '../../../src/live/use-drawing';

beforeEach(() => {
  // What React Flow asks of a browser and jsdom lacks.
  vi.stubGlobal(
    'ResizeObserver',
    class {
      observe() {}
      unobserve() {}
      disconnect() {}
    },
  );
  vi.stubGlobal(
    'DOMMatrixReadOnly',
    class {
      m22 = 1;
    },
  );
  // jsdom lays nothing out, and React Flow says so.
  vi.spyOn(console, 'warn').mockImplementation(() => undefined);
});
afterEach(() => {
  cleanup();
  vi.restoreAllMocks();
  vi.unstubAllGlobals();
});

const Nothing = () => null;

type Announce = (message: string) => void;

function Sheet({ room, canEdit, announce }: { room: Room; canEdit: boolean; announce: Announce }) {
  const { drawing, nets } = useDrawing(room);
  const commands = useSheetCommands(room, canEdit);
  const [selection, onSelect] = useState<Selection>(NOTHING_SELECTED);
  return (
    <Canvas
      drawing={drawing}
      nets={nets}
      commands={commands}
      selection={selection}
      onSelect={onSelect}
      Tag={Nothing}
      NetVoltage={Nothing}
      PartProblem={Nothing}
      slip={undefined}
      slipPart={undefined}
      onOpenSlip={() => undefined}
      onCloseSlip={() => undefined}
      others={[]}
      lit={new Set()}
      frame={undefined}
      announce={announce}
      followed={undefined}
      onView={() => undefined}
      onLeaveFollowed={() => undefined}
    />
  );
}

function openSheet(canEdit = true) {
  const doc = new Y.Doc();
  writeDrawing(doc, BLANK_DRAWING);
  const undo = new Y.UndoManager(Object.values(sheetMaps(doc)), {
    trackedOrigins: new Set([OWN_EDIT]),
    captureTimeout: 0,
  });
  const room = { doc, undo } as Room;
  const announce = vi.fn<Announce>();
  render(<Sheet room={room} canEdit={canEdit} announce={announce} />);
  return { doc, announce, user: userEvent.setup() };
}

test('by keys alone two parts are placed and tied, and undo takes back one step at a time', async () => {
  const { doc, announce, user } = openSheet();
  const { parts, wires } = sheetMaps(doc);
  screen.getByRole('application', { name: 'Drawing' }).focus();
  await user.keyboard('n{Enter}{Escape}');
  await user.keyboard('r{Shift>}{ArrowUp}{ArrowUp}{/Shift}{Enter}{Escape}');
  expect(announce).toHaveBeenLastCalledWith(expect.stringMatching(/^Placed Resistor R1, 10\u00a0kΩ at/));
  expect(document.activeElement).toBe(screen.getByRole('button', { name: 'Resistor R1, 10\u00a0kΩ', hidden: true }));

  await user.keyboard('..{Enter}');
  expect(announce).toHaveBeenLastCalledWith('A wire begins at R1 b: choose its other end.');
  // The ring of all terminals: after R1 b come those of the part after it.
  while (document.activeElement?.getAttribute('data-terminal') !== 'Q1.drain') await user.keyboard('.');
  await user.keyboard('{Enter}');
  expect(announce).toHaveBeenLastCalledWith('Tied R1 b to Q1 drain.');
  expect([parts.size, wires.size]).toEqual([2, 1]);

  await user.keyboard('{Control>}z{/Control}');
  expect([parts.size, wires.size]).toEqual([2, 0]);
  await user.keyboard('{Control>}z{/Control}');
  expect([parts.size, wires.size]).toEqual([1, 0]);
});

test('a held arrow moves a part as one step, and Delete removes it', async () => {
  const { doc, announce, user } = openSheet();
  screen.getByRole('application', { name: 'Drawing' }).focus();
  await user.keyboard('r{Enter}{Escape}');
  const [before] = sheetMaps(doc).parts.values() as Iterable<{ place: { x: number; y: number } }>;
  if (!before) throw new Error('nothing was placed');
  await user.keyboard('{Shift>}{ArrowRight>3/}{/Shift}');
  const [place] = sheetMaps(doc).places.values() as Iterable<{ x: number; y: number }>;
  expect(place).toMatchObject({ x: before.place.x + 30, y: before.place.y });
  await user.keyboard('{Control>}z{/Control}');
  expect(sheetMaps(doc).places.size).toBe(0);
  await user.keyboard('{Delete}');
  expect(sheetMaps(doc).parts.size).toBe(0);
  expect(announce).toHaveBeenLastCalledWith('Removed R1. Undo brings it back.');
});

test('who may only look has nothing to place', async () => {
  const { doc, user } = openSheet(false);
  screen.getByRole('application', { name: 'Drawing' }).focus();
  await user.keyboard('r{Enter}{Escape}');
  expect(sheetMaps(doc).parts.size).toBe(0);
  expect(screen.queryByRole('toolbar', { name: 'Parts to place' })).toBeNull();
});
