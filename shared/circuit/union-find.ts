/** Disjoint sets of names: Tarjan's union by size with path halving (J. ACM 22(2), 1975, from memory). */
export class UnionFind {
  readonly #parent = new Map<string, string>();
  readonly #size = new Map<string, number>();

  find(name: string): string {
    let at = name;
    for (;;) {
      const parent = this.#parent.get(at) ?? at;
      if (parent === at) return at;
      const grandparent = this.#parent.get(parent) ?? parent;
      this.#parent.set(at, grandparent);
      at = grandparent;
    }
  }

  /** Joins two sets. False when they were one already. */
  join(a: string, b: string): boolean {
    const rootA = this.find(a);
    const rootB = this.find(b);
    if (rootA === rootB) return false;
    const sizeA = this.#size.get(rootA) ?? 1;
    const sizeB = this.#size.get(rootB) ?? 1;
    const [small, large] = sizeA < sizeB ? [rootA, rootB] : [rootB, rootA];
    this.#parent.set(small, large);
    this.#size.set(large, sizeA + sizeB);
    return true;
  }
}
