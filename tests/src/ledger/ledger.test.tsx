// @vitest-environment jsdom
import { cleanup, configure, render, screen, within } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { useMemo, useState } from 'react';
import { afterEach, expect, type Mock, test, vi } from 'vitest';
import { operatingPoint } from '#shared/analyses/operating-point';
import { type Drawing, type DrawnPart, isComponent, isFet, type WireEnd } from '#shared/circuit/drawing';
import { netlist } from '#shared/circuit/netlist';
import { BLANK_DRAWING, STARTERS } from '#shared/starters/starters';
import { formatValue } from '#shared/units/format-value';
import { Ledger } from '../../../src/features/ledger/ledger';
import { NOTHING_SELECTED, type Selection } from '../../../src/live/selection';
import { SolutionProvider } from '../../../src/workers/solution';
import { solverHere } from '../../support/solvers';

// Tables come after what is more urgent, and on a busy machine that takes its time.
configure({ asyncUtilTimeout: 10_000 });
vi.setConfig({ testTimeout: 30_000 });
afterEach(cleanup);

function differentialPair(): Drawing {
  const found = STARTERS.find(({ id }) => id === 'differential-pair');
  if (!found) throw new Error('no differential pair');
  return found.drawing;
}

type Intent = { region: 'off' | 'triode' | 'saturated'; margin?: number };

/** The pair with these intents and no other. */
function withIntents(drawing: Drawing, intents: Readonly<Record<string, Intent>>): Drawing {
  const parts = drawing.parts.map((part): DrawnPart => {
    if (!isFet(part)) return part;
    const { intent: _, ...values } = part.values;
    const intent = intents[part.ref];
    return { ...part, values: intent ? { ...values, intent } : values };
  });
  return { ...drawing, parts };
}

type Hands = Record<'onSelect' | 'onLight' | 'onFrame' | 'onOpen' | 'onEditSelected', Mock>;

/** The ledger on a page that keeps the selection. */
function OnPage({ drawing, hands }: { drawing: Drawing; hands: Hands }) {
  const { circuit, nets } = useMemo(() => netlist(drawing), [drawing]);
  const [selection, setSelection] = useState(NOTHING_SELECTED);
  const select = (next: Selection) => {
    setSelection(next);
    hands.onSelect(next);
  };
  return (
    <SolutionProvider circuit={circuit} start={solverHere}>
      <Ledger drawing={drawing} nets={nets} selection={selection} {...hands} onSelect={select} />
    </SolutionProvider>
  );
}

function open(drawing: Drawing) {
  const hands = { onSelect: vi.fn(), onLight: vi.fn(), onFrame: vi.fn(), onOpen: vi.fn(), onEditSelected: vi.fn() };
  render(<OnPage drawing={drawing} hands={hands} />);
  const idOf = (ref: string) => drawing.parts.find((part) => isComponent(part) && part.ref === ref)?.id;
  return { ...hands, idOf, user: userEvent.setup() };
}

/** Roles are looked for without asking jsdom what is hidden, which takes it seconds in a table. */
const hidden = true;

/** The names of the rows of a table, from the top. */
const rowsOf = (table: string) =>
  within(screen.getByRole('table', { name: table, hidden }))
    .getAllByRole('rowheader', { hidden })
    .map((cell) => cell.textContent);

function rowOf(name: string): HTMLElement {
  const row = screen.getByRole('button', { name, hidden }).closest('tr');
  if (!row) throw new Error(`${name} is in no row`);
  return row;
}

const solved = () => screen.findAllByText('met');

