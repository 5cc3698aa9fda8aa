// @vitest-environment jsdom
import { cleanup, render, screen } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { afterEach, expect, test, vi } from 'vitest';
import { operatingPoint } from '#shared/analyses/operating-point';
import type { CircuitFile, FetPart } from '#shared/circuit/circuit-file';
import { BLANK_DRAWING } from '#shared/starters/starters';
import { MastheadFigures } from '../../../src/features/masthead/masthead-figures';
import { sheetSummary } from '../../../src/features/masthead/sheet-summary';
import type { SheetCommands } from '../../../src/live/sheet-commands';
import { SolutionProvider } from '../../../src/workers/solution';
import { solverHere } from '../../support/solvers';

afterEach(cleanup);

/** Devices fed straight from a source: VDS is the supply, VOV 0.3 V, each by its own intent. */
function devices(supply: number, intents: readonly FetPart['intent'][]): CircuitFile {
  const fets = intents.map((intent, index): FetPart => {
    const terminals = { drain: 'vdd', gate: 'in', source: 'gnd' };
    const size = { k: 1e-3, overrides: { threshold: 0.5 } };
    return { ref: `Q${index + 1}`, kind: 'nfet', ...terminals, ...size, ...(intent ? { intent } : {}) };
  });
  return {
    format: 'stillpoint.circuit',
    version: 1,
    ground: 'gnd',
    parts: [
      { ref: 'V1', kind: 'voltage', plus: 'vdd', minus: 'gnd', voltage: supply },
      { ref: 'V2', kind: 'voltage', plus: 'in', minus: 'gnd', voltage: 0.8 },
      ...fets,
    ],
  };
}

function open(circuit: CircuitFile) {
  const setTemperature = vi.fn();
  const commands = { canEdit: true, setTemperature } as unknown as SheetCommands;
  render(
    <SolutionProvider circuit={circuit} start={solverHere}>
      <MastheadFigures settings={BLANK_DRAWING.settings} commands={commands} />
    </SolutionProvider>,
  );
  return { setTemperature, user: userEvent.setup() };
}

test('verdicts are counted; current is what the supplies deliver, power what all sources do', async () => {
  const saturated = (margin: number) => ({ region: 'saturated', margin }) as const;
  open(devices(1.8, [saturated(0.1), saturated(1), saturated(2), { region: 'triode' }, undefined]));
  const verdicts = await screen.findByRole('list', { name: 'Verdicts' });
  // 1.8 V across a knee of 0.3 V leaves a margin of 1.5 V.
  expect(verdicts.textContent).toBe('2 met1 thin1 missed');
  // Five devices of ½·1 mA/V²·(0.3 V)² = 45 µA at 1.8 V.
  expect(screen.getByTitle(/the voltage sources deliver/).textContent).toMatch(/225\u00a0µA.*405\u00a0µW/);
});

test('a source that takes current in adds nothing to the supply current, and its power is taken off', () => {
  const circuit: CircuitFile = {
    format: 'stillpoint.circuit',
    version: 1,
    ground: 'gnd',
    parts: [
      { ref: 'V1', kind: 'voltage', plus: 'high', minus: 'gnd', voltage: 3 },
      { ref: 'V2', kind: 'voltage', plus: 'low', minus: 'gnd', voltage: 1 },
      { ref: 'V3', kind: 'voltage', plus: 'below', minus: 'gnd', voltage: -1 },
      { ref: 'R1', kind: 'resistor', a: 'high', b: 'low', resistance: 1e3 },
      { ref: 'R2', kind: 'resistor', a: 'gnd', b: 'below', resistance: 1e3 },
    ],
  };
  const { current, power } = sheetSummary(circuit, operatingPoint(circuit));
  // 2 mA out of V1 and into V2; 1 mA out of V3's minus. 6 mW and 1 mW less the 2 mW that V2 takes in.
  expect(current).toBeCloseTo(3e-3, 12);
  expect(power).toBeCloseTo(5e-3, 12);
});

test('a hazardous voltage is told in the masthead, with who decides about it', async () => {
  const { user } = open(devices(70, [undefined]));
  await user.click(await screen.findByRole('button', { name: 'over 60 V' }));
  expect((await screen.findByRole('dialog')).textContent).toMatch(/vdd.*hazardous.*a qualified person decide/s);
});

test('a circuit that cannot be solved is said to be so, with every message behind it', async () => {
  const wrong = devices(1.8, [undefined]);
  const { user } = open({ ...wrong, parts: wrong.parts.filter(({ ref }) => ref !== 'V2') });
  await user.click(await screen.findByRole('button', { name: 'not solved: in floats' }));
  expect((await screen.findByRole('dialog')).textContent).toContain('no path for direct current to ground');
});

test('the temperature is read in °C, and none at or below absolute zero is taken', async () => {
  const { setTemperature, user } = open(devices(1.8, [undefined]));
  const field = screen.getByLabelText<HTMLInputElement>('Temperature');
  await user.clear(field);
  await user.type(field, '-300{Enter}');
  expect(screen.getByRole('alert').textContent).toContain('Absolute zero');
  await user.clear(field);
  await user.type(field, '-40{Enter}');
  expect(setTemperature.mock.calls).toEqual([[-40]]);
});
