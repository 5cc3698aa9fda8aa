import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { FetPart, ProcessSet } from '#shared/circuit/circuit-file';
import { emptyChannel, evaluateChannel } from '#shared/device/channel';
import { type FetModel, fetModel } from '#shared/device/fet-model';
import { emptySquareLaw, squareLaw } from '#shared/device/square-law';
import { thermalVoltage } from '#shared/device/thermal-voltage';

const plain: FetModel = {
  sign: 1,
  kn: 1e-3,
  threshold: 1,
  lambda: 0,
  gamma: 0,
  surfacePotential: 0.7,
  bodyTied: true,
};

function lawOf(model: FetModel, vgs: number, vds: number, vsb = 0) {
  const out = emptySquareLaw();
  squareLaw(model, vgs, vds, vsb, out);
  return out;
}

function channelOf(model: FetModel, drain: number, gate: number, source: number, body: number) {
  const out = emptyChannel();
  evaluateChannel(model, drain, gate, source, body, out);
  return out;
}

const models = fc.record({
  sign: fc.constantFrom<1 | -1>(1, -1),
  kn: fc.double({ min: 1e-6, max: 1, noNaN: true }),
  threshold: fc.double({ min: -1, max: 1.5, noNaN: true }),
  lambda: fc.double({ min: 0, max: 0.3, noNaN: true }),
  gamma: fc.double({ min: 0, max: 0.9, noNaN: true }),
  surfacePotential: fc.double({ min: 0.5, max: 0.9, noNaN: true }),
  bodyTied: fc.boolean(),
});
const volts = fc.double({ min: -4, max: 4, noNaN: true });
const terminals = fc.tuple(volts, volts, volts, volts);

describe('the square law', () => {
  // Sedra and Smith, Microelectronic Circuits, the n-channel i–v relations (from memory): kn = 1 mA/V², Vt = 1 V.
  test.each([
    ['off at and below threshold', 1, 3, 0],
    ['triode: kn·(2·0.5 − 0.5²/2) = 0.875 mA', 3, 0.5, 0.875e-3],
    ['at the edge: ½·kn·2² = 2 mA', 3, 2, 2e-3],
    ['saturated: the same 2 mA at any VDS', 3, 5, 2e-3],
  ])('gives the closed form: %s', (_, vgs, vds, id) => {
    expect(lawOf(plain, vgs, vds).id).toBeCloseTo(id, 15);
  });

  test('raises the threshold by γ·(√(2φF + VSB) − √2φF) and clips the root at zero', () => {
    const body = { ...plain, gamma: 0.4, surfacePotential: 0.64, bodyTied: false };
    expect(lawOf(body, 3, 1, 0.8).vt).toBeCloseTo(1 + 0.4 * (1.2 - 0.8), 15);
    expect(lawOf(body, 3, 1, -2)).toMatchObject({ vt: 1 - 0.4 * 0.8, gmb: 0 });
  });

  test('is continuous in current and slope across VDS = VOV, with modulation in both regions', () => {
    const model = { ...plain, lambda: 0.1 };
    const below = lawOf(model, 2, 1 - 1e-12);
    const above = lawOf(model, 2, 1);
    for (const quantity of ['id', 'gm', 'gds'] as const) {
      expect(Math.abs(below[quantity] - above[quantity])).toBeLessThan(1e-14);
    }
    expect(above.gds).toBeCloseTo(0.1 * 0.5e-3, 15);
  });
});