test('missed devices lead, then the least slack, and devices without an intent come last', async () => {
  // All six are saturated. Q4 is meant to be off and has the largest saturation margin of all, which is no merit then.
  open(
    withIntents(differentialPair(), {
      Q4: { region: 'off' },
      Q1: { region: 'saturated', margin: 0.9 },
      Q5: { region: 'saturated', margin: 0.1 },
      Q6: { region: 'saturated', margin: 0.05 },
    }),
  );
  await screen.findByText('missed');
  expect(rowsOf('FETs')).toEqual(['Q4', 'Q1', 'Q6', 'Q5', 'Q2', 'Q3']);
  expect(rowOf('Q4').textContent).toContain('missed');
  expect(rowOf('Q1').textContent).toContain('thin');
  expect(rowOf('Q6').textContent).toContain('met');
  expect(rowOf('Q2').textContent).toContain('none');
});

test('a column sorts the rows, and once more the other way', async () => {
  const { user } = open(differentialPair());
  await solved();
  await user.click(screen.getByRole('button', { name: 'ref', hidden }));
  expect(rowsOf('FETs')).toEqual(['Q1', 'Q2', 'Q3', 'Q4', 'Q5', 'Q6']);
  await user.click(screen.getByRole('button', { name: 'ref', hidden }));
  expect(rowsOf('FETs')).toEqual(['Q6', 'Q5', 'Q4', 'Q3', 'Q2', 'Q1']);
  expect(screen.getByRole('columnheader', { name: 'ref', hidden }).getAttribute('aria-sort')).toBe('descending');
});

test('rows are one tab stop: arrows walk and light them, Enter opens the slip, a click goes to the part', async () => {
  const { user, idOf, onLight, onSelect, onFrame, onOpen } = open(differentialPair());
  await solved();
  await user.click(screen.getByRole('button', { name: 'ref', hidden }));
  screen.getByRole('button', { name: 'Q1', hidden }).focus();
  await user.keyboard('{ArrowDown}{ArrowDown}');
  expect(document.activeElement).toBe(screen.getByRole('button', { name: 'Q3', hidden }));
  expect(onLight).toHaveBeenLastCalledWith(idOf('Q3'));
  expect(onFrame).not.toHaveBeenCalled();
  await user.keyboard('{Enter}');
  expect(onFrame.mock.calls).toEqual([[idOf('Q3')]]);
  expect(onOpen.mock.calls).toEqual([[idOf('Q3')]]);
  expect(onSelect).toHaveBeenLastCalledWith({ parts: new Set([idOf('Q3')]), wires: new Set() });
  await user.click(within(rowOf('Q5')).getAllByRole('cell', { hidden })[2] ?? document.body);
  expect(onFrame).toHaveBeenLastCalledWith(idOf('Q5'));
  expect(onOpen).toHaveBeenCalledOnce();
});

test('several rows are selected by keys and by mouse, as they stand, and edited together', async () => {
  const { user, idOf, onSelect, onEditSelected } = open(differentialPair());
  await solved();
  const selected = () => onSelect.mock.lastCall?.[0].parts;
  const these = (...refs: string[]) => new Set(refs.map(idOf));
  await user.click(screen.getByRole('button', { name: 'ref', hidden }));
  screen.getByRole('button', { name: 'Q2', hidden }).focus();
  await user.keyboard('{Shift>}{ArrowDown}{ArrowDown}{/Shift}');
  expect(selected()).toEqual(these('Q2', 'Q3', 'Q4'));
  await user.keyboard('{Shift>}{ArrowUp}{/Shift}');
  expect(selected()).toEqual(these('Q2', 'Q3'));
  expect(rowOf('Q3').getAttribute('aria-current')).toBe('true');
  await user.keyboard('{Control>}');
  await user.click(rowOf('Q6'));
  await user.keyboard('{/Control}');
  expect(selected()).toEqual(these('Q2', 'Q3', 'Q6'));
  await user.click(screen.getByRole('button', { name: 'edit 3 selected' }));
  expect(onEditSelected).toHaveBeenCalledOnce();
  await user.click(rowOf('Q5'));
  expect(screen.queryByRole('button', { name: /^edit/ })).toBeNull();
  await user.keyboard('{Shift>}');
  await user.click(rowOf('Q3'));
  await user.keyboard('{/Shift}');
  expect(selected()).toEqual(these('Q3', 'Q4', 'Q5'));
});

