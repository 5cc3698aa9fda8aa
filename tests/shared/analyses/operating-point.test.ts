import { describe, expect, test } from 'vitest';
import { operatingPoint } from '#shared/analyses/operating-point';
import { operatingPointRecordSchema } from '#shared/analyses/operating-point-record';
import type { CircuitFile } from '#shared/circuit/circuit-file';
import { circuit, I, N, P, R, V } from './parts';

const solve = (...parts: CircuitFile['parts']) => operatingPoint(circuit(...parts));
const codes = (record: ReturnType<typeof operatingPoint>) => record.problems.map(({ code }) => code);

describe('closed forms', () => {
  test('a resistor-loaded stage: out = (VDD − R·I₀)/(1 + λ·R·I₀), I₀ = ½·kn·VOV²', () => {
    const modulated = { overrides: { threshold: 0.5, lambda: 0.05 } };
    const record = solve(
      V('V1', 'vdd', 1.8),
      V('V2', 'in', 0.8),
      R('R1', 'vdd', 'out', 1e4),
      N('Q1', 'out', 'in', 'gnd', modulated),
    );
    expect(record.nets.out).toBeCloseTo(0.9 / 1.045, 12);
    expect(record.fets.Q1).toMatchObject({ region: 'saturated', reversed: false });
    expect(record.sources.V1?.power).toBeCloseTo((record.fets.Q1?.power ?? 0) + (record.resistors.R1?.power ?? 0), 15);
  });

  test('a diode-connected device under a current: VOV = √(2·I/kn)', () => {
    expect(solve(I('I1', 'gnd', 'd', 1e-4), N('Q1', 'd', 'd', 'gnd')).nets.d).toBeCloseTo(0.5 + Math.sqrt(0.1), 12);
  });

  test('a follower: VOV + ½·kn·R·VOV² = VG − Vt', () => {
    const vov = (-1 + Math.sqrt(1 + 4 * 10 * 1.5)) / 20;
    const record = solve(V('V1', 'vdd', 3.3), V('V2', 'in', 2), N('Q1', 'vdd', 'in', 's'), R('R1', 's', 'gnd', 1e4));
    expect(record.fets.Q1?.vov).toBeCloseTo(vov, 12);
  });

  // Gray, Hurst, Lewis and Meyer, Analysis and Design of Analog Integrated Circuits, the large-signal source-coupled pair (from memory):
  // ΔI = ½·kn·Vid·√(4·Itail/kn − Vid²).
  test('a source-coupled pair splits its tail current by ΔI = ½·kn·Vid·√(4·I/kn − Vid²)', () => {
    const vid = 0.1;
    const tail = 2e-4;
    const record = solve(
      V('V1', 'vdd', 3),
      V('V2', 'a', 1.5 + vid / 2),
      V('V3', 'b', 1.5 - vid / 2),
      I('I1', 't', 'gnd', tail),
      N('Q1', 'vdd', 'a', 't'),
      N('Q2', 'vdd', 'b', 't'),
    );
    const difference = (record.fets.Q1?.id ?? 0) - (record.fets.Q2?.id ?? 0);
    expect(difference).toBeCloseTo(1e-3 * vid * Math.sqrt((4 * tail) / 2e-3 - vid ** 2), 14);
  });

  test('a mirror copies with 3·(1 + λ·VDS)/(1 + λ·VGS)', () => {
    const record = solve(
      V('V1', 'vdd', 1.8),
      I('I1', 'vdd', 'g', 5e-5),
      N('Q1', 'g', 'g', 'gnd', { overrides: { threshold: 0.5, lambda: 0.08 } }),
      N('Q2', 'out', 'g', 'gnd', { overrides: { threshold: 0.5, lambda: 0.08 }, count: 3 }),
      R('R1', 'vdd', 'out', 5e3),
    );
    const { g = 0, out = 0 } = record.nets;
    expect(record.fets.Q2?.id).toBeCloseTo((5e-5 * 3 * (1 + 0.08 * out)) / (1 + 0.08 * g), 14);
  });

  test('P devices on a negative supply are the mirror image of N devices', () => {
    const n = solve(
      V('V1', 'vdd', 3),
      V('V2', 'in', 1.1),
      R('R1', 'vdd', 'out', 2e3),
      N('Q1', 'out', 'in', 's'),
      R('R2', 's', 'gnd', 500),
    );
    const p = solve(
      V('V1', 'vdd', -3),
      V('V2', 'in', -1.1),
      R('R1', 'vdd', 'out', 2e3),
      P('Q1', 'out', 'in', 's'),
      R('R2', 's', 'gnd', 500),
    );
    for (const net of ['out', 's']) expect(p.nets[net]).toBeCloseTo(-(n.nets[net] ?? 0), 12);
    for (const figure of ['id', 'gm', 'gds', 'vov', 'saturationMargin'] as const) {
      expect(p.fets.Q1?.[figure]).toBeCloseTo(n.fets.Q1?.[figure] ?? Number.NaN, 12);
    }
    expect(p.fets.Q1?.vgs).toBeCloseTo(-(n.fets.Q1?.vgs ?? 0), 12);
  });

  test('microamperes beside amperes are both exact', () => {
    const record = solve(
      V('V1', 'vdd', 12),
      N('Q1', 'vdd', 'vdd', 'out', { k: 50, overrides: { threshold: 2 } }),
      R('R1', 'out', 'gnd', 1),
      I('I1', 'gnd', 'd', 1e-6),
      N('Q2', 'd', 'd', 'gnd'),
    );
    const vov = (-1 + Math.sqrt(1 + 4 * 25 * 10)) / 50;
    expect(record.fets.Q1?.id).toBeCloseTo(25 * vov ** 2, 10);
    expect(record.nets.d).toBeCloseTo(0.5 + Math.sqrt(1e-3), 12);
  });
});

