import { overdriveOf } from '../device/channel';
import type { Deflation } from './deflation';
import type { Conditions, Equations } from './equations';
import type { NetworkFet } from './network';

export interface NewtonResult {
  readonly status: 'converged' | 'singular' | 'not-converged';
  readonly iterations: number;
}

/** A step is small when it is below 1 nV + 1 ppb, a thousandth of what is promised. */
const STEP_ABSOLUTE = 1e-9;
const STEP_RELATIVE = 1e-9;
/** Armijo's constant: a full step must take this share of the decrease that the linear model promises. */
const SUFFICIENT_DECREASE = 1e-4;
const MOST_HALVINGS = 10;
/** Rises of the residual that are let pass, since a kink of the square law may lie in every short step. */
const MOST_RISES = 6;
/** V by which an overdrive may change in one step, beside its own size. */
const OVERDRIVE_STEP = 0.4;
/** V by which a net may move in one step, beside its own voltage. */
const NET_STEP = 2;

/**
 * Newton's method, damped: the step is cut until no FET's overdrive and no net jumps further than the square law is
 * trusted, then halved until the residual falls (Armijo; Dennis and Schnabel, Numerical Methods for Unconstrained
 * Optimization, 1983, from memory). Each current law is measured against its own conductance, so that nets of
 * microamperes count beside nets of amperes. `x` holds the start and receives the last iterate. With `deflation` the roots
 * that it knows are avoided.
 */
export function newton(
  equations: Equations,
  x: Float64Array,
  conditions: Conditions,
  mostIterations: number,
  deflation?: Deflation,
): NewtonResult {
  const { size, residual, lu, step, trial, weight } = equations;
  let rises = 0;
  equations.evaluate(x, conditions);
  for (let iteration = 1; iteration <= mostIterations; iteration++) {
    if (!lu.factor(equations.jacobian)) return { status: 'singular', iterations: iteration };
    for (let i = 0; i < size; i++) step[i] = -(residual[i] as number);
    lu.solve(step);
    if (!isAllFinite(step)) return { status: 'singular', iterations: iteration };

    equations.conductances(weight);
    for (let i = 0; i < size; i++) weight[i] = 1 / (weight[i] as number);
    let before = norm(residual, weight);
    if (isSmall(step, x)) {
      advance(x, step, 1, trial);
      equations.evaluate(trial, conditions);
      // At the level of rounding the last step may not help; then the point before it stands.
      if (norm(residual, weight) <= before) x.set(trial);
      else equations.evaluate(x, conditions);
      return { status: 'converged', iterations: iteration };
    }

    if (deflation) {
      const stretch = deflation.stretch(x, step);
      if (!Number.isFinite(stretch)) return { status: 'singular', iterations: iteration };
      for (let i = 0; i < size; i++) step[i] = stretch * (step[i] as number);
      before *= deflation.factor(x);
    }
    const longest = longestStep(equations, x, step);
    let share = longest;
    let halvings = 0;
    for (; ; halvings++) {
      advance(x, step, share, trial);
      equations.evaluate(trial, conditions);
      const after = norm(residual, weight) * (deflation?.factor(trial) ?? 1);
      if (after <= (1 - SUFFICIENT_DECREASE * share) * before) break;
      if (halvings === MOST_HALVINGS) break;
      share /= 2;
    }
    if (halvings === MOST_HALVINGS) {
      if (++rises > MOST_RISES) return { status: 'not-converged', iterations: iteration };
      advance(x, step, longest, trial);
      equations.evaluate(trial, conditions);
    }
    x.set(trial);
  }
  return { status: 'not-converged', iterations: mostIterations };
}

function advance(x: Float64Array, step: Float64Array, share: number, into: Float64Array): void {
  for (let i = 0; i < x.length; i++) into[i] = (x[i] as number) + share * (step[i] as number);
}

function isAllFinite(step: Float64Array): boolean {
  for (let i = 0; i < step.length; i++) if (!Number.isFinite(step[i])) return false;
  return true;
}

function isSmall(step: Float64Array, x: Float64Array): boolean {
  for (let i = 0; i < step.length; i++) {
    if (Math.abs(step[i] as number) > STEP_ABSOLUTE + STEP_RELATIVE * Math.abs(x[i] as number)) return false;
  }
  return true;
}

function norm(residual: Float64Array, weight: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < residual.length; i++) {
    const weighted = (residual[i] as number) * (weight[i] as number);
    sum += weighted * weighted;
  }
  return Math.sqrt(sum);
}

/** The share of a step, at most 1, that keeps every overdrive and every net within its limit. The equations stand evaluated at `x`. */
function longestStep(equations: Equations, x: Float64Array, step: Float64Array): number {
  const { network, netVoltages: v, overdrives } = equations;
  const { fets, groupOf } = network;
  let share = 1;
  for (let i = 0; i < x.length; i++) {
    const limit = NET_STEP + Math.abs(x[i] as number);
    const length = Math.abs(step[i] as number);
    if (share * length > limit) share = limit / length;
  }
  const to = (net: number): number => {
    const group = groupOf[net] as number;
    return (v[net] as number) + (group < 0 ? 0 : share * (step[group] as number));
  };
  for (let index = 0; index < fets.length; index++) {
    const { model, drain, gate, source, body } = fets[index] as NetworkFet;
    const here = overdrives[index] as number;
    const there = overdriveOf(model, to(drain), to(gate), to(source), to(body));
    if (here <= 0 && there <= 0) continue;
    const limit = OVERDRIVE_STEP + Math.abs(here);
    const change = Math.abs(there - here);
    if (change > limit) share *= limit / change;
  }
  return share;
}
