import { Deflation } from './deflation';
import type { Equations } from './equations';
import type { Network } from './network';
import { newton } from './newton';
import { polish, SEARCH_LEAKAGE } from './polish';
import { isSamePoint, rank } from './ranking';
import { leave, type Point } from './settle';
import { spreadStartingPoints, startingPoints } from './starting-points';

/** Unknowns (nets that no voltage source holds) above which a circuit is too large to be searched for further points. */
export const MOST_UNKNOWNS_SEARCHED = 300;

const WITH_LEAKAGE = { leakage: SEARCH_LEAKAGE, supply: 1 };
const NEWTON_ITERATIONS = 40;
/** Fewer, as a deflated step that leads somewhere does so soon, and most lead nowhere. */
const DEFLATED_ITERATIONS = 25;
/** Loops of a circuit that are each looked at at rest. */
const MOST_LOOPS = 30;
/** Times one start is used again after it has led to a point, which is then deflated. */
const MOST_REPEATS = 4;
/** Pairs of points between which a further one is looked for. */
const MOST_PAIRS = 15;
/** V, within which two solutions with leakage are one. */
const SAME_VOLTAGE = 1e-6;

/**
 * Looks for further operating points beside the known ones: devices at rest, all and loop by loop; Newton's method from starts spread over the supplies and
 * from between each two points, plain and then deflated by all points so far; each unstable point is left to either side. The
 * number of starts is fixed and a search proves nothing. Works between two `yield`s for one start's time, so that a
 * caller can stop in between. The result is all points in the order they are listed in.
 */
export function* searchPoints(equations: Equations, known: readonly Point[]): Generator<undefined, Point[]> {
  const search = new Search(equations, known);
  for (const off of quietParts(equations.network)) {
    yield;
    search.atRest(off);
  }
  for (const starts of [startingPoints(equations), spreadStartingPoints(equations)]) {
    for (const start of starts) {
      yield;
      search.from(start);
    }
  }
  let pairs = 0;
  for (let one = 1; one < search.points.length && pairs < MOST_PAIRS; one++) {
    for (let other = 0; other < one && pairs < MOST_PAIRS; other++, pairs++) {
      yield;
      search.between(search.points[one] as Point, search.points[other] as Point);
    }
  }
  return rank(equations, search.points);
}

/** Sets of FETs that may all be off together, by index: all, and those of each loop. Without current a loop may stay without. */
function* quietParts({ fets, groupOf, topology }: Network): Generator<Uint8Array> {
  yield new Uint8Array(fets.length).fill(1);
  const { order, blockStarts } = topology.analysis;
  let loops = 0;
  for (let block = 0; block + 1 < blockStarts.length && loops < MOST_LOOPS; block++) {
    const members = new Set(order.subarray(blockStarts[block], blockStarts[block + 1]));
    if (members.size < 2) continue;
    loops++;
    const isInside = (net: number): boolean => members.has(groupOf[net] as number);
    yield Uint8Array.from(fets, ({ drain, source }) => Number(isInside(drain) || isInside(source)));
  }
}

class Search {
  readonly points: Point[] = [];
  readonly #equations: Equations;
  /** Solutions with the leakage that the search is made with, which is where deflation has to put its poles. */
  readonly #leaky: Float64Array[] = [];
  readonly #deflation = new Deflation();

  constructor(equations: Equations, known: readonly Point[]) {
    this.#equations = equations;
    for (const point of known) this.#keep(point);
  }

  from(start: Float64Array): void {
    let outcome = this.#solve(start.slice());
    for (let repeat = 0; repeat < MOST_REPEATS && outcome !== 'failed'; repeat++) {
      outcome = this.#solve(start.slice(), this.#deflation);
    }
  }

  /** Takes FETs to be off and looks whether they are: leakage to ground would start them, so `from` may never see it. */
  atRest(off: Uint8Array): void {
    const x = (this.points[0]?.x ?? new Float64Array(this.#equations.size)).slice();
    const { status, iterations } = newton(this.#equations, x, { ...WITH_LEAKAGE, off }, NEWTON_ITERATIONS);
    if (status !== 'converged') return;
    const polished = polish(this.#equations, x, off);
    if (polished.kind === 'point') this.#keep({ ...polished, iterations: iterations + polished.iterations });
  }

  between(one: Point, other: Point): void {
    this.from(one.x.map((voltage, group) => (voltage + (other.x[group] as number)) / 2));
  }

  #solve(x: Float64Array, deflation?: Deflation): 'new' | 'met' | 'failed' {
    const most = deflation ? DEFLATED_ITERATIONS : NEWTON_ITERATIONS;
    const { status, iterations } = newton(this.#equations, x, WITH_LEAKAGE, most, deflation);
    if (status !== 'converged') return 'failed';
    if (this.#isMet(x)) return deflation ? 'failed' : 'met';
    this.#meet(x);
    const polished = polish(this.#equations, x);
    if (polished.kind === 'point') this.#keep({ ...polished, iterations: iterations + polished.iterations });
    return 'new';
  }

  #keep(point: Point): void {
    if (this.points.some((known) => isSamePoint(known, point))) return;
    this.points.push(point);
    const x = point.x.slice();
    const { status } = newton(this.#equations, x, WITH_LEAKAGE, NEWTON_ITERATIONS);
    if (status === 'converged' && !this.#isMet(x)) this.#meet(x);
    if (!point.surelyUnstable) return;
    for (const left of leave(this.#equations, point)) if (left.kind === 'point') this.#keep(left);
  }

  #meet(x: Float64Array): void {
    this.#leaky.push(x);
    this.#deflation.add(x);
  }

  #isMet(x: Float64Array): boolean {
    return this.#leaky.some((met) =>
      met.every((voltage, group) => Math.abs(voltage - (x[group] as number)) <= SAME_VOLTAGE * (1 + Math.abs(voltage))),
    );
  }
}
