import { type Equations, TRUE_CIRCUIT } from './equations';

/** A scaled pivot nearer to zero than this leaves the sign to rounding. */
const DOUBT = 1e-12;
const POWER_ITERATIONS = 60;

/**
 * Whether the determinant of the nodal Jacobian that was factored last is negative: then an odd number of modes grow,
 * whatever positive capacitances the nets have. False means not judged (Kronenberg, Mathis and Trajković, MWSCAS 2000,
 * show that the sign alone does not decide more).
 */
export function hasNegativeDeterminant(equations: Equations): boolean {
  return equations.lu.determinantSign(DOUBT) === -1;
}

/** The direction, largest entry 1, in which a circuit let go near an unstable point moves away fastest: power iteration on an implicit Euler step. */
export function growingDirection(equations: Equations, x: Float64Array, held: Float64Array): Float64Array {
  const { size, network, jacobian, lu } = equations;
  const direction = Float64Array.from({ length: size }, (_, i) => 1 + ((i * 0.618034) % 1));
  equations.evaluate(x, { ...TRUE_CIRCUIT, held });
  const inertia = equations
    .conductances()
    .reduce((most, sum, i) => (Number.isNaN(held[i]) ? Math.max(most, sum) : most), 0);
  for (const slot of network.diagonal) jacobian[slot] = (jacobian[slot] ?? 0) + inertia;
  if (!lu.factor(jacobian)) return direction;
  for (let iteration = 0; iteration < POWER_ITERATIONS; iteration++) {
    lu.solve(direction);
    let peak = 0;
    for (const value of direction) if (Math.abs(value) > Math.abs(peak)) peak = value;
    for (let i = 0; i < size; i++) direction[i] = (direction[i] ?? 0) / peak;
  }
  return direction;
}