describe('the record', () => {
  const reversed = solve(
    V('V1', 'vdd', 1.8),
    V('V2', 'in', 0.8),
    R('R1', 'vdd', 'out', 1e3),
    N('Q1', 'gnd', 'in', 'out'),
  );

  test('is what its schema says, names and all', () => {
    expect(operatingPointRecordSchema.safeParse(reversed).success).toBe(true);
    const strange = operatingPoint({
      ...circuit(R('R1', '__proto__', 'gnd', 1e3), I('I1', 'gnd', '__proto__', 1e-3)),
      ground: 'gnd',
    });
    expect(JSON.parse(JSON.stringify(strange)).nets).toEqual(JSON.parse('{"__proto__":1,"gnd":0}'));
    expect(operatingPointRecordSchema.parse(strange).nets).toEqual(strange.nets);
  });

  test('of a reversed device has a negative current, voltages from the effective source and a note', () => {
    expect(reversed.fets.Q1).toMatchObject({ reversed: true, region: 'saturated', vgs: 0.8, vsb: 0 });
    expect(reversed.fets.Q1?.id).toBeCloseTo(-9e-5, 15);
    expect(reversed.fets.Q1?.vds).toBeGreaterThan(0);
    // 1.71 V across a tied body.
    expect(codes(reversed)).toEqual(['reversed-channel', 'body-forward']);
  });

  test('counts a source’s current out of its plus or to terminal, and its power as delivered', () => {
    const { sources } = solve(
      V('V1', 'a', 5),
      R('R1', 'a', 'b', 1e3),
      I('I1', 'b', 'gnd', 2e-3),
      V('V2', 'gnd', -1, 'c'),
      R('R2', 'c', 'gnd', 1e3),
    );
    expect(sources.V1).toEqual({ voltage: 5, current: 0.002, power: 0.01 });
    expect(sources.I1).toEqual({ voltage: -3, current: 0.002, power: -0.006 });
    expect(sources.V2).toEqual({ voltage: -1, current: -0.001, power: 0.001 });
  });

  test('never holds −0', () => {
    expect(JSON.stringify(solve(V('V1', 'a', -0), R('R1', 'a', 'gnd', 1), P('Q1', 'a', 'a', 'gnd')))).not.toContain(
      '-0,',
    );
    expect(Object.is(solve(V('V1', 'a', -0), R('R1', 'gnd', 'a', 1)).resistors.R1?.current, 0)).toBe(true);
  });

  test('of devices exactly on an edge puts them where the contract does', () => {
    const { fets } = solve(
      V('V1', 'd', 0.3),
      V('V2', 'g', 0.8),
      V('V3', 't', 0.5),
      N('Q1', 'd', 'g', 'gnd'),
      N('Q2', 'd', 't', 'gnd'),
    );
    expect(fets.Q1).toMatchObject({ region: 'saturated' });
    expect(fets.Q2).toMatchObject({ region: 'off', id: 0, vdsSat: 0 });
  });

  test('of supplies at zero is all at rest', () => {
    const record = solve(
      V('V1', 'vdd', 0),
      R('R1', 'vdd', 'out', 1e4),
      N('Q1', 'out', 'vdd', 'gnd'),
      P('Q2', 'out', 'vdd', 'vdd'),
    );
    expect(record).toMatchObject({
      status: 'solved',
      nets: { vdd: 0, out: 0 },
      fets: { Q1: { region: 'off', id: 0 } },
    });
  });
});

