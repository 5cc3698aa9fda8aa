import type { Equations } from './equations';
import { type NewtonResult, newton } from './newton';

const FIRST_LEAKAGE = 1e-2;
const MOST_STAGES = 80;

/**
 * Leakage (conductance) stepping: a leak from every net to ground so large that the circuit is nearly linear, taken
 * away by decades, each solution the start of the next. A stage that fails is tried again with a smaller change.
 */
export function stepLeakage(equations: Equations, x: Float64Array, finalLeakage: number): NewtonResult {
  let iterations = 0;
  let factor = 10;
  let solvedAt = Number.POSITIVE_INFINITY;
  let leakage = FIRST_LEAKAGE;
  const kept = x.slice();
  for (let stage = 0; stage < MOST_STAGES; stage++) {
    const result = newton(equations, x, { leakage, supply: 1 }, 40);
    iterations += result.iterations;
    if (result.status === 'converged') {
      if (leakage <= finalLeakage) return { status: 'converged', iterations };
      kept.set(x);
      solvedAt = leakage;
      factor = Math.min(10, factor * 1.5);
    } else {
      x.set(kept);
      factor = Math.sqrt(factor);
      if (factor < 1.001) break;
    }
    leakage = solvedAt === Number.POSITIVE_INFINITY ? leakage * 10 : Math.max(finalLeakage, solvedAt / factor);
  }
  return { status: 'not-converged', iterations };
}
