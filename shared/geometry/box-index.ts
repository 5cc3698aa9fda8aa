import { type Box, overlap } from './box';

/** Side of a bucket in px, about the size of a tag. */
const BUCKET = 80;

/** Boxes found by where they lie: a uniform grid of buckets. */
export class BoxIndex<B extends Box = Box> {
  readonly #buckets = new Map<number, B[]>();

  add(box: B): void {
    for (const key of keysOf(box)) {
      const bucket = this.#buckets.get(key);
      if (bucket) bucket.push(box);
      else this.#buckets.set(key, [box]);
    }
  }

  remove(box: B): void {
    for (const key of keysOf(box)) {
      const bucket = this.#buckets.get(key);
      const at = bucket?.indexOf(box) ?? -1;
      if (at >= 0) bucket?.splice(at, 1);
    }
  }

  /** Every box that shares more than an edge with this one, each once. */
  meeting(box: Box): B[] {
    const found: B[] = [];
    for (const key of keysOf(box)) {
      for (const other of this.#buckets.get(key) ?? []) {
        if (overlap(box, other) && !found.includes(other)) found.push(other);
      }
    }
    return found;
  }

  isFree(box: Box): boolean {
    return keysOf(box).every((key) => !this.#buckets.get(key)?.some((other) => overlap(box, other)));
  }
}

function keysOf({ left, top, right, bottom }: Box): number[] {
  const keys: number[] = [];
  for (let x = Math.floor(left / BUCKET); x <= Math.floor(right / BUCKET); x++) {
    for (let y = Math.floor(top / BUCKET); y <= Math.floor(bottom / BUCKET); y++) keys.push(x * 65536 + y);
  }
  return keys;
}
