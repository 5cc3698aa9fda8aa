import { describe, expect, test } from 'vitest';
import { isStartUpHazard } from '#shared/analyses/alternatives';
import { firstOperatingPoint, operatingPoint, searchAlternatives } from '#shared/analyses/operating-point';
import type { OperatingPointRecord, Solution } from '#shared/analyses/operating-point-record';
import type { CircuitPart } from '#shared/circuit/circuit-file';
import { KnownTopology } from '#shared/solver/known-topology';
import { MOST_UNKNOWNS_SEARCHED } from '#shared/solver/search';
import { circuit, I, N, P, R, V } from '../analyses/parts';
import { randomCircuit } from './random-circuit';

const modulated = (threshold: number) => ({ overrides: { threshold, lambda: 0.1 } });

function inverter(name: string, input: string, output: string): CircuitPart[] {
  return [N(`N${name}`, output, input, 'gnd', modulated(0.45)), P(`P${name}`, output, input, 'vdd', modulated(-0.45))];
}

/** Self-biased: a mirror of N and one of P feed each other, the N one degenerated. */
function reference(tag: string): CircuitPart[] {
  return [
    N(`Q1${tag}`, `n${tag}`, `n${tag}`, 'gnd'),
    N(`Q2${tag}`, `p${tag}`, `n${tag}`, `s${tag}`, { k: 8e-3 }),
    R(`RS${tag}`, `s${tag}`, 'gnd', 1e3),
    P(`Q3${tag}`, `p${tag}`, `p${tag}`, 'vdd'),
    P(`Q4${tag}`, `n${tag}`, `p${tag}`, 'vdd'),
  ];
}

const points = (record: OperatingPointRecord): Solution[] => [record, ...record.alternatives];

describe('other operating points', { timeout: 60_000 }, () => {
  test('of a self-biased reference: the one at zero current is listed and named as the start-up hazard', () => {
    const record = operatingPoint(circuit(V('V1', 'vdd', 1.8), ...reference('')));
    // By hand, λ = 0: I = 2/(kn·R²)·(1 − 1/√4)².
    expect(record.fets.Q1?.id).toBeCloseTo((2 / (2e-3 * 1e6)) * 0.25, 12);
    expect(record.alternatives).toHaveLength(1);
    const [rest] = record.alternatives;
    for (const { id, region } of Object.values(rest?.fets ?? {})) expect([id, region]).toEqual([0, 'off']);
    expect(rest && isStartUpHazard(record, rest)).toBe(true);
    const problem = record.problems.find(({ code }) => code === 'several-operating-points');
    expect(problem).toMatchObject({ severity: 'warning', refs: ['Q1', 'Q2', 'Q3', 'Q4'] });
    expect(problem?.message).toContain('start-up path');
  });

  test('of a reference that shares its supply with a stage that runs: only the reference may rest', () => {
    const stage = [R('RD', 'vdd', 'd', 1e4), V('VG', 'g', 0.7), N('QA', 'd', 'g', 'gnd')];
    const record = operatingPoint(circuit(V('V1', 'vdd', 1.8), ...stage, ...reference('')));
    const [rest] = record.alternatives;
    expect(record.alternatives).toHaveLength(1);
    expect(rest?.fets.QA?.id).toBeCloseTo(record.fets.QA?.id ?? Number.NaN, 12);
    expect(rest && isStartUpHazard(record, rest)).toBe(true);
    expect(record.problems.find(({ code }) => code === 'several-operating-points')?.refs).not.toContain('QA');
  });

  test('of two references: each may rest by itself', () => {
    const record = operatingPoint(circuit(V('V1', 'vdd', 1.8), ...reference('A'), ...reference('B')));
    const running = points(record).map(({ fets }) => [fets.Q1A, fets.Q1B].map((fet) => (fet?.id ?? 0) > 0));
    expect(running[0]).toEqual([true, true]);
    for (const state of [
      [true, false],
      [false, true],
      [false, false],
    ])
      expect(running).toContainEqual(state);
    expect(running).toHaveLength(4);
  });

  test('of a latch: all three, the stable ones first, and no start-up hazard among them', () => {
    const record = operatingPoint(circuit(V('V1', 'vdd', 1.8), ...inverter('1', 'a', 'b'), ...inverter('2', 'b', 'a')));
    expect(points(record).map(({ nets, surelyUnstable }) => [nets.a, nets.b, surelyUnstable])).toEqual([
      [1.8, 0, false],
      [0, 1.8, false],
      [expect.closeTo(0.9, 9), expect.closeTo(0.9, 9), true],
    ]);
    for (const other of record.alternatives) expect(isStartUpHazard(record, other)).toBe(false);
  });

  test('of a Schmitt trigger made of a resistor around two inverters: three within its hysteresis, one outside', () => {
    const trigger = (input: number) =>
      operatingPoint(
        circuit(
          V('V1', 'vdd', 1.8),
          V('V2', 'in', input),
          R('R1', 'in', 'a', 1e5),
          R('R2', 'out', 'a', 2e5),
          ...inverter('1', 'a', 'b'),
          ...inverter('2', 'b', 'out'),
        ),
      );
    expect(points(trigger(0.9)).map(({ surelyUnstable }) => surelyUnstable)).toEqual([false, false, true]);
    expect(trigger(0.1).alternatives).toEqual([]);
    expect(trigger(1.7).alternatives).toEqual([]);
  });

  test('are none where devices and resistors leave only one: monotone circuits', () => {
    const record = operatingPoint(circuit(V('V1', 'vdd', 3), R('R1', 'vdd', 'd', 1e4), N('Q1', 'd', 'd', 'gnd')));
    expect(record).toMatchObject({ alternatives: [], alternativesSearched: true });
  });

  test('count as one where only an undriven net lies elsewhere', () => {
    const record = operatingPoint(
      circuit(
        V('V1', 'vdd', 3),
        N('Q1', 'vdd', 'gnd', 'x'),
        N('Q2', 'x', 'gnd', 'gnd'),
        I('I1', 'vdd', 'd', 1e-4),
        N('Q3', 'd', 'd', 'gnd'),
      ),
    );
    expect(record.problems.map(({ code }) => code)).toContain('undriven-net');
    expect(record.alternatives).toEqual([]);
  });

  test('are points of the circuit as much as the first: every current cancels', () => {
    for (const seed of [34, 150, 261]) {
      const file = randomCircuit(seed, 12);
      const record = operatingPoint(file);
      expect(record.alternativesSearched, `seed ${seed}`).toBe(true);
      for (const { fets, resistors, sources } of points(record)) {
        const power = (entries: Record<string, { power: number }>) =>
          Object.values(entries).reduce((sum, { power: watts }) => sum + watts, 0);
        expect(Math.abs(power(sources) - power(fets) - power(resistors))).toBeLessThan(1e-9 * power(sources) + 1e-15);
      }
    }
  });
});

