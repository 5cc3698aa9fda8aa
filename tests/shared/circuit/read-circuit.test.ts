import { describe, expect, test } from 'vitest';
import { readCircuit } from '#shared/circuit/read-circuit';

const supply = { ref: 'V1', kind: 'voltage', plus: 'vdd', minus: 'gnd', voltage: 1.8 };
const load = { ref: 'R1', kind: 'resistor', a: 'vdd', b: 'd', resistance: 1e4 };
const device = {
  ref: 'Q1',
  kind: 'nfet',
  drain: 'd',
  gate: 'vdd',
  source: 'gnd',
  process: 'own',
  width: 1e-5,
  length: 1e-6,
};
const whole = {
  format: 'stillpoint.circuit',
  version: 1,
  ground: 'gnd',
  processes: { own: { nfet: { kPrime: 2e-4, threshold: 0.5 } } },
  parts: [supply, load, device],
};

function problemsOf(input: unknown): string[] {
  const read = readCircuit(input);
  const problems = read.ok ? read.warnings : read.problems;
  return problems.map(({ code, refs, nets }) => `${code} ${refs.join(',')} ${nets.join(',')}`.trim());
}

const withParts = (...parts: unknown[]) => ({ ...whole, parts });

describe('a circuit file', () => {
  test('that is right is read, with the default temperature', () => {
    expect(readCircuit(whole)).toMatchObject({ ok: true, circuit: { temperature: 27, ground: 'gnd' }, warnings: [] });
    expect(readCircuit({ ...whole, drawing: { anything: [1] }, title: 'Stage' }).ok).toBe(true);
  });

  test.each<[string, unknown, string[]]>([
    ['is no object', 'text', ['bad-value']],
    ['has another format', { ...whole, format: 'other' }, ['bad-value']],
    ['has another version', { ...whole, version: 2 }, ['bad-value']],
    ['names a ground that is no net name', { ...whole, ground: 'g nd' }, ['bad-value  g nd']],
    ['is colder than absolute zero', { ...whole, temperature: -273.15 }, ['bad-value']],
    ['holds no list of parts', { ...whole, parts: {} }, ['bad-value']],
    ['has a field of its own', { ...whole, author: 'x' }, ['unknown-field']],
    ['spreads a share of 1', { ...whole, spread: { kPrime: 1 } }, ['bad-value']],
    ['spreads no temperature', { ...whole, spread: { temperatures: [] } }, ['bad-value']],
    ['spreads a supply that is none', { ...whole, spread: { supplies: { R1: 0.1 } } }, ['bad-value R1']],
    ['touches ground nowhere', { ...whole, ground: 'earth' }, ['no-ground  earth']],
    ['has no part', withParts(), ['no-ground  gnd']],
    ['has a part without a kind', withParts(supply, load, device, { ref: 'X1' }), ['bad-value X1']],
    ['has a part of another kind', withParts(supply, load, device, { ref: 'X1', kind: 'diode' }), ['bad-value X1']],
    ['has a part that is no object', withParts(supply, load, device, 3), ['bad-value']],
    ['has a bad ref', withParts(supply, { ...load, ref: '1R' }, device), ['bad-value 1R']],
    [
      'has a ref that is too long',
      withParts(supply, { ...load, ref: 'R1234567890123456' }, device),
      ['bad-value R1234567890123456'],
    ],
    ['has a bad net name', withParts(supply, load, { ...device, drain: 'd!' }), ['bad-value Q1 d!']],
    ['has a text for a number', withParts(supply, { ...load, resistance: '10k' }, device), ['bad-value R1']],
    [
      'has a number that is not finite',
      withParts({ ...supply, voltage: Number.POSITIVE_INFINITY }, load, device),
      ['bad-value V1'],
    ],
    ['has a count of half', withParts(supply, load, { ...device, count: 1.5 }), ['bad-value Q1']],
    ['has k and a width', withParts(supply, load, { ...device, length: undefined, k: 1e-3 }), ['bad-value Q1']],
    ['has a width alone', withParts(supply, load, { ...device, length: undefined }), ['bad-value Q1']],
    ['has no size', withParts(supply, load, { ...device, width: undefined, length: undefined }), ['bad-value Q1']],
    ['names no process and no threshold', withParts(supply, load, { ...device, process: undefined }), ['bad-value Q1']],
    [
      'names a process that is not there',
      withParts(supply, load, { ...device, process: 'other' }),
      ['unknown-process Q1'],
    ],
    [
      'names a process by an inherited name',
      withParts(supply, load, { ...device, process: 'toString' }),
      ['unknown-process Q1'],
    ],
    [
      'names a process without the polarity',
      withParts(supply, load, { ...device, kind: 'pfet' }),
      ['unknown-process Q1'],
    ],
    [
      'overrides what a process alone has',
      withParts(supply, load, { ...device, overrides: { referenceTemperature: 25 } }),
      ['unknown-field Q1'],
    ],
    [
      'has a negative margin',
      withParts(supply, load, { ...device, intent: { region: 'off', margin: -1 } }),
      ['bad-value Q1'],
    ],
    ['has two parts of one ref', withParts(supply, load, { ...load, b: 'gnd' }, device), ['duplicate-ref R1']],
    [
      'has a net that only a gate and a capacitor reach',
      withParts(
        supply,
        load,
        { ...device, gate: 'g' },
        { ref: 'C1', kind: 'capacitor', a: 'g', b: 'gnd', capacitance: 1e-9 },
      ),
      ['floating-net C1,Q1 g'],
    ],
    [
      'forces a current into a net without a way out',
      withParts(
        supply,
        load,
        { ...device, gate: 'g' },
        { ref: 'I1', kind: 'current', from: 'vdd', to: 'g', current: 1e-6 },
      ),
      ['current-cutset I1 g'],
    ],
    [
      'shorts a source with itself',
      withParts(supply, load, device, { ref: 'V2', kind: 'voltage', plus: 'd', minus: 'd', voltage: 0 }),
      ['voltage-loop V2 d'],
    ],
    [
      'has a ring of a source and two inductors',
      withParts(
        supply,
        load,
        device,
        { ref: 'L1', kind: 'inductor', a: 'vdd', b: 'm', inductance: 1e-6 },
        { ref: 'L2', kind: 'inductor', a: 'm', b: 'gnd', inductance: 1e-6 },
      ),
      ['voltage-loop V1,L2,L1 vdd,gnd,m'],
    ],
  ])('that %s is refused by name', (_, input, expected) => {
    expect(readCircuit(JSON.parse(JSON.stringify(input, keepInfinity).replaceAll('"∞"', '1e999'))).ok).toBe(false);
    expect(problemsOf(JSON.parse(JSON.stringify(input, keepInfinity).replaceAll('"∞"', '1e999')))).toEqual(expected);
  });

  test('tells every problem at once, errors before warnings', () => {
    expect(
      problemsOf({
        ...whole,
        ground: 'earth',
        extra: 1,
        parts: [
          { ...supply, colour: 'red' },
          load,
          { ...load, b: 'tip' },
          { ...device, process: 'other', count: 0, legs: 4 },
        ],
      }),
    ).toEqual([
      'unknown-field',
      'unknown-field V1',
      'bad-value Q1',
      'unknown-field Q1',
      'unknown-process Q1',
      'duplicate-ref R1',
      'no-ground  earth',
      'dangling-terminal R1 tip',
    ]);
  });

  test('is not said to float where a part that could not be read may reach', () => {
    expect(problemsOf(withParts(supply, { ...load, b: 5 }, device))).toEqual(['bad-value R1']);
  });

  test('that leaves a terminal alone on its net is read with a warning', () => {
    const read = readCircuit(withParts(supply, load, device, { ...load, ref: 'R2', b: 'tip' }));
    expect(read).toMatchObject({ ok: true, warnings: [{ code: 'dangling-terminal', refs: ['R2'], nets: ['tip'] }] });
  });

  test('may call its nets and processes what JavaScript calls its own', () => {
    const text = JSON.stringify({
      ...whole,
      processes: { constructor: whole.processes.own },
      parts: [supply, { ...load, b: '__x__' }, { ...device, drain: '__x__', process: 'constructor' }],
    });
    const read = readCircuit(
      JSON.parse(text.replaceAll('__x__', '__proto__').replaceAll('"constructor"', '"__proto__"')),
    );
    expect(read).toMatchObject({ ok: true, warnings: [] });
    expect(problemsOf(JSON.parse(`{"__proto__":{},${JSON.stringify(whole).slice(1)}`))).toEqual(['unknown-field']);
    expect(({} as Record<string, unknown>).nfet).toBeUndefined();
  });
});

function keepInfinity(_: string, value: unknown): unknown {
  return value === Number.POSITIVE_INFINITY ? '∞' : value;
}
