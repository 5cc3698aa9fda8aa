import { emptyChannel, evaluateChannel } from '../device/channel';
import type { Conditions, Equations } from './equations';

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
 * microamperes count beside nets of amperes. `x` holds the start and receives the last iterate.
 */
export function newton(
  equations: Equations,
  x: Float64Array,
  conditions: Conditions,
  mostIterations: number,
): NewtonResult {
  const { size, residual, lu } = equations;
  const step = new Float64Array(size);
  const trial = new Float64Array(size);
  const weight = new Float64Array(size);
  let rises = 0;
  equations.evaluate(x, conditions);
  for (let iteration = 1; iteration <= mostIterations; iteration++) {
    if (!lu.factor(equations.jacobian)) return { status: 'singular', iterations: iteration };
    for (let i = 0; i < size; i++) step[i] = -(residual[i] ?? 0);
    lu.solve(step);
    if (!step.every(Number.isFinite)) return { status: 'singular', iterations: iteration };

    equations.conductances(weight);
    for (let i = 0; i < size; i++) weight[i] = 1 / (weight[i] ?? 1);
    const before = norm(residual, weight);
    if (isSmall(step, x)) {
      advance(x, step, 1, trial);
      equations.evaluate(trial, conditions);
      // At the level of rounding the last step may not help; then the point before it stands.
      if (norm(residual, weight) <= before) x.set(trial);
      else equations.evaluate(x, conditions);
      return { status: 'converged', iterations: iteration };
    }

    const longest = longestStep(equations, x, step, conditions.supply);
    let share = longest;
    let halvings = 0;
    for (; ; halvings++) {
      advance(x, step, share, trial);
      equations.evaluate(trial, conditions);
      if (norm(residual, weight) <= (1 - SUFFICIENT_DECREASE * share) * before) break;
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
  for (let i = 0; i < x.length; i++) into[i] = (x[i] ?? 0) + share * (step[i] ?? 0);
}

function isSmall(step: Float64Array, x: Float64Array): boolean {
  return step.every((change, i) => Math.abs(change) <= STEP_ABSOLUTE + STEP_RELATIVE * Math.abs(x[i] ?? 0));
}

function norm(residual: Float64Array, weight: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < residual.length; i++) sum += ((residual[i] ?? 0) * (weight[i] ?? 0)) ** 2;
  return Math.sqrt(sum);
}

const here = emptyChannel();
const there = emptyChannel();

/** The share of a step, at most 1, that keeps every overdrive and every net within its limit. */
function longestStep(equations: Equations, x: Float64Array, step: Float64Array, supply: number): number {
  const { network, netVoltages: v } = equations;
  let share = 1;
  for (let i = 0; i < x.length; i++) {
    const limit = NET_STEP + Math.abs(x[i] ?? 0);
    share = Math.min(share, limit / Math.abs(step[i] ?? 0));
  }
  equations.spreadVoltages(x, supply);
  const to = (net: number): number => {
    const group = network.groupOf[net] ?? -1;
    return (v[net] ?? 0) + (group < 0 ? 0 : share * (step[group] ?? 0));
  };
  for (const { model, drain, gate, source, body } of network.fets) {
    evaluateChannel(model, v[drain] ?? 0, v[gate] ?? 0, v[source] ?? 0, v[body] ?? 0, here);
    evaluateChannel(model, to(drain), to(gate), to(source), to(body), there);
    const limit = OVERDRIVE_STEP + Math.abs(here.law.vov);
    const change = Math.abs(there.law.vov - here.law.vov);
    if (Math.max(here.law.vov, there.law.vov) > 0 && change > limit) share *= limit / change;
  }
  return share;
}