test('every column sorts, and what has no figure comes last both ways', async () => {
  const { user } = open(
    withIntents(differentialPair(), { Q1: { region: 'saturated' }, Q6: { region: 'saturated', margin: 0.01 } }),
  );
  await solved();
  const table = screen.getByRole('table', { name: 'FETs', hidden });
  const heads = within(table).getAllByRole('columnheader', { hidden });
  for (const head of heads) expect(within(head).getByRole('button', { hidden })).toBeTruthy();
  const verdict = screen.getByRole('button', { name: 'verdict', hidden });
  await user.click(verdict);
  expect(rowsOf('FETs').slice(0, 2)).toEqual(['Q6', 'Q1']);
  await user.click(verdict);
  expect(rowsOf('FETs').slice(0, 2)).toEqual(['Q1', 'Q6']);
});

test('a figure has three digits, and four for whoever points at it', async () => {
  const drawing = differentialPair();
  open(drawing);
  await solved();
  const gm = operatingPoint(netlist(drawing).circuit).fets.Q6?.gm ?? Number.NaN;
  expect(within(rowOf('Q6')).getByTitle(formatValue(gm, 'S', 4).replace('\u00a0', ' ')).textContent).toContain(
    (gm * 1e3).toPrecision(3),
  );
});

test('other parts and nets have tables too, with the figures of the record', async () => {
  const { user } = open(differentialPair());
  await user.click(screen.getByRole('tab', { name: 'other parts 4' }));
  expect(rowsOf('Other parts')).toEqual(['R1', 'R2', 'V1', 'V2']);
  await vi.waitFor(() => expect(rowOf('V1').textContent).toContain('1.80'));
  await user.click(screen.getByRole('tab', { name: 'nets 7' }));
  expect(rowsOf('Nets')).toEqual(['gnd', 'mir', 'out', 'ref', 'tail', 'vcm', 'vdd']);
  expect(rowOf('vcm').textContent).toContain('0.850');
  expect(rowOf('vcm').textContent).toContain('Q1.gate, Q2.gate, V2.plus');
});

test('a circuit that cannot be solved has its problems told with the parts to go to, and no figures', async () => {
  const pair = differentialPair();
  const v2 = pair.parts.find((part) => isComponent(part) && part.ref === 'V2');
  const leadsFromV2 = (end: WireEnd) => end.part === v2?.id && end.pin === 'minus';
  const { user, onFrame, idOf } = open({
    ...pair,
    wires: pair.wires.filter(({ from, to }) => !leadsFromV2(from) && !leadsFromV2(to)),
  });
  await screen.findByText('The circuit could not be solved.');
  for (const ref of ['Q1', 'Q6']) expect(rowOf(ref).textContent).not.toMatch(/\d\.\d/);
  await user.click(screen.getAllByRole('button', { name: 'Show V2', hidden })[0] ?? document.body);
  expect(onFrame).toHaveBeenLastCalledWith(idOf('V2'));
});

test('an empty sheet is told how to begin, and nothing is wrong with it', async () => {
  open(BLANK_DRAWING);
  expect(screen.getByText(/To begin, choose a part from the tray/)).toBeTruthy();
  expect(screen.getByRole('tab', { name: 'problems 0' })).toBeTruthy();
  expect(screen.queryByText('The circuit could not be solved.')).toBeNull();
});

test('by keys it grows, shrinks and collapses to one line, and a tab opens it again', async () => {
  const { user } = open(differentialPair());
  const edge = screen.getByRole('separator', { name: 'Height of the ledger' });
  const height = () => Number(edge.getAttribute('aria-valuenow'));
  const before = height();
  edge.focus();
  await user.keyboard('{ArrowUp}');
  expect(height()).toBeGreaterThan(before);
  await user.keyboard('{Enter}');
  expect(screen.queryByRole('table')).toBeNull();
  await user.click(screen.getByRole('tab', { name: /^FETs/ }));
  expect(screen.getByRole('table')).toBeTruthy();
});
