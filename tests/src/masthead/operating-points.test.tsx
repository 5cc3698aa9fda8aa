// @vitest-environment jsdom
import { cleanup, configure, render, screen, within } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { useMemo } from 'react';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { operatingPoint } from '#shared/analyses/operating-point';
import type { CircuitFile, CircuitPart, FetPart } from '#shared/circuit/circuit-file';
import { type Drawing, type DrawnPart, isFet } from '#shared/circuit/drawing';
import { netlist } from '#shared/circuit/netlist';
import { selfBiasedReference } from '#shared/starters/self-biased-reference';
import { BLANK_DRAWING } from '#shared/starters/starters';
import { Ledger } from '../../../src/features/ledger/ledger';
import { MastheadFigures } from '../../../src/features/masthead/masthead-figures';
import { OtherPointFrame } from '../../../src/features/masthead/other-point-frame';
import { FetTag } from '../../../src/features/tag/fet-tag';
import { NetVoltage } from '../../../src/features/tag/net-voltage';
import { NOTHING_SELECTED } from '../../../src/live/selection';
import type { SheetCommands } from '../../../src/live/sheet-commands';
import { SolutionProvider } from '../../../src/workers/solution';
import { solverHere } from '../../support/solvers';

configure({ asyncUtilTimeout: 10_000 });
vi.setConfig({ testTimeout: 30_000 });
beforeEach(() => {
  // What the opened list asks of a browser and jsdom lacks.
  vi.stubGlobal(
    'ResizeObserver',
    class {
      observe() {}
      unobserve() {}
      disconnect() {}
    },
  );
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

function inverter(number: number, input: string, output: string): CircuitPart[] {
  const fet = (kind: FetPart['kind'], threshold: number): FetPart => ({
    ref: `${kind === 'nfet' ? 'QN' : 'QP'}${number}`,
    kind,
    drain: output,
    gate: input,
    source: kind === 'nfet' ? 'gnd' : 'vdd',
    k: 1e-3,
    overrides: { threshold, lambda: 0.1 },
  });
  return [fet('nfet', 0.4), fet('pfet', -0.4)];
}

/** Two inverters in a ring: by symmetry one point lies at half the supply, and the others at its ends. */
function latch(supply: number): CircuitFile {
  return {
    format: 'stillpoint.circuit',
    version: 1,
    ground: 'gnd',
    parts: [
      { ref: 'V1', kind: 'voltage', plus: 'vdd', minus: 'gnd', voltage: supply },
      ...inverter(1, 'left', 'right'),
      ...inverter(2, 'right', 'left'),
    ],
  };
}

const onlooker = { canEdit: false } as SheetCommands;

function LatchPage({ circuit }: { circuit: CircuitFile }) {
  return (
    <SolutionProvider circuit={circuit} start={solverHere}>
      <MastheadFigures settings={BLANK_DRAWING.settings} commands={onlooker} />
      <OtherPointFrame />
      <p data-testid="left">
        <NetVoltage net="left" />
      </p>
    </SolutionProvider>
  );
}

const words = (text: string | null) => text?.replaceAll('\u00a0', ' ');
const left = () => words(screen.getByTestId('left').textContent);
const opener = () => screen.findByRole('button', { name: /^point \d of \d$/ });
const frame = () => screen.queryByRole('region', { name: 'Another operating point is shown' });
const spoken = () => screen.getByRole('status').textContent;

test('each point of a latch can be looked at by keys, the unstable one is marked, and an edit goes back to the first', async () => {
  const user = userEvent.setup();
  const { rerender } = render(<LatchPage circuit={latch(2)} />);
  expect((await opener()).textContent).toBe('point 1 of 3');
  expect(spoken()).toBe('This circuit has 3 operating points.');
  expect(frame()).toBeNull();
  const atFirst = left();

  (await opener()).focus();
  await user.keyboard('{Enter}');
  const list = within(await screen.findByRole('dialog'));
  expect(list.getAllByRole<HTMLInputElement>('radio').map(({ checked }) => checked)).toEqual([true, false, false]);
  await user.click(list.getByRole('radio', { name: /^2 · another point/ }));
  expect([atFirst, left()].sort()).toEqual(['0 V', '2.00 V']);
  expect(spoken()).toBe('Showing point 2 of 3, another point.');
  expect(frame()?.textContent).toContain('point 2 of 3, not the first');
  await user.click(list.getByRole('radio', { name: /^3 · surely unstable.*does not stay here.*4 of 4 FETs on/ }));
  expect(left()).toBe('1.00 V');
  expect(frame()?.textContent).toContain('surely unstable: the circuit does not stay here');

  await user.keyboard('{Escape}');
  screen.getByRole('button', { name: 'Previous operating point' }).focus();
  await user.keyboard('{Enter}{Enter}');
  expect((await opener()).textContent).toBe('point 1 of 3');
  expect(frame()).toBeNull();
  await user.keyboard('{Enter}');
  expect(spoken()).toBe('Showing point 3 of 3, surely unstable.');

  rerender(<LatchPage circuit={latch(3)} />);
  await vi.waitFor(() => expect(['0 V', '3.00 V']).toContain(left()));
  expect((await opener()).textContent).toBe('point 1 of 3');
  expect(frame()).toBeNull();
  expect(spoken()).toBe('The circuit changed: showing its first operating point again.');
});

/** Says for each FET that it should be off, so that the verdicts tell which point they are of. */
function meantToBeOff(drawing: Drawing): Drawing {
  const parts = drawing.parts.map(
    (part): DrawnPart => (isFet(part) ? { ...part, values: { ...part.values, intent: { region: 'off' } } } : part),
  );
  return { ...drawing, parts };
}

function ReferencePage({ drawing }: { drawing: Drawing }) {
  const { circuit, nets } = useMemo(() => netlist(drawing), [drawing]);
  const nothing = () => undefined;
  return (
    <SolutionProvider circuit={circuit} start={solverHere}>
      <MastheadFigures settings={drawing.settings} commands={onlooker} />
      <OtherPointFrame />
      {drawing.parts.filter(isFet).map((part) => (
        <FetTag key={part.id} part={part} />
      ))}
      <Ledger
        drawing={drawing}
        nets={nets}
        selection={NOTHING_SELECTED}
        onSelect={nothing}
        onLight={nothing}
        onFrame={nothing}
        onOpen={nothing}
      />
    </SolutionProvider>
  );
}

test('a reference that nothing starts names its zero-current point as the hazard, and tags, ledger and sums show it', async () => {
  const user = userEvent.setup();
  const drawing = meantToBeOff(selfBiasedReference({ withStart: false }));
  render(<ReferencePage drawing={drawing} />);
  const tag = () => words(screen.getByRole('figure', { name: 'Q1 at the operating point' }).textContent) ?? '';
  const verdicts = () => screen.getByRole('list', { name: 'Verdicts' }).textContent;
  const rows = () => words(screen.getByRole('table', { name: 'FETs' }).textContent) ?? '';
  expect((await opener()).textContent).toBe('point 1 of 2');
  expect(tag()).toContain('saturated');
  expect(verdicts()).toBe('5 missed');

  await user.click(await opener());
  const hazard = /^2 · all devices off, no current flows.*start-up hazard.*add a start-up path.*0 of 5 FETs on · 0 A/;
  await user.click(screen.getByRole('radio', { name: (name) => hazard.test(words(name) ?? '') }));
  await user.keyboard('{Escape}');
  expect(frame()?.textContent).toContain('start-up hazard');
  expect(tag()).toMatch(/^off0/);
  expect(verdicts()).toBe('5 met');
  await vi.waitFor(() => expect(rows()).not.toContain('saturated'));
  expect(within(screen.getByRole('table', { name: 'FETs' })).getAllByText('met')).toHaveLength(5);
  await user.click(screen.getByRole('tab', { name: /^problems/ }));
  expect(screen.getByText(/at this operating point: –/)).toBeDefined();
  expect(screen.getByText('remarks –')).toBeDefined();

  await user.click(screen.getByRole('button', { name: 'show the first' }));
  expect(tag()).toContain('saturated');
  expect(verdicts()).toBe('5 missed');
  expect(frame()).toBeNull();
});

test('a circuit with one operating point has no such control', async () => {
  const { parts, ...rest } = latch(2);
  // Without the second inverter nothing closes the ring.
  const single: CircuitPart = { ref: 'V2', kind: 'voltage', plus: 'left', minus: 'gnd', voltage: 0.5 };
  const searched = vi.fn();
  const start = () => {
    const solver = solverHere();
    return { ...solver, searchedPoint: () => solver.searchedPoint().finally(searched) };
  };
  render(
    <SolutionProvider circuit={{ ...rest, parts: [...parts.slice(0, 3), single] }} start={start}>
      <MastheadFigures settings={BLANK_DRAWING.settings} commands={onlooker} />
    </SolutionProvider>,
  );
  await vi.waitFor(() => expect(searched).toHaveBeenCalled());
  await screen.findByTitle(/the voltage sources deliver/);
  expect(screen.queryByRole('group', { name: 'Operating points' })).toBeNull();
});

test('an unstable point is marked also where no other was found', async () => {
  const record = operatingPoint(latch(2));
  const between = record.alternatives.find(({ surelyUnstable }) => surelyUnstable);
  if (!between) throw new Error('the latch has a point in between');
  const alone = { ...record, ...between, alternatives: [] };
  const start = () => ({ ...solverHere(), firstPoint: async () => alone, searchedPoint: async () => alone });
  render(
    <SolutionProvider circuit={latch(2)} start={start}>
      <MastheadFigures settings={BLANK_DRAWING.settings} commands={onlooker} />
    </SolutionProvider>,
  );
  await screen.findByText('surely unstable');
  expect(screen.queryByRole('group', { name: 'Operating points' })).toBeNull();
});