describe('several points', () => {
  test('of a latch the one reported is a stable one, and the same whatever its parts are called', () => {
    const latch = (a: string, b: string) => [
      V('V1', 'vdd', 1.8),
      N(a, 'x', 'y', 'gnd'),
      P(`${a}p`, 'x', 'y', 'vdd'),
      N(b, 'y', 'x', 'gnd'),
      P(`${b}p`, 'y', 'x', 'vdd'),
    ];
    const record = solve(...latch('Q1', 'Q2'));
    expect(record).toMatchObject({ status: 'solved', surelyUnstable: false, nets: { x: 1.8, y: 0 } });
    expect(solve(...latch('Q9', 'Q2').reverse()).nets).toEqual(record.nets);
  });

  test('of a self-biased reference the one that carries current is reported', () => {
    // Razavi, Design of Analog CMOS Integrated Circuits, supply-independent biasing (from memory): I = 2/(kn·R²)·(1 − 1/√K)².
    const record = solve(
      V('V1', 'vdd', 1.8),
      N('Q1', 'n', 'n', 'gnd', { k: 1e-3 }),
      N('Q2', 'p', 'n', 's', { k: 4e-3 }),
      R('RS', 's', 'gnd', 8e3),
      P('Q3', 'p', 'p', 'vdd'),
      P('Q4', 'n', 'p', 'vdd'),
    );
    expect(record.fets.Q1?.id).toBeCloseTo((2 / (1e-3 * 8e3 ** 2)) * 0.25, 12);
  });
});

describe('nets that leakage alone holds', () => {
  test('lie nearest to 0 among the voltages that keep their devices off', () => {
    const off = solve(V('V1', 'vdd', 1.8), N('Q1', 'vdd', 'gnd', 'x'), N('Q2', 'x', 'gnd', 'gnd'));
    expect(off).toMatchObject({
      status: 'solved',
      nets: { x: 0 },
      fets: { Q1: { region: 'off' }, Q2: { region: 'off' } },
    });
    expect(off.problems).toContainEqual(expect.objectContaining({ code: 'undriven-net', nets: ['x'] }));

    const chain = solve(
      V('V1', 'vdd', 5),
      P('Q1', 'a', 'a', 'vdd'),
      P('Q2', 'b', 'b', 'a'),
      N('Q3', 'b', 'gnd', 'gnd'),
    );
    expect(chain.nets.a).toBeCloseTo(4.5, 9);
    expect(chain.nets.b).toBeCloseTo(4, 9);
    expect(Object.values(chain.fets).map(({ region, id }) => [region, id])).toEqual(Array(3).fill(['off', 0]));
  });

  test('still rule what hangs on them', () => {
    const record = solve(
      V('V1', 'vdd', 5),
      N('Q1', 'g', 'gnd', 'gnd'),
      P('Q2', 'out', 'g', 'vdd'),
      R('R1', 'out', 'gnd', 1e4),
    );
    expect(record.nets.g).toBe(0);
    expect(record.fets.Q2?.region).toBe('triode');
  });
});

