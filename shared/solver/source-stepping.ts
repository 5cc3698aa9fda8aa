import type { Equations } from './equations';
import { type NewtonResult, newton } from './newton';

const MOST_STAGES = 120;
const LEAST_CHANGE = 1e-5;

/** Source stepping: every source raised together from zero, where all nets are at 0 V, each solution the start of the next. */
export function stepSources(equations: Equations, x: Float64Array, leakage: number): NewtonResult {
  let iterations = 0;
  let supply = 0;
  let change = 0.1;
  x.fill(0);
  const kept = x.slice();
  for (let stage = 0; stage < MOST_STAGES && change >= LEAST_CHANGE; stage++) {
    const next = Math.min(1, supply + change);
    const result = newton(equations, x, { leakage, supply: next }, 25);
    iterations += result.iterations;
    if (result.status === 'converged') {
      if (next === 1) return { status: 'converged', iterations };
      supply = next;
      kept.set(x);
      change *= 2;
    } else {
      x.set(kept);
      change /= 4;
    }
  }
  return { status: 'not-converged', iterations };
}
