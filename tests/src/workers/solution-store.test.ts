import { expect, test, vi } from 'vitest';
import { operatingPoint } from '#shared/analyses/operating-point';
import type { OperatingPointRecord } from '#shared/analyses/operating-point-record';
import type { CircuitFile } from '#shared/circuit/circuit-file';
import { createSolutionStore } from '../../../src/workers/solution-store';
import type { Solver } from '../../../src/workers/solver-client';

/** A divider whose middle lies at half of `volts`. */
function divider(volts: number): CircuitFile {
  return {
    format: 'stillpoint.circuit',
    version: 1,
    ground: 'gnd',
    parts: [
      { ref: 'V1', kind: 'voltage', plus: 'top', minus: 'gnd', voltage: volts },
      { ref: 'R1', kind: 'resistor', a: 'top', b: 'middle', resistance: 1000 },
      { ref: 'R2', kind: 'resistor', a: 'middle', b: 'gnd', resistance: 1000 },
    ],
  };
}

/** Solvers that answer, or die, only when told to. */
function heldSolvers() {
  const asked: { circuit: CircuitFile; answer: () => void; die: (why: string) => void }[] = [];
  const stopped = vi.fn();
  const start = vi.fn(
    (): Solver => ({
      firstPoint: (circuit) =>
        new Promise<OperatingPointRecord>((resolve, reject) => {
          asked.push({
            circuit,
            answer: () => resolve(operatingPoint(circuit)),
            die: (why) => reject(new Error(why)),
          });
        }),
      searchedPoint: async () => undefined,
      loadLine: () => new Promise(() => undefined),
      stop: stopped,
    }),
  );
  return { asked, start, stopped };
}

test('only the newest of the circuits that waited is solved, and an answer to an older one is never shown', async () => {
  const { asked, start } = heldSolvers();
  const store = createSolutionStore(start);
  const shown = new Set<number>();
  store.subscribe(() => {
    const { solution } = store.latest();
    if (solution.state === 'current') shown.add(solution.record.nets.middle ?? Number.NaN);
  });
  for (const volts of [1, 2, 3]) store.submit(divider(volts));
  expect(asked).toHaveLength(1);
  asked[0]?.answer();
  await vi.waitFor(() => expect(asked).toHaveLength(2));
  expect([...shown]).toEqual([]);
  expect(asked[1]?.circuit).toEqual(divider(3));
  asked[1]?.answer();
  await vi.waitFor(() => expect([...shown]).toEqual([1.5]));
});

test('figures are outdated from the moment of a change until its own answer comes', async () => {
  const { asked, start } = heldSolvers();
  const store = createSolutionStore(start);
  store.submit(divider(1));
  expect(store.latest().solution).toEqual({ state: 'pending' });
  asked[0]?.answer();
  await vi.waitFor(() => expect(store.latest().solution.state).toBe('current'));
  store.submit(divider(2));
  expect(store.latest().solution).toMatchObject({ state: 'outdated', record: { nets: { middle: 0.5 } } });
  asked[1]?.answer();
  await vi.waitFor(() => expect(store.latest().solution).toMatchObject({ state: 'current' }));
});

test('a solver that dies is told of with what to do, and the next change starts another', async () => {
  const { asked, start, stopped } = heldSolvers();
  const store = createSolutionStore(start);
  store.submit(divider(1));
  asked[0]?.die('out of memory');
  await vi.waitFor(() => expect(store.latest().solution.state).toBe('failed'));
  expect(store.latest().solution).toMatchObject({ reason: expect.stringContaining('out of memory') });
  expect(store.latest().solution).toMatchObject({ reason: expect.stringContaining('Change any value') });
  expect(stopped).toHaveBeenCalledOnce();
  store.submit(divider(2));
  expect(start).toHaveBeenCalledTimes(2);
  asked[1]?.answer();
  await vi.waitFor(() => expect(store.latest().solution).toMatchObject({ state: 'current' }));
});

test('a solver that cannot even be started fails in the same way', async () => {
  const store = createSolutionStore(() => {
    throw new Error('no threads here');
  });
  store.submit(divider(1));
  await vi.waitFor(() => expect(store.latest().solution).toMatchObject({ state: 'failed' }));
});

test('after closing, a late answer changes nothing', async () => {
  const { asked, start, stopped } = heldSolvers();
  const store = createSolutionStore(start);
  store.submit(divider(1));
  store.close();
  expect(stopped).toHaveBeenCalledOnce();
  const before = store.latest();
  asked[0]?.answer();
  await Promise.resolve();
  await Promise.resolve();
  expect(store.latest()).toBe(before);
});