describe('a channel between its terminals', () => {
  test('has the slopes that central differences give, in every region, polarity and direction', () => {
    const step = 1e-6;
    fc.assert(
      fc.property(models, terminals, (model, at) => {
        const gap = channelOf(model, ...at);
        const root = model.surfacePotential + gap.vsb;
        // Differences mean nothing across a kink: the clipped root, either region's edge, the two ends changing places.
        fc.pre(Math.abs(root) > 0.05 && Math.abs(gap.law.vov) > 0.01 && gap.vds > 0.01);
        fc.pre(Math.abs(gap.vds - gap.law.vov) > 0.01);
        // A tied body moves with the labelled source, which evaluateChannel leaves to VSB = 0.
        const slopes = [gap.byDrain, gap.byGate, gap.bySource, gap.byBody];
        slopes.forEach((slope, terminal) => {
          const shifted = (by: number) =>
            channelOf(model, ...(at.map((v, i) => (i === terminal ? v + by : v)) as typeof at)).current;
          const difference = (shifted(step) - shifted(-step)) / (2 * step);
          expect(Math.abs(slope - difference)).toBeLessThan(1e-6 * model.kn * (10 + Math.abs(slope / model.kn)));
        });
      }),
      { seed: 3, numRuns: 500 },
    );
  });

  test('carries the opposite current when drain and source change places', () => {
    fc.assert(
      fc.property(models, terminals, (model, [drain, gate, source, body]) => {
        const forward = channelOf(model, drain, gate, source, body);
        const swapped = channelOf(model, source, gate, drain, body);
        expect(swapped.current + 0).toBe(-forward.current + 0);
        expect(swapped.byDrain + 0).toBe(-forward.bySource + 0);
      }),
      { seed: 4 },
    );
  });

  test('of a P device is the N one with every voltage and current negated', () => {
    fc.assert(
      fc.property(models, terminals, (model, [drain, gate, source, body]) => {
        const n = channelOf({ ...model, sign: 1 }, drain, gate, source, body);
        const p = channelOf({ ...model, sign: -1 }, -drain, -gate, -source, -body);
        expect(p.current + 0).toBe(-n.current + 0);
        expect([p.byDrain, p.byGate, p.bySource, p.byBody]).toEqual([n.byDrain, n.byGate, n.bySource, n.byBody]);
      }),
      { seed: 5 },
    );
  });

  test('depends on nothing but differences of its voltages', () => {
    const model = { ...plain, gamma: 0.4, bodyTied: false, lambda: 0.05 };
    expect(channelOf(model, 2, 2.5, 0.5, 0).current).toBe(channelOf(model, 10, 10.5, 8.5, 8).current);
  });
});

describe('the parameters of a part', () => {
  const processes: Record<string, ProcessSet> = {
    own: {
      referenceTemperature: 25,
      nfet: {
        kPrime: 2e-4,
        threshold: 0.5,
        lambda: 0.03,
        earlyVoltagePerLength: 1e7,
        thresholdTempco: 2e-3,
        mobilityExponent: 1.5,
      },
      pfet: { kPrime: 8e-5, threshold: -0.6, thresholdTempco: 2e-3 },
    },
  };
  const part = (more: Partial<FetPart>): FetPart => ({
    ref: 'Q1',
    kind: 'nfet',
    drain: 'd',
    gate: 'g',
    source: 's',
    process: 'own',
    ...more,
  });
  const sized = { width: 1e-5, length: 2e-6 };

  test.each<[string, Partial<FetPart>, number]>([
    ['the early voltage, with a length', sized, 1 / (1e7 * 2e-6)],
    ['the process’s lambda, without one', { k: 1e-3 }, 0.03],
    ['an overridden lambda before the process’s early voltage', { ...sized, overrides: { lambda: 0.2 } }, 0.2],
    [
      'an overridden early voltage before an overridden lambda',
      { ...sized, overrides: { lambda: 0.2, earlyVoltagePerLength: 5e6 } },
      0.1,
    ],
    [
      'an overridden lambda where the overridden early voltage has no length',
      { k: 1, overrides: { lambda: 0.2, earlyVoltagePerLength: 5e6 } },
      0.2,
    ],
  ])('take λ from %s', (_, more, lambda) => {
    expect(fetModel(part(more), processes, 25).lambda).toBeCloseTo(lambda, 12);
  });

  test('count parallel devices, and follow temperature: Vt falls for N and rises for P, mobility scales a part’s own k too', () => {
    const hot = fetModel(part({ k: 1e-3, count: 3 }), processes, 125);
    expect(hot.kn).toBeCloseTo(3e-3 * (398.15 / 298.15) ** -1.5, 15);
    expect(hot.threshold).toBeCloseTo(0.3, 12);
    // Vt(T) = −0.6 + 0.2 = −0.4 V, which is 0.4 V in the N frame.
    expect(fetModel(part({ kind: 'pfet', ...sized }), processes, 125)).toMatchObject({
      kn: expect.closeTo(4e-4, 15),
      threshold: expect.closeTo(0.4, 12),
    });
  });
});

test('kT/q is that of the exact constants (CODATA 2018)', () => {
  expect(thermalVoltage(27)).toBeCloseTo(25.864926e-3, 9);
  expect(thermalVoltage(25)).toBeCloseTo(25.692579e-3, 9);
});
