import { type Anchor, type Box, hungBox, sharedArea, widened } from './box';
import type { BoxIndex } from './box-index';
import { type GridPoint, samePoint } from './place';

/** A place where a block of text may hang; the dearer, the less it is wanted. */
export type Candidate = Anchor & { readonly cost: number };

/** A tag or a label that looks for a place. */
export type Block = {
  readonly id: string;
  readonly width: number;
  readonly height: number;
  readonly candidates: readonly Candidate[];
  /** Places to fall back on, each at least `from` in cost; made only where the others will not do. */
  readonly remote: { readonly from: number; places(): readonly Candidate[] };
};

/** Free space wanted about a block, in px. */
const AIR = 3;
/** Any overlap is worse than the remotest place; a larger one is worse still. */
const COVERS = 1000;
const CROWDS = 25;
/** After the first choice, times that every block may look again now that its neighbours have settled. */
const SECOND_THOUGHTS = 3;

/**
 * Chooses a place for each block: the cheapest that covers nothing in `taken`, no other block and not what is added
 * meanwhile. The blocks choose in turn and then reconsider, so that the outcome depends on the drawing alone.
 * Afterwards `taken` holds their boxes.
 */
export function placeTags(blocks: readonly Block[], taken: BoxIndex): Map<string, Anchor> {
  const chosen = new Map<string, { candidate: Candidate; box: Box }>();
  for (let round = 0; round <= SECOND_THOUGHTS; round++) {
    let moved = false;
    for (const block of blocks) {
      const before = chosen.get(block.id);
      if (before) taken.remove(before.box);
      const next = best(block, taken);
      if (!next) continue;
      if (!before || !samePlace(next.candidate, before.candidate)) moved = true;
      chosen.set(block.id, next);
      taken.add(next.box);
    }
    if (!moved) break;
  }
  return new Map([...chosen].map(([id, { candidate }]) => [id, { at: candidate.at, grows: candidate.grows }]));
}

type Choice = { readonly candidate: Candidate; readonly box: Box; readonly cost: number };

function best(block: Block, taken: BoxIndex): Choice | undefined {
  const near = cheapest(block, block.candidates, taken, undefined);
  return near && near.cost <= block.remote.from ? near : cheapest(block, block.remote.places(), taken, near);
}

function cheapest(
  { width, height }: Block,
  candidates: readonly Candidate[],
  taken: BoxIndex,
  rival: Choice | undefined,
): Choice | undefined {
  let found = rival;
  let least = rival?.cost ?? Number.POSITIVE_INFINITY;
  for (const candidate of candidates) {
    if (candidate.cost >= least) continue;
    const box = hungBox(candidate, width, height);
    let cost = candidate.cost;
    for (const other of taken.meeting(widened(box, AIR))) {
      const area = sharedArea(box, other);
      cost += area > 0 ? COVERS + area : CROWDS;
      if (cost >= least) break;
    }
    if (cost >= least) continue;
    least = cost;
    found = { candidate, box, cost };
  }
  return found;
}

function samePlace(a: Candidate, b: Candidate): boolean {
  return samePoint(a.at, b.at) && samePoint(a.grows, b.grows);
}

const GAPS = [10, 20, 40, 70, 110] as const;
const SLIDES = [0, 10, -10, 20, -20, 30, -30, 40, -40, 60, -60] as const;

/** Places all about a box, nearer ones cheaper, `sides` in order of preference; at least `from` in cost. */
export function placesAbout(box: Box, sides: readonly GridPoint[], from: number): Candidate[] {
  const middle = { x: (box.left + box.right) / 2, y: (box.top + box.bottom) / 2 };
  return GAPS.flatMap((gap) =>
    sides.flatMap((side, rank) =>
      SLIDES.map((slide): Candidate => {
        const x = side.x === 0 ? middle.x + slide : (side.x > 0 ? box.right : box.left) + side.x * gap;
        const y = side.y === 0 ? middle.y + slide : (side.y > 0 ? box.bottom : box.top) + side.y * gap;
        return { at: { x, y }, grows: side, cost: from + gap + Math.abs(slide) / 2 + 12 * rank };
      }),
    ),
  );
}
