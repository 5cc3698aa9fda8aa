import { type Equations, TRUE_CIRCUIT } from './equations';
import type { FreeRange } from './free-range';
import { stepLeakage } from './leakage-stepping';
import { type NewtonResult, newton } from './newton';
import { polish, SEARCH_LEAKAGE } from './polish';
import { settleInPseudoTime } from './pseudo-transient';
import { isSamePoint, measure, rank } from './ranking';
import { stepSources } from './source-stepping';
import { growingDirection } from './stability';
import { startingPoints } from './starting-points';
import type { UndrivenPiece } from './undriven-nets';

/** A solution of the true circuit. */
export interface Point {
  readonly kind: 'point';
  /** V by group. */
  readonly x: Float64Array;
  readonly undriven: readonly UndrivenPiece[];
  /** V that undriven groups are held at, NaN where free. */
  readonly held: Float64Array;
  readonly surelyUnstable: boolean;
  readonly iterations: number;
}

export type Settled =
  | Point
  | { readonly kind: 'free-range'; readonly range: FreeRange; readonly iterations: number }
  /** `x` is the attempt with the least remaining current; the true circuit's residual there is the caller's to read. */
  | { readonly kind: 'none'; readonly x: Float64Array; readonly iterations: number };

type Failure = Exclude<Settled, Point>;

/** What a fixed set of starts leads to. */
export interface Settlement {
  /** The point that is listed first of those found, or why there is none. */
  readonly answer: Settled;
  /** All points found, none twice, in the order they are listed in. */
  readonly points: readonly Point[];
}

const NEWTON_ITERATIONS = 60;
/** Unknowns above which further starts cost more than they are likely to find. */
const MOST_UNKNOWNS_FOR_MORE_STARTS = 200;
/** V, how far a circuit is pushed from an unstable point to see where it goes. */
const PUSH = 0.1;

/**
 * Finds an operating point of a circuit and, of those that a fixed set of starts leads to, the one that is listed first: not
 * surely unstable, then with most FETs on, then with the greatest power. Nothing but the circuit decides.
 */
export function settle(equations: Equations): Settlement {
  let points: Point[] = [];
  let failure: Failure | null = null;
  let iterations = 0;
  for (const start of startingPoints(equations)) {
    // Once there is a point a further start that Newton's method alone cannot settle is not worth the fall-backs.
    const settled = settleFrom(equations, start, points.length > 0);
    iterations += settled.iterations;
    if (settled.kind === 'point') {
      if (points.some((known) => isSamePoint(known, settled))) continue;
      const found = settled.surelyUnstable ? [settled, ...leave(equations, settled)] : [settled];
      for (const one of found) {
        if (one !== settled) iterations += one.iterations;
        if (one.kind === 'point' && !points.some((known) => isSamePoint(known, one))) points.push(one);
      }
      points = rank(equations, points);
      if (isFirstOfAll(equations, points[0])) break;
    } else {
      failure = graver(equations, failure, settled);
      if (settled.kind === 'free-range') break;
    }
    if (equations.size > MOST_UNKNOWNS_FOR_MORE_STARTS) break;
  }
  const chosen = points[0] ?? failure ?? { kind: 'none', x: new Float64Array(equations.size) };
  return { answer: { ...chosen, iterations }, points };
}

/** Nothing is listed before a point with every FET on that is not surely unstable, but for one with more power. */
function isFirstOfAll(equations: Equations, point: Point | undefined): boolean {
  if (!point || point.surelyUnstable) return false;
  return measure(equations, point.x).on === equations.network.fets.length;
}

/** Of two failures the one that says more: a free range, else the one nearer to balance. */
function graver(equations: Equations, one: Failure | null, other: Failure): Failure {
  if (one === null || other.kind === 'free-range') return other;
  if (one.kind === 'free-range') return one;
  return imbalance(equations, other.x) < imbalance(equations, one.x) ? other : one;
}

/** Newton's method from a start; where it fails, leakage stepping, source stepping, pseudo-transient continuation. */
export function settleFrom(equations: Equations, start: Float64Array, byNewtonAlone = false): Settled {
  const fallBacks: ((x: Float64Array) => NewtonResult)[] = [
    (x) => stepLeakage(equations, x, SEARCH_LEAKAGE),
    (x) => stepSources(equations, x, SEARCH_LEAKAGE),
    (x) => settleInPseudoTime(equations, x, SEARCH_LEAKAGE),
  ];
  const methods: ((x: Float64Array) => NewtonResult)[] = [
    (x) => newton(equations, x, { leakage: SEARCH_LEAKAGE, supply: 1 }, NEWTON_ITERATIONS),
    ...(byNewtonAlone ? [] : fallBacks),
  ];
  let iterations = 0;
  let nearest = start;
  for (const method of methods) {
    const x = start.slice();
    const result = method(x);
    iterations += result.iterations;
    if (x.every(Number.isFinite) && imbalance(equations, x) < imbalance(equations, nearest)) nearest = x;
    if (result.status !== 'converged') continue;
    const polished = polish(equations, x);
    iterations += polished.iterations;
    if (polished.kind === 'free-range') return { ...polished, iterations };
    if (polished.kind === 'point') return { ...polished, iterations };
  }
  return { kind: 'none', x: nearest, iterations };
}

/** Where the circuit goes when it is pushed off an unstable point to either side. */
export function leave(equations: Equations, point: Point): Settled[] {
  const direction = growingDirection(equations, point.x, point.held);
  return [PUSH, -PUSH].map((push) => {
    const x = point.x.map((voltage, i) => voltage + push * (direction[i] ?? 0));
    const result = settleInPseudoTime(equations, x, SEARCH_LEAKAGE);
    const polished = result.status === 'converged' ? polish(equations, x) : null;
    const iterations = result.iterations + (polished?.iterations ?? 0);
    return polished?.kind === 'point' ? { ...polished, iterations } : { kind: 'none', x, iterations };
  });
}

/** A, the largest sum of currents at any group of the true circuit. */
export function imbalance(equations: Equations, x: Float64Array): number {
  equations.evaluate(x, TRUE_CIRCUIT);
  return equations.residual.reduce((most, sum) => Math.max(most, Math.abs(sum)), 0);
}