describe('the search', { timeout: 60_000 }, () => {
  const latch = circuit(V('V1', 'vdd', 1.8), ...inverter('1', 'a', 'b'), ...inverter('2', 'b', 'a'));

  test('goes on from a first answer that stands by itself, and can be left at any step', () => {
    const first = firstOperatingPoint(latch);
    expect(first.record).toMatchObject({ status: 'solved', alternatives: [], alternativesSearched: false });
    const left = searchAlternatives(first);
    expect(left.next().done).toBe(false);
    left.return(first.record);

    const steps = searchAlternatives(first);
    let step = steps.next();
    while (!step.done) step = steps.next();
    expect(step.value).toEqual(operatingPoint(latch));
    expect(step.value.nets).toEqual(first.record.nets);
  });

  test('is left out above the stated size, and the record says so', () => {
    const chain = Array.from({ length: MOST_UNKNOWNS_SEARCHED + 1 }, (_, index) =>
      R(`R${index}`, index === 0 ? 'vdd' : `x${index}`, `x${index + 1}`, 1e3),
    );
    const record = operatingPoint(circuit(V('V1', 'vdd', 1), ...chain, N('Q1', 'x301', 'x301', 'gnd')));
    expect(record).toMatchObject({ status: 'solved', alternatives: [], alternativesSearched: false });
  });

  test('does not run for what has no first answer', () => {
    const first = firstOperatingPoint({ format: 'other' });
    expect(searchAlternatives(first).next()).toEqual({ done: true, value: first.record });
  });
});

describe('a topology that is kept', () => {
  test('gives the same record bit by bit as one made anew, whatever was solved between', () => {
    const known = new KnownTopology();
    for (const seed of [3, 3, 5, 3]) {
      const file = randomCircuit(seed, 20);
      for (const scale of [1, 1.01, 0.7]) {
        const parts = file.parts.map(
          (part): CircuitPart => (part.kind === 'resistor' ? { ...part, resistance: part.resistance * scale } : part),
        );
        const changed = { ...file, parts };
        expect(firstOperatingPoint(changed, known).record).toEqual(firstOperatingPoint(changed).record);
      }
    }
  });

  test('is made anew when a terminal moves to another net', () => {
    const known = new KnownTopology();
    const wired = (gate: string) =>
      circuit(V('V1', 'vdd', 3), V('V2', 'in', 1), R('R1', 'vdd', 'd', 1e3), N('Q1', 'd', gate, 'gnd'));
    for (const gate of ['in', 'd', 'in']) {
      expect(operatingPoint(wired(gate), known)).toEqual(operatingPoint(wired(gate)));
    }
  });
});
