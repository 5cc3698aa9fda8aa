/** The power of the pole that is put on a known root, and how fast its pull on the rest fades: p = 2 and σ = 1, distances in volts. */
const SHIFT = 1;

/**
 * Deflation (Farrell, Birkisson and Funke, SIAM J. Sci. Comput. 37, 2015; the form from memory): the equations are
 * multiplied by M(x) = Π(1/‖x − xᵢ‖² + σ), which has poles at the roots xᵢ that are known, so that Newton's method is
 * turned away from them and comes to another. As M is a scalar its rank-one term in the Jacobian only stretches the
 * step, and no other matrix has to be factored.
 */
export class Deflation {
  readonly #roots: Float64Array[] = [];

  add(root: Float64Array): void {
    this.#roots.push(root);
  }

  /** M(x). */
  factor(x: Float64Array): number {
    let product = 1;
    for (const root of this.#roots) product *= 1 / squaredDistance(x, root) + SHIFT;
    return product;
  }

  /**
   * What Newton's step for the bare equations is to be multiplied with: with J·δ = −F, the deflated step solves
   * (M·J + F·∇Mᵀ)·s = −M·F, so that s = δ/(1 − ∇(ln M)·δ) by the formula of Sherman and Morrison.
   */
  stretch(x: Float64Array, step: Float64Array): number {
    let slope = 0;
    for (const root of this.#roots) {
      const square = squaredDistance(x, root);
      let along = 0;
      for (let i = 0; i < x.length; i++) along += ((x[i] as number) - (root[i] as number)) * (step[i] as number);
      slope -= (2 * along) / (square * (1 + SHIFT * square));
    }
    return 1 / (1 - slope);
  }
}

function squaredDistance(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < a.length; i++) {
    const difference = (a[i] as number) - (b[i] as number);
    sum += difference * difference;
  }
  return sum;
}
