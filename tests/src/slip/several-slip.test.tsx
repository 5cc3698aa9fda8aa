// @vitest-environment jsdom
import { cleanup, render, screen, within } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { afterEach, expect, test } from 'vitest';
import * as Y from 'yjs';
import { isComponent } from '#shared/circuit/drawing';
import { OWN_EDIT, sheetMaps } from '#shared/doc/sheet-maps';
import { writeDrawing } from '#shared/doc/write-drawing';
import { differentialPair } from '#shared/starters/differential-pair';
import { SeveralSlip } from '../../../src/features/slip/several-slip';
import { SheetPartsProvider } from '../../../src/features/slip/sheet-parts';
import type { Room } from '../../../src/live/room';
import { useSheetCommands } from '../../../src/live/sheet-commands';
import { useDrawing } from '../../../src/live/use-drawing';

afterEach(cleanup);

function Page({ room, refs }: { room: Room; refs: readonly string[] }) {
  const { drawing } = useDrawing(room);
  const commands = useSheetCommands(room, true);
  const parts = drawing.parts.filter((part) => isComponent(part) && refs.includes(part.ref));
  return (
    <SheetPartsProvider value={drawing.parts}>
      <SeveralSlip parts={parts} settings={drawing.settings} commands={commands} onClose={() => undefined} />
    </SheetPartsProvider>
  );
}

function open(...refs: string[]) {
  const doc = new Y.Doc();
  writeDrawing(doc, differentialPair());
  const undo = new Y.UndoManager(Object.values(sheetMaps(doc)), {
    trackedOrigins: new Set([OWN_EDIT]),
    captureTimeout: 0,
  });
  render(<Page room={{ doc, undo } as Room} refs={refs} />);
  return { doc, undo, user: userEvent.setup() };
}

const field = (name: string) => screen.getByLabelText<HTMLInputElement>(name);

test('shows what values have in common or that they differ, and sets one in all parts as one step', async () => {
  const { undo, user } = open('Q1', 'Q3', 'Q6');
  expect(field('W').value).toBe('several');
  expect(field('L').value).toBe('1\u00a0µm');
  expect(field('margin').value).toBe('several');
  await user.clear(field('W'));
  await user.type(field('W'), '12{Enter}');
  expect(field('W').value).toBe('12\u00a0µm');
  await user.selectOptions(screen.getByLabelText('intent'), 'triode');
  expect(field('margin').value).toBe('several');
  expect(undo.undoStack).toHaveLength(2);
  undo.undo();
  undo.undo();
  expect(undo.canUndo()).toBe(false);
});

test('a text that cannot be read changes no part', async () => {
  const { doc, user } = open('Q1', 'Q2');
  await user.clear(field('W'));
  await user.type(field('W'), 'wide{Enter}');
  expect(screen.getByRole('alert').textContent).not.toBe('');
  expect(sheetMaps(doc).params.size).toBe(0);
});

test('parts of several kinds have a section each, and only parts of one kind can be kept equal', () => {
  open('Q1', 'R1', 'R2');
  expect(within(screen.getByRole('region', { name: 'resistors' })).getByLabelText('R')).toBeDefined();
  expect(within(screen.getByRole('region', { name: 'FETs' })).getByLabelText('W')).toBeDefined();
  expect(screen.queryByRole('button', { name: 'Keep these values equal' })).toBeNull();
});

test('parts are kept equal, told when edits at once left them apart, and made equal again', async () => {
  const { doc, user } = open('R1', 'R2');
  expect(field('R').value).toBe('several');
  await user.click(screen.getByRole('button', { name: 'Keep these values equal' }));
  expect(field('R').value).toBe('27\u00a0kΩ');
  expect(screen.getByText(/kept equal as A/)).toBeDefined();
  // As a colleague's edit arrives that was made before they knew of the group.
  doc.transact(() => sheetMaps(doc).params.set('R2/resistance', 99e3));
  expect((await screen.findByRole('alert')).textContent).toContain('apart');
  await user.click(screen.getByRole('button', { name: 'Give all the values of R1' }));
  expect(field('R').value).toBe('27\u00a0kΩ');
  expect(screen.queryByRole('alert')).toBeNull();
});
