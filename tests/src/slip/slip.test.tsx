// @vitest-environment jsdom
import { cleanup, render, screen } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { afterEach, expect, test, vi } from 'vitest';
import * as Y from 'yjs';
import { type DrawnComponent, isComponent } from '#shared/circuit/drawing';
import { readDrawing } from '#shared/doc/read-drawing';
import { OWN_EDIT, sheetMaps } from '#shared/doc/sheet-maps';
import { writeDrawing } from '#shared/doc/write-drawing';
import { STARTERS } from '#shared/starters/starters';
import { Slip } from '../../../src/features/slip/slip';
import type { Room } from '../../../src/live/room';
import { useSheetCommands } from '../../../src/live/sheet-commands';
import { useDrawing } from '../../../src/live/use-drawing';
import { SolutionProvider } from '../../../src/workers/solution';
import { solverHere } from '../../support/solvers';

afterEach(cleanup);

function OnSheet({ room, ref_, canEdit, onClose }: { room: Room; ref_: string; canEdit: boolean; onClose(): void }) {
  const { drawing, nets, circuit } = useDrawing(room);
  const commands = useSheetCommands(room, canEdit);
  const part =
    drawing.parts.find(({ id }) => id === ref_) ?? drawing.parts.find((p) => isComponent(p) && p.ref === ref_);
  return (
    <SolutionProvider circuit={circuit} start={solverHere}>
      {part && (
        <Slip key={part.id} part={part} settings={drawing.settings} nets={nets} commands={commands} onClose={onClose} />
      )}
    </SolutionProvider>
  );
}

/** The slip of a part of the four-resistor stage, found by reference or kind, on a document of its own. */
function openSlip(name: string, canEdit = true) {
  const doc = new Y.Doc();
  const [stage] = STARTERS;
  if (!stage) throw new Error('no starter');
  writeDrawing(doc, stage.drawing);
  const undo = new Y.UndoManager(Object.values(sheetMaps(doc)), { trackedOrigins: new Set([OWN_EDIT]) });
  const part = stage.drawing.parts.find((p) => p.kind === name || (isComponent(p) && p.ref === name));
  if (!part) throw new Error(`no ${name}`);
  const onClose = vi.fn();
  render(<OnSheet room={{ doc, undo } as Room} ref_={part.id} canEdit={canEdit} onClose={onClose} />);
  const now = () => {
    const found = readDrawing(doc).drawing.parts.find(({ id }) => id === part.id);
    return found as DrawnComponent;
  };
  return { now, onClose, user: userEvent.setup() };
}

const field = (label: string) => screen.getByLabelText<HTMLInputElement>(label);

test('it opens in the first value, Enter commits as people write it, and Tab walks on', async () => {
  const { now, user } = openSlip('R1');
  expect(document.activeElement).toBe(field('R'));
  expect(field('R').value).toBe('100\u00a0kΩ');
  await user.keyboard('4k7{Enter}');
  expect(now().values).toEqual({ resistance: 4700 });
  expect(field('R').value).toBe('4.7\u00a0kΩ');
});

test('a bare number for W is in micrometres and shown so at once; leaving the field commits too', async () => {
  const { now, user } = openSlip('Q1');
  await user.keyboard('5');
  await user.tab();
  expect(now().values).toMatchObject({ width: 5e-6 });
  expect(field('W').value).toBe('5\u00a0µm');
  expect(document.activeElement).toBe(field('L'));
});

test.each([
  ['ten', 'does not start with a number'],
  ['1,500', 'can mean 1500 or 1.500'],
  ['-3k', 'must be more than 0'],
])('“%s” stays in the field with the reason, and the drawing keeps the last good value', async (text, reason) => {
  const { now, user } = openSlip('R1');
  await user.keyboard(`${text}{Enter}`);
  expect(field('R').value).toBe(text);
  expect(screen.getByRole('alert').textContent).toContain(reason);
  expect(now().values).toEqual({ resistance: 100e3 });
});

test('a reference that another part has is refused beside the field', async () => {
  const { now, user } = openSlip('R1');
  await user.clear(field('reference'));
  await user.type(field('reference'), 'R2{Enter}');
  expect(screen.getByRole('alert').textContent).toContain('R2 is taken');
  expect(now().ref).toBe('R1');
  await user.clear(field('reference'));
  await user.type(field('reference'), 'RG{Enter}');
  expect(now().ref).toBe('RG');
});

test('the intent is chosen, keeps its margin from region to region, and can be taken away', async () => {
  const { now, user } = openSlip('Q1');
  await user.selectOptions(field('intent'), 'triode');
  expect(now().values).toMatchObject({ intent: { region: 'triode', margin: 0.1 } });
  await user.clear(field('margin'));
  await user.type(field('margin'), '50m{Enter}');
  expect(now().values).toMatchObject({ intent: { region: 'triode', margin: 0.05 } });
  await vi.waitFor(() => expect(screen.getByRole('region').textContent).toContain('missed'));
  await user.selectOptions(field('intent'), 'none');
  expect(now().values).not.toHaveProperty('intent');
  expect(screen.queryByLabelText('margin')).toBeNull();
});

test('a device sized by its own k is the same device as before', async () => {
  const { now, user } = openSlip('Q1');
  await user.selectOptions(field('sized by'), 'its own k');
  // k = k' W/L with the built-in process's 280 µA/V² and the starter's 10/1.
  expect(now().values).toMatchObject({ k: 2.8e-3 });
  expect(now().values).not.toHaveProperty('width');
  await user.selectOptions(field('sized by'), 'W and L');
  expect(now().values).toMatchObject({ width: 10e-6, length: 1e-6 });
  expect(now().values).not.toHaveProperty('k');
});

test('the built-in process is marked as invented', () => {
  openSlip('Q1');
  expect(screen.getByText('invented figures')).toBeTruthy();
});

test('a net name that no net can have is refused with the reason', async () => {
  const { now, user } = openSlip('supply');
  await user.keyboard('v dd{Enter}');
  expect(screen.getByRole('alert').textContent).toContain('A net name is');
  await user.clear(field('net'));
  await user.type(field('net'), 'vcc{Enter}');
  expect(now().values).toEqual({ net: 'vcc' });
});

test('Escape first takes the typing back, then closes; no key of it reaches the drawing', async () => {
  const { onClose, user } = openSlip('R1');
  const drawing = vi.fn();
  document.addEventListener('keydown', drawing);
  await user.keyboard('9k{Escape}');
  expect(onClose).not.toHaveBeenCalled();
  expect(field('R').value).toBe('100\u00a0kΩ');
  await user.keyboard('{Escape}');
  expect(onClose).toHaveBeenCalledOnce();
  expect(drawing).not.toHaveBeenCalled();
  document.removeEventListener('keydown', drawing);
});

test('whoever may only look reads the values as text', async () => {
  const { onClose, user } = openSlip('Q1', false);
  expect(screen.queryAllByRole('textbox')).toEqual([]);
  expect(screen.queryAllByRole('combobox')).toEqual([]);
  expect(screen.queryAllByRole('checkbox')).toEqual([]);
  expect(screen.getByRole('region', { name: 'Q1: values' }).textContent).toContain('W10\u00a0µm');
  await user.keyboard('{Escape}');
  expect(onClose).toHaveBeenCalledOnce();
});
