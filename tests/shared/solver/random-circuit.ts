import type { CircuitFile, CircuitPart } from '#shared/circuit/circuit-file';

/** A small generator of our own for repeatable tests: mulberry32 (Tommy Ettinger, public domain, from memory). */
export function seededRandom(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
}

/**
 * A circuit that surely has an operating point, wired at random: every net has a resistor to a rail, so no net can leave
 * the supplies and Brouwer's theorem gives a solution. FETs of both polarities, with body effect, modulation,
 * depletion and bodies of their own; resistors over five decades.
 */
export function randomCircuit(seed: number, fets: number): CircuitFile {
  const random = seededRandom(seed);
  const between = (low: number, high: number): number => low + (high - low) * random();
  const decades = (low: number, high: number): number => low * (high / low) ** random();
  const supply = random() < 0.2 ? between(5, 48) : between(1, 5);
  const nets = Array.from({ length: Math.max(2, Math.round(fets * between(0.5, 1.2))) }, (_, index) => `n${index}`);
  const rails = ['vdd', 'gnd', 'bias'];
  const pick = (from: readonly string[]): string => from[Math.floor(random() * from.length)] ?? 'gnd';
  const any = (): string => pick(random() < 0.25 ? rails : nets);

  const parts: CircuitPart[] = [
    { ref: 'V1', kind: 'voltage', plus: 'vdd', minus: 'gnd', voltage: supply },
    { ref: 'V2', kind: 'voltage', plus: 'bias', minus: 'gnd', voltage: supply * random() },
  ];
  nets.forEach((net, index) => {
    parts.push({ ref: `R${index}`, kind: 'resistor', a: net, b: pick(rails), resistance: decades(1e3, 1e8) });
  });
  for (let index = 0; index < fets; index++) {
    const kind = random() < 0.5 ? 'nfet' : 'pfet';
    const away = kind === 'nfet' ? 1 : -1;
    const depletion = random() < 0.1;
    parts.push({
      ref: `Q${index}`,
      kind,
      drain: any(),
      gate: any(),
      source: any(),
      ...(random() < 0.5 && { body: kind === 'nfet' ? 'gnd' : 'vdd' }),
      k: decades(1e-6, 1e-1),
      overrides: {
        threshold: away * (depletion ? -between(0.2, 1) : between(0.2, 0.9)),
        lambda: random() < 0.2 ? 0 : between(0.005, 0.2),
        gamma: random() < 0.5 ? 0 : between(0.1, 0.8),
      },
    });
  }
  return { format: 'stillpoint.circuit', version: 1, ground: 'gnd', parts };
}
