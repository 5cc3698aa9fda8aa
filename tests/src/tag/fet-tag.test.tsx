// @vitest-environment jsdom
import { cleanup, render, screen, within } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { operatingPoint } from '#shared/analyses/operating-point';
import { type Drawing, type DrawnPart, isComponent, isFet } from '#shared/circuit/drawing';
import { netlist } from '#shared/circuit/netlist';
import { STARTERS } from '#shared/starters/starters';
import { formatValue } from '#shared/units/format-value';
import { FetTag } from '../../../src/features/tag/fet-tag';
import { NetVoltage } from '../../../src/features/tag/net-voltage';
import { PartProblem } from '../../../src/features/tag/part-problem';
import { SolutionAnnouncer } from '../../../src/features/tag/solution-announcer';
import { formatVoltage } from '../../../src/formats/figures';
import { SolutionProvider } from '../../../src/workers/solution';
import type { Solver } from '../../../src/workers/solver-client';
import { solverHere, solverThatStalls } from '../../support/solvers';

beforeEach(() => {
  // What the hover card asks of a browser and jsdom lacks.
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

function starter(id: string): Drawing {
  const found = STARTERS.find((candidate) => candidate.id === id);
  if (!found) throw new Error(`no starter ${id}`);
  return found.drawing;
}

/** The drawing with some parts' values replaced, by reference. */
function withValues(drawing: Drawing, values: Readonly<Record<string, object>>): Drawing {
  const parts = drawing.parts.map((part) =>
    isComponent(part) && values[part.ref]
      ? ({ ...part, values: { ...part.values, ...values[part.ref] } } as DrawnPart)
      : part,
  );
  return { ...drawing, parts };
}

/** The drawing without the wires on one terminal of a part. */
function cutOff(drawing: Drawing, ref: string, pin: string): Drawing {
  const part = drawing.parts.find((candidate) => isComponent(candidate) && candidate.ref === ref);
  const wires = drawing.wires.filter(({ from, to }) =>
    [from, to].every((end) => end.part !== part?.id || end.pin !== pin),
  );
  return { ...drawing, wires };
}

const announce = vi.fn();

function Tags({ drawing, start }: { drawing: Drawing; start: () => Solver }) {
  return (
    <SolutionProvider circuit={netlist(drawing).circuit} start={start}>
      {drawing.parts.filter(isComponent).map((part) =>
        isFet(part) ? (
          <FetTag key={part.id} part={part} />
        ) : (
          <section key={part.id} aria-label={part.ref}>
            <PartProblem part={part} />
          </section>
        ),
      )}
      <p data-testid="out">
        <NetVoltage net="out" />
      </p>
      <SolutionAnnouncer announce={announce} />
    </SolutionProvider>
  );
}

const tagOf = (ref: string) => screen.getByRole('figure', { name: `${ref} at the operating point` });

test('a tag and a net show the figures of the record and nothing of their own', async () => {
  const drawing = starter('four-resistor-stage');
  const record = operatingPoint(netlist(drawing).circuit);
  const point = record.fets.Q1;
  if (!point) throw new Error('Q1 has no point');
  render(<Tags drawing={drawing} start={solverHere} />);
  await vi.waitFor(() => expect(tagOf('Q1').getAttribute('aria-busy')).toBe('false'));
  expect(tagOf('Q1').textContent).toContain(point.region);
  expect(tagOf('Q1').textContent).toContain(formatValue(point.id, 'A'));
  expect(within(tagOf('Q1')).getByRole('img').getAttribute('aria-label')).toContain('100\u00a0mV asked for');
  expect(screen.getByTestId('out').textContent).toBe(formatVoltage(record.nets.out ?? Number.NaN));
});

test('while the circuit cannot be solved, the parts concerned say why, the others that it is not, and no figure stays', async () => {
  const drawing = starter('differential-pair');
  const { rerender } = render(<Tags drawing={drawing} start={solverHere} />);
  await vi.waitFor(() => expect(tagOf('Q1').textContent).toContain('saturated'));
  announce.mockClear();
  // Only two gates and a source that leads nowhere are on vcm then.
  rerender(<Tags drawing={cutOff(drawing, 'V2', 'minus')} start={solverHere} />);
  await vi.waitFor(() => expect(tagOf('Q1').textContent).toBe('not solvedvcm floats'));
  expect(tagOf('Q6').textContent).toBe('not solved');
  expect(screen.getByTestId('out').textContent).toBe('');
  await userEvent.setup().hover(within(tagOf('Q2')).getByRole('button', { name: 'vcm floats' }));
  expect((await screen.findByRole('tooltip')).textContent).toContain('no path for direct current to ground');
  expect(announce).toHaveBeenCalledExactlyOnceWith(expect.stringMatching(/^Could not be solved: Net /));
  announce.mockClear();
  rerender(<Tags drawing={drawing} start={solverHere} />);
  await vi.waitFor(() => expect(announce).toHaveBeenCalledWith('Solved.'));
});

test('an old figure is marked as such from the first moment after a change', async () => {
  const drawing = starter('four-resistor-stage');
  const { rerender } = render(<Tags drawing={drawing} start={solverThatStalls} />);
  await vi.waitFor(() => expect(tagOf('Q1').getAttribute('aria-busy')).toBe('false'));
  const before = tagOf('Q1').textContent;
  rerender(<Tags drawing={withValues(drawing, { R4: { resistance: 4e3 } })} start={solverThatStalls} />);
  expect(tagOf('Q1').getAttribute('aria-busy')).toBe('true');
  expect(tagOf('Q1').textContent).toBe(before);
});

test('a device that changes region is told of by name', async () => {
  const drawing = starter('four-resistor-stage');
  const { rerender } = render(<Tags drawing={drawing} start={solverHere} />);
  await vi.waitFor(() => expect(tagOf('Q1').textContent).toContain('saturated'));
  announce.mockClear();
  rerender(<Tags drawing={withValues(drawing, { R3: { resistance: 20e3 } })} start={solverHere} />);
  await vi.waitFor(() => expect(announce).toHaveBeenCalledExactlyOnceWith('Q1 went to triode.'));
  expect(tagOf('Q1').textContent).toMatch(/triode.*missed by/);
});
