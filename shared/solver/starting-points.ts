import type { FetModel } from '../device/fet-model';
import type { Equations, LinearFet } from './equations';
import { SEARCH_LEAKAGE } from './polish';

/** V, the overdrive that a channel is given where it stands in as a resistor. */
const RESISTOR_OVERDRIVE = 0.5;
/** Share of its transconductance that a saturated device is given between drain and source, so that no gain is large. */
const SATURATED_SLOPE = 0.1;

/**
 * Starts for Newton's method, in the order they are tried, each the solution of a linear circuit: all devices saturated at an
 * overdrive, where most circuits are meant to be; all channels on as resistors, which too lets self-biased circuits begin
 * where they carry current; the resistors leaning to N and to P; and last all nets at 0 V.
 */
export function* startingPoints(equations: Equations): Generator<Float64Array> {
  yield solveLinear(equations, saturated(0.2));
  yield solveLinear(equations, resistor(1, 1));
  yield solveLinear(equations, saturated(0.6));
  yield solveLinear(equations, resistor(30, 1 / 30));
  yield solveLinear(equations, resistor(1 / 30, 30));
  yield new Float64Array(equations.size);
}

/** Spread starts: how many have every net somewhere within the supplies, and as many more have it at one end or the other. */
const SPREAD = 8;

/**
 * Further starts for a search, a fixed number spread over the range of the supplies; the first is the circuit without its
 * devices, where a self-biased circuit rests before it has started.
 */
export function* spreadStartingPoints(equations: Equations): Generator<Float64Array> {
  yield solveLinear(equations, resistor(0, 0));
  const { groups, groupOf, offset } = equations.network;
  let low = 0;
  let high = 0;
  for (let net = 0; net < groupOf.length; net++) {
    if (groupOf[net] !== -1) continue;
    low = Math.min(low, offset[net] as number);
    high = Math.max(high, offset[net] as number);
  }
  for (let start = 0; start < 2 * SPREAD; start++) {
    yield Float64Array.from(groups, (_, group) => {
      const share = scattered(start, group);
      return low + (high - low) * (start % 2 === 0 ? share : Math.round(share));
    });
  }
}

/** A number from 0 to 1 that looks like chance and is the same on every machine: a hash of two integers. */
function scattered(start: number, group: number): number {
  let hash = Math.imul(start + 1, 0x9e3779b1) ^ Math.imul(group + 1, 0x85ebca6b);
  hash = Math.imul(hash ^ (hash >>> 15), 0x2c1b3c6d);
  hash = Math.imul(hash ^ (hash >>> 12), 0x297a2d39);
  return ((hash ^ (hash >>> 15)) >>> 0) / 2 ** 32;
}

function resistor(n: number, p: number): (model: FetModel) => LinearFet {
  return ({ sign, kn }) => ({ gds: kn * RESISTOR_OVERDRIVE * (sign > 0 ? n : p), gm: 0, offset: 0 });
}

function saturated(overdrive: number): (model: FetModel) => LinearFet {
  return ({ kn, threshold }) => {
    const gm = kn * overdrive;
    return { gds: SATURATED_SLOPE * gm, gm, offset: (gm * overdrive) / 2 - gm * (threshold + overdrive) };
  };
}

function solveLinear(equations: Equations, linearised: (model: FetModel) => LinearFet): Float64Array {
  const { jacobian, lu, size } = equations;
  const x = new Float64Array(size);
  equations.evaluateLinear(x, SEARCH_LEAKAGE, linearised);
  if (size === 0 || !lu.factor(jacobian)) return x;
  const solution = equations.residual.map((sum) => -sum);
  lu.solve(solution);
  return solution.every(Number.isFinite) ? solution : x;
}
