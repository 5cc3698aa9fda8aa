import { describe, expect, test } from 'vitest';
import { operatingPoint } from '#shared/analyses/operating-point';
import { standingOf } from '#shared/analyses/verdict';
import { isInvented } from '#shared/circuit/built-in-process';
import { type Drawing, isFet } from '#shared/circuit/drawing';
import { netlist } from '#shared/circuit/netlist';
import { cascodeAmplifier } from '#shared/starters/cascode-amplifier';
import { differentialPair } from '#shared/starters/differential-pair';
import { selfBiasedReference } from '#shared/starters/self-biased-reference';
import { STARTERS } from '#shared/starters/starters';

/** The verdict of every FET and everything but the notes that is said of a drawing. */
function settled(drawing: Drawing) {
  const { circuit, nets } = netlist(drawing);
  const record = operatingPoint(circuit);
  const verdicts = drawing.parts.filter(isFet).map(({ ref, values: { intent } }) => {
    const point = record.fets[ref];
    return [ref, point && intent ? standingOf(point, intent).verdict : undefined];
  });
  return {
    record,
    nets,
    verdicts: Object.fromEntries(verdicts),
    remarks: record.problems.filter(({ severity }) => severity !== 'note').map(({ message }) => message),
  };
}

describe.each(STARTERS)('$name', ({ drawing }) => {
  const { record, nets, verdicts, remarks } = settled(drawing);

  test('is solved, every FET meets its intent, and nothing is left to remark', () => {
    expect(record.status).toBe('solved');
    expect(Object.values(verdicts)).toEqual(drawing.parts.filter(isFet).map(() => 'met'));
    expect(remarks).toEqual([]);
    expect(record.alternatives).toEqual([]);
  });

  test('names each net once and says of every process that its figures are invented', () => {
    expect(nets.namesMeet).toEqual([]);
    for (const { values } of drawing.parts.filter(isFet)) expect(isInvented(values.process ?? '')).toBe(true);
  });

  test('hangs no part in the air and lays every ground and rail at one height', () => {
    const tied = new Set(drawing.wires.flatMap(({ from, to }) => [from.part, to.part]));
    // A name or a supply may sit on a terminal instead of on a wire of its own.
    const loose = drawing.parts.filter(({ id, kind }) => !tied.has(id) && kind !== 'net-name' && kind !== 'supply');
    expect(loose).toEqual([]);
    const used = new Set(
      drawing.parts.filter(({ kind }) => kind === 'net-name' || kind === 'supply').map(({ id }) => id),
    );
    for (const id of used) expect(nets.netOf.get(`${id}/net`)).toBeDefined();
    const foot = Math.max(...drawing.parts.filter(({ kind }) => kind === 'ground').map(({ place }) => place.y));
    for (const { kind, place } of drawing.parts) if (kind !== 'ground') expect(place.y).toBeLessThan(foot);
  });
});

test('the discrete driver gives its FETs by k, and its processes need no other sheet', () => {
  const driver = STARTERS.find(({ id }) => id === 'output-driver')?.drawing;
  const fets = driver?.parts.filter(isFet) ?? [];
  expect(fets).toHaveLength(4);
  for (const { values } of fets) {
    expect(values.k).toBeGreaterThan(0);
    expect(values.width ?? values.length).toBeUndefined();
    expect(driver?.settings.processes).toHaveProperty(values.process ?? 'none');
  }
});

test('a body led out at ground raises the threshold of what stands above it', () => {
  const bodyEffect = (id: string, ref: string) => {
    const starter = STARTERS.find((one) => one.id === id);
    const point = starter && settled(starter.drawing).record.fets[ref];
    return { vsb: point?.vsb ?? 0, vt: point?.vt ?? 0 };
  };
  for (const { vsb, vt } of [bodyEffect('source-follower', 'Q1'), bodyEffect('cascode-amplifier', 'Q2')]) {
    expect(vsb).toBeGreaterThan(0.3);
    // Vt = Vt0 + γ(√(2φF + VSB) − √2φF) with the process's 0.45 V, 0.4 √V and 0.8 V.
    expect(vt).toBeCloseTo(0.45 + 0.4 * (Math.sqrt(0.8 + vsb) - Math.sqrt(0.8)), 9);
  }
});

test('a pair with a narrow tail and a heavy load misses at the tail and is thin at one input', () => {
  const { verdicts, record } = settled(differentialPair({ tailWidth: 5e-6, loadResistance: 120e3, commonMode: 0.8 }));
  expect(verdicts).toEqual({ Q1: 'met', Q2: 'thin', Q3: 'met', Q4: 'met', Q5: 'met', Q6: 'missed' });
  expect(record.fets.Q6?.id).toBeCloseTo(73.5e-6, 7);
  expect(record.nets.tail).toBeCloseTo(0.173, 3);
});

test('a cascode whose gate lies too low leaves the FET under it without headroom', () => {
  expect(settled(cascodeAmplifier({ upperDivider: 120e3 })).verdicts).toEqual({ Q1: 'missed', Q2: 'met' });
});

test('a self-biased reference without its start-up resistor shows the point that carries current, and the other', () => {
  const { verdicts, record } = settled(selfBiasedReference({ withStart: false }));
  expect(new Set(Object.values(verdicts))).toEqual(new Set(['met']));
  expect(record.resistors.R1?.current).toBeGreaterThan(50e-6);
  expect(record.problems.map(({ code }) => code)).toContain('several-operating-points');
  const atRest = record.alternatives.filter(({ fets }) => Object.values(fets).every(({ id }) => Math.abs(id) < 1e-9));
  expect(atRest).toHaveLength(1);
});
