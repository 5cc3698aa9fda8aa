import type { SparsePattern } from './sparse-matrix';

/** Nodes with more neighbours than this times √size go last unseen: every step would have to look through them. */
const DENSE = 10;
const LEAST_DENSE = 16;

/**
 * Approximate minimum degree ordering of A + Aᵀ (Amestoy, Davis and Duff, SIAM J. Matrix Anal. 17, 1996, from memory).
 * The graph left by an elimination is kept as a quotient graph: an eliminated node becomes an element, whose members
 * are neighbours of each other without a list of every pair. Degrees are bounded from above by what the elements add
 * up to, elements that lie within the newest are absorbed by it, and nodes with the same neighbourhood go as one.
 */
export function approximateMinimumDegree(pattern: SparsePattern): Int32Array {
  return new QuotientGraph(pattern).eliminate();
}

class QuotientGraph {
  readonly #size: number;
  /** Of each node: neighbours joined directly, and elements it is a member of. */
  readonly #neighbours: number[][];
  readonly #elements: number[][];
  /** Of each element: its members, and how many nodes they stand for. */
  readonly #members: number[][];
  readonly #memberWeight: Int32Array;
  readonly #absorbed: Uint8Array;
  /** How many nodes one stands for; 0 once it is eliminated, dense, or merged into another. */
  readonly #weight: Int32Array;
  readonly #merged: number[][];
  readonly #degree: Int32Array;
  /** Nodes of equal degree in doubly linked lists, −1 at the ends. */
  readonly #first: Int32Array;
  readonly #next: Int32Array;
  readonly #previous: Int32Array;
  /** Stamps: what was met in the present step. */
  readonly #seen: Int32Array;
  readonly #counted: Int32Array;
  readonly #outside: Int32Array;
  #stamp = 0;
  #remaining: number;

