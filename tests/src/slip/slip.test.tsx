// @vitest-environment jsdom
import { cleanup, configure, render, screen, within } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import * as Y from 'yjs';
import { loadLine } from '#shared/analyses/load-line';
import { solveCircuit } from '#shared/analyses/operating-point';
import { type DrawnComponent, type DrawnPart, isComponent } from '#shared/circuit/drawing';
import { netlist } from '#shared/circuit/netlist';
import { readCircuit } from '#shared/circuit/read-circuit';
import { readDrawing } from '#shared/doc/read-drawing';
import { OWN_EDIT, sheetMaps } from '#shared/doc/sheet-maps';
import { writeDrawing } from '#shared/doc/write-drawing';
import { STARTERS } from '#shared/starters/starters';
import { Slip } from '../../../src/features/slip/slip';
import type { FieldEditor } from '../../../src/live/presence';
import type { Room } from '../../../src/live/room';
import { useSheetCommands } from '../../../src/live/sheet-commands';
import { useDrawing } from '../../../src/live/use-drawing';
import { SolutionProvider } from '../../../src/workers/solution';
import { stubDrawing } from '../../support/canvas-in-jsdom';
import { solverHere } from '../../support/solvers';

vi.setConfig({ testTimeout: 30_000 });
configure({ asyncUtilTimeout: 10_000 });
beforeEach(stubDrawing);
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
  vi.restoreAllMocks();
});

type Presence = { editors?: readonly FieldEditor[]; onEditing?(field: string | undefined): void };

function OnSheet({
  room,
  ref_,
  canEdit,
  onClose,
  ...presence
}: { room: Room; ref_: string; canEdit: boolean; onClose(): void } & Presence) {
  const { drawing, nets, circuit } = useDrawing(room);
  const commands = useSheetCommands(room, canEdit);
  const part =
    drawing.parts.find(({ id }) => id === ref_) ?? drawing.parts.find((p) => isComponent(p) && p.ref === ref_);
  return (
    <SolutionProvider circuit={circuit} start={solverHere}>
      {part && (
        <Slip
          key={part.id}
          part={part}
          settings={drawing.settings}
          nets={nets}
          commands={commands}
          onClose={onClose}
          {...presence}
        />
      )}
    </SolutionProvider>
  );
}

