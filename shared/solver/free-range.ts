import { type Conditions, type Equations, TRUE_CIRCUIT } from './equations';
import { newton } from './newton';

/** Groups that may lie anywhere in a range: ideal currents oppose each other there and nothing settles the voltage. */
export interface FreeRange {
  readonly groups: readonly number[];
}

/** A direction is suspect when following it 1 V changes no net's currents by more than this share of what flows there. */
const SUSPECT = 1e-3;
/** The share of a net's conductance that is rounding. */
const NOISE = 1e-9;
/** A, as a share of what flows at the net: less than this is rounding, so a real conductance or λ shows above it. */
const ROUNDING = 1e-12;
const INVERSE_ITERATIONS = 4;
/** V, tried to both sides. A free net moves there without any current changing. */
const PROBES = [1e-3, -1e-3, 2e-2, -2e-2];

/**
 * Looks for a net that may lie anywhere: inverse iteration gives the direction in which the currents change least (Ipsen,
 * SIAM Review 39, 1997, from memory); the net that moves most along it is then moved, the others solved again, and
 * its current law is read. Null when the point is the only one around. `isFactored` where the Jacobian at `x` was factored last.
 */
export function findFreeRange(
  equations: Equations,
  x: Float64Array,
  held: Float64Array,
  isFactored = false,
): FreeRange | null {
  const direction = leastResistedDirection(equations, x, { ...TRUE_CIRCUIT, held }, isFactored);
  if (!direction) return null;
  let group = -1;
  for (const [i, share] of direction.entries()) {
    if (Number.isNaN(held[i]) && (group < 0 || Math.abs(share) > Math.abs(direction[group] ?? 0))) group = i;
  }
  if (group < 0) return null;
  for (const probe of PROBES) {
    const moved = x.slice();
    moved[group] = (x[group] ?? 0) + probe;
    const heldToo = held.slice();
    heldToo[group] = moved[group] ?? 0;
    if (newton(equations, moved, { ...TRUE_CIRCUIT, held: heldToo }, 40).status !== 'converged') continue;
    equations.evaluate(moved, TRUE_CIRCUIT);
    const throughput = equations.throughput[group] ?? 0;
    if (throughput > 0 && Math.abs(equations.residual[group] ?? 0) <= ROUNDING * throughput) {
      const groups = [...direction.entries()].flatMap(([i, share]) => (Math.abs(share) > 0.1 ? [i] : []));
      return { groups };
    }
  }
  return null;
}

/** The direction, largest entry 1, along which the scaled currents change least; null when all change clearly. */
function leastResistedDirection(
  equations: Equations,
  x: Float64Array,
  conditions: Conditions,
  isFactored: boolean,
): Float64Array | null {
  const { size, jacobian, throughput, lu, network } = equations;
  if (size === 0) return null;
  equations.evaluate(x, conditions);
  const { starts, rows } = network.pattern;
  const conductance = equations.conductances();
  const bare = jacobian.slice();
  if (!isFactored) {
    // A little on the diagonal, as the matrix may be singular.
    for (const [group, slot] of network.diagonal.entries()) {
      jacobian[slot] = (jacobian[slot] ?? 0) + 1e-12 * (conductance[group] ?? 0) + 1e-18;
    }
    if (!lu.factor(jacobian)) return null;
  }
  const direction = Float64Array.from({ length: size }, (_, i) => 1 + ((i * 0.618034) % 1));
  for (let iteration = 0; iteration < INVERSE_ITERATIONS; iteration++) {
    for (let i = 0; i < size; i++) direction[i] = (direction[i] ?? 0) * ((conductance[i] ?? 0) || 1e-18);
    lu.solve(direction);
    const largest = direction.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
    if (!(largest > 0 && largest < Number.MAX_VALUE)) return null;
    for (let i = 0; i < size; i++) direction[i] = (direction[i] ?? 0) / largest;
  }
  const change = new Float64Array(size);
  for (let column = 0; column < size; column++) {
    for (let slot = starts[column] ?? 0; slot < (starts[column + 1] ?? 0); slot++) {
      const row = rows[slot] ?? 0;
      change[row] = (change[row] ?? 0) + (bare[slot] ?? 0) * (direction[column] ?? 0);
    }
  }
  const clear = change.some(
    (sum, row) => Math.abs(sum) > SUSPECT * (throughput[row] ?? 0) + NOISE * (conductance[row] ?? 0),
  );
  return clear ? null : direction;
}