describe('circuits without an answer', () => {
  test.each([
    ['a current into a device that is off', circuit(I('I1', 'gnd', 'x', 1e-6), N('Q1', 'x', 'gnd', 'gnd'))],
    [
      'more current than a saturated device takes',
      circuit(V('V1', 'g', 1), I('I1', 'gnd', 'x', 3e-4), N('Q1', 'x', 'g', 'gnd')),
    ],
  ])('are unsolved with the net and its parts named: %s', (_, file) => {
    const record = operatingPoint(file);
    expect(record).toMatchObject({ status: 'unsolved', nets: {}, fets: {} });
    expect(record.problems[0]).toMatchObject({ code: 'no-operating-point', refs: ['I1', 'Q1'], nets: ['x'] });
    expect(record.residual).toBeGreaterThan(1e-7);
  });

  test.each([
    [
      'a current into a saturated device that carries just that',
      circuit(V('V1', 'g', 1), I('I1', 'gnd', 'x', 2.5e-4), N('Q1', 'x', 'g', 'gnd')),
    ],
    ['two equal currents', circuit(I('I1', 'gnd', 'x', 1e-6), I('I2', 'x', 'gnd', 1e-6), N('Q1', 'x', 'gnd', 'gnd'))],
    [
      'two mirrors',
      circuit(
        V('V1', 'vdd', 3),
        I('I1', 'vdd', 'a', 1e-4),
        N('Q1', 'a', 'a', 'gnd'),
        N('Q2', 'b', 'a', 'gnd'),
        P('Q3', 'b', 'b', 'vdd'),
        P('Q4', 'x', 'b', 'vdd'),
        N('Q5', 'x', 'a', 'gnd'),
      ),
    ],
  ])('or with a whole range of them say what opposes what: %s', (_, file) => {
    const record = operatingPoint(file);
    expect(record.status).toBe('unsolved');
    expect(record.problems[0]).toMatchObject({ code: 'no-unique-answer', nets: ['x'] });
    expect(record.problems[0]?.message).toMatch(/resistor/);
  });

  test('are solved by the slightest λ', () => {
    const record = solve(
      V('V1', 'g', 1),
      I('I1', 'gnd', 'x', 2.5e-4),
      N('Q1', 'x', 'g', 'gnd', { overrides: { threshold: 0.5, lambda: 1e-4 } }),
    );
    expect(record.status).toBe('solved');
  });
});

describe('remarks', () => {
  test('on intents: missed in another region, thin with less margin than asked, silent when met to the last microvolt', () => {
    const stage = (intent: NonNullable<ReturnType<typeof N>['intent']>) =>
      codes(solve(V('V1', 'd', 1), V('V2', 'g', 1), N('Q1', 'd', 'g', 'gnd', { intent })));
    expect(stage({ region: 'triode' })).toEqual(['intent-missed']);
    expect(stage({ region: 'saturated', margin: 0.6 })).toEqual(['intent-thin']);
    expect(stage({ region: 'saturated', margin: 0.5 })).toEqual([]);
  });

  test('on where the square law stops: 4·kT/q to either side of the threshold', () => {
    const at = (gate: number) => codes(solve(V('V1', 'd', 1), V('V2', 'g', gate), N('Q1', 'd', 'g', 'gnd')));
    expect([at(0.39), at(0.4), at(0.6), at(0.61)]).toEqual([[], ['nearly-on'], ['weak-overdrive'], []]);
  });

  test('on a body junction more than 0.4 V forward', () => {
    const body = (voltage: number) =>
      codes(solve(V('V1', 'd', 1), V('V2', 'g', 1), V('V3', 'b', voltage), N('Q1', 'd', 'g', 'gnd', { body: 'b' })));
    expect([body(0.39), body(0.41)]).toEqual([[], ['body-forward']]);
  });

  test('on a net that an ideal current source pulls outside the supplies', () => {
    const record = solve(V('V1', 'vdd', 2), R('R1', 'vdd', 'x', 1e3), I('I1', 'x', 'gnd', 5e-3));
    expect(record.problems).toEqual([expect.objectContaining({ code: 'beyond-supplies', nets: ['x'] })]);
    expect(
      codes(solve(V('V1', 'vdd', 2), R('R1', 'vdd', 'x', 1e3), V('V2', 'y', 9, 'x'), R('R2', 'x', 'gnd', 1e3))),
    ).toEqual(['dangling-terminal']);
  });

  test('on more than 60 V from ground, each net, and between two nets, the widest pair once', () => {
    const hazards = (...parts: CircuitFile['parts']) =>
      solve(...parts).problems.flatMap(({ code, nets }) => (code === 'high-voltage' ? [nets] : []));
    expect(hazards(V('V1', 'a', 60), R('R1', 'a', 'gnd', 1e3))).toEqual([]);
    expect(hazards(V('V1', 'a', 61), R('R1', 'a', 'gnd', 1e3))).toEqual([['a']]);
    expect(hazards(V('V1', 'a', 40), V('V2', 'b', -40), R('R1', 'a', 'c', 1e3), R('R2', 'c', 'b', 1))).toEqual([
      ['a', 'b'],
    ]);
  });
});
