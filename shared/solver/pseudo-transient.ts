import type { Equations } from './equations';
import { type NewtonResult, newton } from './newton';

const MOST_STEPS = 400;
/** S on every net at the first step: heavier than any device here, so the first steps follow the flow. */
const FIRST_INERTIA = 1e-2;
const LIGHTEST_INERTIA = 1e-14;
const HEAVIEST_INERTIA = 1e6;

/**
 * Pseudo-transient continuation (Kelley and Keyes, SIAM J. Numer. Anal. 35, 1998, from memory): equal capacitances on
 * every net and implicit Euler steps that grow as the residual falls (switched evolution relaxation). It follows the
 * flow of a circuit that was let go at `x`, so it comes to rest at a stable point where Newton's method alone circles.
 */
export function settleInPseudoTime(
  equations: Equations,
  x: Float64Array,
  leakage: number,
  firstInertia = FIRST_INERTIA,
): NewtonResult {
  const from = x.slice();
  let conductance = firstInertia;
  let iterations = 0;
  let before = Number.POSITIVE_INFINITY;
  for (let step = 0; step < MOST_STEPS; step++) {
    const result = newton(equations, x, { leakage, supply: 1, inertia: { conductance, from } }, 12);
    iterations += result.iterations;
    if (result.status !== 'converged') {
      x.set(from);
      conductance *= 8;
      if (conductance > HEAVIEST_INERTIA) break;
      continue;
    }
    equations.evaluate(x, { leakage, supply: 1 });
    const after = largest(equations.residual);
    from.set(x);
    const fall = before / after;
    conductance /= Number.isFinite(fall) ? Math.min(8, Math.max(1.5, fall)) : 2;
    before = after;
    if (after === 0 || conductance < LIGHTEST_INERTIA || step % 8 === 7) {
      const rest = newton(equations, x, { leakage, supply: 1 }, 12);
      iterations += rest.iterations;
      if (rest.status === 'converged' && isNear(x, from)) return { status: 'converged', iterations };
      x.set(from);
      if (conductance < LIGHTEST_INERTIA) break;
    }
  }
  return { status: 'not-converged', iterations };
}

function largest(list: Float64Array): number {
  let most = 0;
  for (const value of list) most = Math.max(most, Math.abs(value));
  return most;
}

/** Newton's method may finish the flow, but not leap from it to a far point that the flow would have left. */
function isNear(x: Float64Array, from: Float64Array): boolean {
  return x.every((value, i) => Math.abs(value - (from[i] ?? 0)) < 0.05 + 0.05 * Math.abs(value));
}
