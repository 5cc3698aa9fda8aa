// @vitest-environment jsdom
import { cleanup, render, screen, within } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { afterEach, expect, test, vi } from 'vitest';
import { type Drawing, type DrawnPart, isComponent, isFet, type WireEnd } from '#shared/circuit/drawing';
import { netlist } from '#shared/circuit/netlist';
import { BLANK_DRAWING, STARTERS } from '#shared/starters/starters';
import { Ledger } from '../../../src/features/ledger/ledger';
import { NOTHING_SELECTED } from '../../../src/live/selection';
import { SolutionProvider } from '../../../src/workers/solution';
import { solverHere } from '../../support/solvers';

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

function open(drawing: Drawing) {
  const { circuit, nets } = netlist(drawing);
  const hands = { onSelect: vi.fn(), onLight: vi.fn(), onFrame: vi.fn() };
  render(
    <SolutionProvider circuit={circuit} start={solverHere}>
      <Ledger drawing={drawing} nets={nets} selection={NOTHING_SELECTED} {...hands} />
    </SolutionProvider>,
  );
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

test('rows are one tab stop: arrows walk and light them, Enter goes to the part, and so does a click', async () => {
  const { user, idOf, onLight, onSelect, onFrame } = open(differentialPair());
  await solved();
  await user.click(screen.getByRole('button', { name: 'ref', hidden }));
  screen.getByRole('button', { name: 'Q1', hidden }).focus();
  await user.keyboard('{ArrowDown}{ArrowDown}');
  expect(document.activeElement).toBe(screen.getByRole('button', { name: 'Q3', hidden }));
  expect(onLight).toHaveBeenLastCalledWith(idOf('Q3'));
  expect(onFrame).not.toHaveBeenCalled();
  await user.keyboard('{Enter}');
  expect(onFrame.mock.calls).toEqual([[idOf('Q3')]]);
  expect(onSelect).toHaveBeenLastCalledWith({ parts: new Set([idOf('Q3')]), wires: new Set() });
  await user.click(within(rowOf('Q5')).getAllByRole('cell', { hidden })[2] ?? document.body);
  expect(onFrame).toHaveBeenLastCalledWith(idOf('Q5'));
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