  constructor({ size, starts, rows }: SparsePattern) {
    this.#size = size;
    this.#neighbours = Array.from({ length: size }, () => []);
    this.#elements = Array.from({ length: size }, () => []);
    this.#members = Array.from({ length: size }, () => []);
    this.#memberWeight = new Int32Array(size);
    this.#absorbed = new Uint8Array(size);
    this.#weight = new Int32Array(size).fill(1);
    this.#merged = Array.from({ length: size }, () => []);
    this.#degree = new Int32Array(size);
    this.#first = new Int32Array(size + 1).fill(-1);
    this.#next = new Int32Array(size);
    this.#previous = new Int32Array(size);
    this.#seen = new Int32Array(size);
    this.#counted = new Int32Array(size);
    this.#outside = new Int32Array(size);
    this.#remaining = size;
    for (let column = 0; column < size; column++) {
      for (let at = starts[column] as number; at < (starts[column + 1] as number); at++) {
        const row = rows[at] as number;
        if (row === column) continue;
        list(this.#neighbours, row).push(column);
        list(this.#neighbours, column).push(row);
      }
    }
    for (let node = 0; node < size; node++) this.#neighbours[node] = [...new Set(this.#neighbours[node])];
  }

  eliminate(): Int32Array {
    const order: number[] = [];
    const dense = this.#setDenseAside();
    for (let node = this.#size - 1; node >= 0; node--) {
      if (this.#weight[node] === 0) continue;
      const alive = list(this.#neighbours, node).filter((other) => this.#weight[other] !== 0);
      this.#neighbours[node] = alive;
      this.#degree[node] = alive.length;
      this.#insert(node);
    }
    let least = 0;
    while (this.#remaining > 0) {
      while (this.#first[least] === -1) least++;
      const pivot = this.#first[least] as number;
      const element = this.#eliminateOne(pivot);
      for (const node of element) {
        this.#insert(node);
        least = Math.min(least, this.#degree[node] as number);
      }
      this.#emit(pivot, order);
    }
    return Int32Array.from([...order, ...dense]);
  }

  #setDenseAside(): number[] {
    const most = Math.max(LEAST_DENSE, DENSE * Math.sqrt(this.#size));
    const dense: number[] = [];
    for (let node = 0; node < this.#size; node++) if (list(this.#neighbours, node).length > most) dense.push(node);
    for (const node of dense) this.#weight[node] = 0;
    this.#remaining -= dense.length;
    return dense;
  }

  /** Makes a node an element; its members come back with their new degrees, in no list. */
  #eliminateOne(pivot: number): readonly number[] {
    this.#remove(pivot);
    this.#remaining -= this.#weight[pivot] as number;
    const members = this.#join(pivot);
    let weight = 0;
    for (const node of members) {
      this.#remove(node);
      weight += this.#weight[node] as number;
    }
    this.#weight[pivot] = 0;
    this.#measureOutside(members);
    for (const node of members) this.#update(node, pivot, weight);
    const kept = this.#mergeAlike(members);
    this.#members[pivot] = kept;
    this.#memberWeight[pivot] = weight;
    return kept;
  }

  /** The pivot's neighbours, direct and through its elements, which its own element takes over. All are stamped. */
  #join(pivot: number): number[] {
    const stamp = ++this.#stamp;
    const members: number[] = [];
    this.#seen[pivot] = stamp;
    const take = (nodes: readonly number[]): void => {
      for (const node of nodes) {
        if (this.#weight[node] === 0 || this.#seen[node] === stamp) continue;
        this.#seen[node] = stamp;
        members.push(node);
      }
    };
    take(list(this.#neighbours, pivot));
    for (const element of list(this.#elements, pivot)) {
      if (this.#absorbed[element]) continue;
      take(list(this.#members, element));
      this.#absorb(element);
    }
    this.#neighbours[pivot] = [];
    this.#elements[pivot] = [];
    return members;
  }

  /** For every element that a member is also in: how much of it lies outside the new one. */
  #measureOutside(members: readonly number[]): void {
    for (const node of members) {
      for (const element of list(this.#elements, node)) {
        if (this.#absorbed[element]) continue;
        if (this.#counted[element] !== this.#stamp) {
          this.#counted[element] = this.#stamp;
          this.#outside[element] = this.#memberWeight[element] as number;
        }
        this.#outside[element] = (this.#outside[element] as number) - (this.#weight[node] as number);
      }
    }
  }

  #update(node: number, pivot: number, elementWeight: number): void {
    const own = this.#weight[node] as number;
    let apart = 0;
    const neighbours = list(this.#neighbours, node).filter((other) => {
      if (this.#weight[other] === 0 || this.#seen[other] === this.#stamp) return false;
      apart += this.#weight[other] as number;
      return true;
    });
    const elements = list(this.#elements, node).filter((element) => {
      if (this.#absorbed[element]) return false;
      const outside = this.#outside[element] as number;
      if (outside === 0) this.#absorb(element);
      apart += outside;
      return outside > 0;
    });
    elements.push(pivot);
    this.#neighbours[node] = neighbours;
    this.#elements[node] = elements;
    const inside = elementWeight - own;
    this.#degree[node] = Math.min(this.#remaining - own, (this.#degree[node] as number) + inside, apart + inside);
  }

  /** Members with the same neighbours and elements are eliminated one after the other without further fill. */
  #mergeAlike(members: readonly number[]): number[] {
    const byHash = new Map<number, number[]>();
    const kept: number[] = [];
    for (const node of members) {
      const [neighbours, elements] = [list(this.#neighbours, node), list(this.#elements, node)];
      let hash = neighbours.length;
      for (const other of neighbours) hash = (hash + other) | 0;
      for (const element of elements) hash = (hash + element) | 0;
      const others = byHash.get(hash);
      const twin = others?.find((other) => this.#areAlike(node, other));
      if (twin === undefined) {
        kept.push(node);
        if (others) others.push(node);
        else byHash.set(hash, [node]);
        continue;
      }
      this.#degree[twin] = (this.#degree[twin] as number) - (this.#weight[node] as number);
      this.#weight[twin] = (this.#weight[twin] as number) + (this.#weight[node] as number);
      this.#weight[node] = 0;
      list(this.#merged, twin).push(node);
    }
    return kept;
  }

  #areAlike(one: number, other: number): boolean {
    const same = (a: readonly number[], b: readonly number[]): boolean =>
      a.length === b.length && b.every((entry) => a.includes(entry));
    return (
      same(list(this.#elements, one), list(this.#elements, other)) &&
      same(list(this.#neighbours, one), list(this.#neighbours, other))
    );
  }

  #absorb(element: number): void {
    this.#absorbed[element] = 1;
    this.#members[element] = [];
  }

  #emit(node: number, order: number[]): void {
    order.push(node);
    for (const other of list(this.#merged, node)) this.#emit(other, order);
  }

  #insert(node: number): void {
    const degree = this.#degree[node] as number;
    const next = this.#first[degree] as number;
    this.#next[node] = next;
    this.#previous[node] = -1;
    if (next >= 0) this.#previous[next] = node;
    this.#first[degree] = node;
  }

  #remove(node: number): void {
    const next = this.#next[node] as number;
    const previous = this.#previous[node] as number;
    if (previous < 0) this.#first[this.#degree[node] as number] = next;
    else this.#next[previous] = next;
    if (next >= 0) this.#previous[next] = previous;
  }
}

function list(lists: readonly number[][], index: number): number[] {
  return lists[index] as number[];
}
