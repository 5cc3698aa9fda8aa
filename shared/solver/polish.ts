import { type Equations, TRUE_CIRCUIT } from './equations';
import { type FreeRange, findFreeRange } from './free-range';
import { newton } from './newton';
import { hasNegativeDeterminant } from './stability';
import {
  EDGE,
  findUndrivenPieces,
  isDrivenThroughout,
  quietUndrivenPieces,
  restUndrivenPieces,
  type UndrivenPiece,
} from './undriven-nets';

/** S, the leakage that points are looked for with. */
export const SEARCH_LEAKAGE = 1e-12;
/** S, smaller leakages, each a hundredth of the one before: what falls with them is leakage and nothing else. */
const FINER_LEAKAGES = [1e-14, 1e-16];
const MOST_ITERATIONS = 80;
const MOST_ROUNDS = 6;
/** V, within which a held net must come to rest from one round to the next. */
const AT_REST = 1e-12;
/** The share of a piece's forced currents within which they cancel. */
const BALANCE = 1e-12;

export type Polished =
  | {
      readonly kind: 'point';
      /** V by group, of the true circuit. */
      readonly x: Float64Array;
      readonly undriven: readonly UndrivenPiece[];
      /** NaN where free, else the voltage an undriven group rests at. */
      readonly held: Float64Array;
      readonly surelyUnstable: boolean;
      readonly iterations: number;
    }
  | { readonly kind: 'free-range'; readonly range: FreeRange; readonly iterations: number }
  | { readonly kind: 'none'; readonly iterations: number };

/**
 * Takes a point found with `SEARCH_LEAKAGE` to the circuit's own equations, without leakage, or tells why there is none near.
 * FETs that were taken to be `off` have to be off by themselves then.
 */
export function polish(equations: Equations, found: Float64Array, off?: Uint8Array): Polished {
  const x = found.slice();
  const { undriven, iterations: spent } = findUndriven(equations, x, off);
  let iterations = spent;
  for (const piece of undriven) {
    if (piece.forcedThroughput === 0) continue;
    if (Math.abs(piece.forced) > BALANCE * piece.forcedThroughput) return { kind: 'none', iterations };
    return { kind: 'free-range', range: { groups: piece.groups }, iterations };
  }

  if (off) quietUndrivenPieces(equations, x, undriven);
  const held = new Float64Array(equations.size).fill(Number.NaN);
  for (let round = 0; round < MOST_ROUNDS; round++) {
    restUndrivenPieces(equations, x, undriven);
    let moved = round === 0 ? Number.POSITIVE_INFINITY : 0;
    for (const { groups } of undriven) {
      const anchor = groups[0] ?? 0;
      moved = Math.max(moved, Math.abs((x[anchor] ?? 0) - (held[anchor] ?? 0)));
      held[anchor] = x[anchor] ?? 0;
    }
    if (moved <= AT_REST) break;
    const result = newton(equations, x, { ...TRUE_CIRCUIT, held }, MOST_ITERATIONS);
    iterations += result.iterations;
    if (result.status !== 'converged') {
      const range = findFreeRange(equations, result.status === 'singular' ? found : x, held);
      return range ? { kind: 'free-range', range, iterations } : { kind: 'none', iterations };
    }
    if (undriven.length === 0) break;
  }
  // Newton's method has left the factors of the Jacobian a nanovolt away, which serve both questions.
  const surelyUnstable = hasNegativeDeterminant(equations);
  const range = findFreeRange(equations, x, held, true);
  if (range) return { kind: 'free-range', range, iterations };
  if (!balances(equations, x) || (off && !areOff(equations, off))) return { kind: 'none', iterations };
  return { kind: 'point', x, undriven, held, surelyUnstable, iterations };
}

/** The pieces that leakage alone holds at `x`, which is brought to a much smaller leakage if there may be any. */
function findUndriven(
  equations: Equations,
  x: Float64Array,
  off: Uint8Array | undefined,
): { undriven: UndrivenPiece[]; iterations: number } {
  let iterations = 0;
  if (isDrivenThroughout(equations, x, SEARCH_LEAKAGE, off)) return { undriven: [], iterations };
  const coarser = x.slice();
  for (const finer of FINER_LEAKAGES) {
    const trial = x.slice();
    const result = newton(equations, trial, { leakage: finer, supply: 1, off }, MOST_ITERATIONS);
    iterations += result.iterations;
    if (result.status !== 'converged') break;
    coarser.set(x);
    x.set(trial);
  }
  return { undriven: findUndrivenPieces(equations, coarser, x, off), iterations };
}

/** Whether FETs that were taken to be off are so where the equations were evaluated last. */
function areOff({ overdrives }: Equations, off: Uint8Array): boolean {
  return overdrives.every((vov, index) => off[index] === 0 || vov <= EDGE);
}

/** Whether all currents cancel to rounding at every net, held ones included. */
function balances(equations: Equations, x: Float64Array): boolean {
  equations.evaluate(x, TRUE_CIRCUIT);
  const { residual, throughput } = equations;
  const conductance = equations.conductances();
  return residual.every(
    (sum, group) => Math.abs(sum) <= 1e-8 * (throughput[group] ?? 0) + 1e-9 * (conductance[group] ?? 0) + 1e-18,
  );
}
