import { type Box, overlap } from './box';

/** Side of a bucket in px, about the size of a tag. */
const BUCKET = 80;

/** Boxes found by where they lie: a uniform grid of buckets. */
export class BoxIndex<B extends Box = Box> {
  readonly #buckets = new Map<number, B[]>();

  add(box: B): void {
    eachBucket(box, (key) => {
      const bucket = this.#buckets.get(key);
      if (bucket) bucket.push(box);
      else this.#buckets.set(key, [box]);
      return true;
    });
  }

  remove(box: B): void {
    eachBucket(box, (key) => {
      const bucket = this.#buckets.get(key);
      const at = bucket?.indexOf(box) ?? -1;
      if (at >= 0) bucket?.splice(at, 1);
      return true;
    });
  }

  /** Every box that shares more than an edge with this one, each once. */
  meeting(box: Box): B[] {
    const found: B[] = [];
    eachBucket(box, (key) => {
      for (const other of this.#buckets.get(key) ?? []) {
        if (overlap(box, other) && !found.includes(other)) found.push(other);
      }
      return true;
    });
    return found;
  }

  isFree(box: Box): boolean {
    return eachBucket(box, (key) => !this.#buckets.get(key)?.some((other) => overlap(box, other)));
  }
}

/** Visits the buckets that a box reaches into for as long as `visit` says so; whether it said so of all. */
function eachBucket({ left, top, right, bottom }: Box, visit: (key: number) => boolean): boolean {
  const lastColumn = Math.floor(right / BUCKET);
  const lastRow = Math.floor(bottom / BUCKET);
  for (let column = Math.floor(left / BUCKET); column <= lastColumn; column++) {
    for (let row = Math.floor(top / BUCKET); row <= lastRow; row++) {
      if (!visit(column * 65536 + row)) return false;
    }
  }
  return true;
}