/** The slip of a part of the four-resistor stage, found by reference or kind, on a document of its own. */
function openSlip(name: string, canEdit = true, presence: Presence = {}, values: object = {}) {
  const doc = new Y.Doc();
  const [stage] = STARTERS;
  if (!stage) throw new Error('no starter');
  const parts = stage.drawing.parts.map((one) =>
    isComponent(one) && one.ref === name ? ({ ...one, values: { ...one.values, ...values } } as DrawnPart) : one,
  );
  writeDrawing(doc, { ...stage.drawing, parts });
  const undo = new Y.UndoManager(Object.values(sheetMaps(doc)), { trackedOrigins: new Set([OWN_EDIT]) });
  const part = stage.drawing.parts.find((p) => p.kind === name || (isComponent(p) && p.ref === name));
  if (!part) throw new Error(`no ${name}`);
  const onClose = vi.fn();
  render(<OnSheet room={{ doc, undo } as Room} ref_={part.id} canEdit={canEdit} onClose={onClose} {...presence} />);
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

/** The four-resistor stage as the solver knows it. */
function stageSolved() {
  const [stage] = STARTERS;
  const read = readCircuit(stage && netlist(stage.drawing).circuit);
  if (!read.ok) throw new Error('the stage was not read');
  const record = solveCircuit(read.circuit);
  const point = record.fets.Q1;
  if (!point) throw new Error('Q1 is solved');
  return { circuit: read.circuit, record, point };
}

test('the curve tells in words where the device stands and what the circuit offers', async () => {
  const { point } = stageSolved();
  openSlip('Q1');
  const chart = await screen.findByRole('img', { name: /ID against VDS.*The circuit offers/ });
  const words = chart.getAttribute('aria-label')?.replaceAll('\u00a0', ' ');
  expect(words).toContain(`stands at VDS ${point.vds.toPrecision(3)} V with ${(point.id * 1e6).toPrecision(3)} µA`);
  expect(words).toContain(`VDSsat ${point.vdsSat.toPrecision(3)} V`);
});

test('t shows the numbers: the device’s and the load’s are equal at the point, and the load is the solver’s', async () => {
  const { circuit, record, point } = stageSolved();
  const { user } = openSlip('Q1');
  await screen.findByRole('img', { name: /The circuit offers/ });
  await user.keyboard('t');
  expect(field('W').value).toBe('t');
  await user.keyboard('{Escape}');
  screen.getByRole('button', { name: /^table/ }).focus();
  await user.keyboard('t');
  const table = screen.getByRole('table', { name: 'Numbers of the curve' });
  const numbers = (row: HTMLElement) =>
    within(row)
      .getAllByRole('cell')
      .map((cell) => Number.parseFloat(cell.textContent ?? ''));
  const [vds, device, load] = numbers(screen.getByRole('row', { name: /point/ }));
  expect(vds).toBeCloseTo(point.vds, 2);
  expect(device).toBe(load);
  expect(device).toBe(Number((point.id * 1e6).toPrecision(3)));
  const first = numbers(within(table).getAllByRole('row')[1] ?? document.body);
  const line = loadLine(circuit, record, 'Q1', [0]);
  expect(first[2]).toBe(line?.kind === 'swept' ? Number(((line.points[0]?.id ?? 0) * 1e6).toPrecision(3)) : Number.NaN);
  await user.keyboard('t');
  expect(screen.queryByRole('table')).toBeNull();
});

test('nothing is drawn while the circuit is not solved, and the slip says so', async () => {
  openSlip('Q1', true, {}, { process: 'no-such-process' });
  await screen.findByText('The circuit is not solved. There is no curve to show.');
  expect(screen.queryByRole('img')).toBeNull();
});

test('a parameter of the device’s own is marked beside the process’s, and taken back', async () => {
  const { now, user } = openSlip('Q1');
  await user.click(screen.getByRole('button', { name: /^parameters/ }));
  await user.clear(field('VT0'));
  await user.type(field('VT0'), '-0,2{Enter}');
  expect(now().values).toMatchObject({ overrides: { threshold: -0.2 } });
  await user.clear(field('VA/L'));
  await user.type(field('VA/L'), '10 V/µm{Enter}');
  expect(now().values).toMatchObject({ overrides: { threshold: -0.2, earlyVoltagePerLength: 1e7 } });
  expect(screen.getByText('2 of its own')).toBeTruthy();
  expect(screen.getByText('not 450\u00a0mV'.replace('\u00a0', ' '))).toBeTruthy();
  expect(screen.getByText('depletion')).toBeTruthy();
  await user.click(screen.getByRole('button', { name: 'Take back VT0' }));
  await user.click(screen.getByRole('button', { name: 'Take back VA/L' }));
  expect(now().values).not.toHaveProperty('overrides');
  expect(field('VT0').value).toBe('450\u00a0mV');
  expect(screen.queryByText('depletion')).toBeNull();
});

test('whoever else is at a value shows there, and where the cursor is here is told', async () => {
  const onEditing = vi.fn();
  const editors = [{ id: 7, name: 'Tove Bakken', initials: 'TB', field: 'length' }];
  const { user } = openSlip('Q1', true, { editors, onEditing });
  expect(onEditing).toHaveBeenLastCalledWith('width');
  expect(field('L').closest('[data-value]')?.textContent).toContain('TB');
  expect(field('W').closest('[data-value]')?.textContent).not.toContain('TB');
  await user.click(field('process'));
  expect(onEditing).toHaveBeenLastCalledWith('process');
  cleanup();
  expect(onEditing).toHaveBeenLastCalledWith(undefined);
});
