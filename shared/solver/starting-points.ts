import type { Equations } from './equations';
import { SEARCH_LEAKAGE } from './polish';

/** V, the overdrive that every channel is given in the linear circuit a start is computed from. */
const ASSUMED_OVERDRIVE = 0.5;

/** How strongly N and P channels conduct in the linear circuit: evenly first, then each pulling the nets its own way. */
const BIASES = [
  { n: 1, p: 1 },
  { n: 30, p: 1 / 30 },
  { n: 1 / 30, p: 30 },
] as const;

/**
 * Starts for Newton's method, in the order they are tried: all channels on (as resistors, so the circuit is linear), which
 * lets self-biased circuits begin where they carry current; the same leaning to either side; and all nets at 0 V.
 */
export function startingPoints(equations: Equations): Float64Array[] {
  return [...BIASES.map((bias) => allChannelsOn(equations, bias)), new Float64Array(equations.size)];
}

function allChannelsOn(equations: Equations, bias: { n: number; p: number }): Float64Array {
  const { jacobian, lu, size } = equations;
  const x = new Float64Array(size);
  equations.evaluateLinear(x, SEARCH_LEAKAGE, ({ sign, kn }) => kn * ASSUMED_OVERDRIVE * (sign > 0 ? bias.n : bias.p));
  if (size === 0 || !lu.factor(jacobian)) return x;
  const step = equations.residual.map((sum) => -sum);
  lu.solve(step);
  return step.every(Number.isFinite) ? step : x;
}
