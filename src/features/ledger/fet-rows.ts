import type { FetPoint, Solution } from '#shared/analyses/operating-point-record';
import { type Standing, standingOf } from '#shared/analyses/verdict';
import { type Drawing, type DrawnFet, isFet } from '#shared/circuit/drawing';
import { byReference } from '#shared/circuit/reference-order';

/** A FET of the sheet, with its figures where the circuit is solved. */
export type FetRow = {
  readonly part: DrawnFet;
  readonly point: FetPoint | undefined;
  readonly standing: Standing | undefined;
};

export function fetRows(drawing: Drawing, solution: Pick<Solution, 'fets'> | undefined): FetRow[] {
  return drawing.parts.filter(isFet).map((part): FetRow => {
    const point = solution && Object.hasOwn(solution.fets, part.ref) ? solution.fets[part.ref] : undefined;
    const { intent } = part.values;
    return { part, point, standing: point && intent ? standingOf(point, intent) : undefined };
  });
}

/** Margin against the intent; without one, against the knee. In volts. */
export function marginOf({ point, standing }: FetRow): number | undefined {
  return standing?.margin ?? point?.saturationMargin;
}

/**
 * Least slack first. A device out of its intended region comes before any that is in it, whatever its margin says; devices
 * without an intent come last, in order of reference.
 */
export function bySlack(a: FetRow, b: FetRow): number {
  return rank(a) - rank(b) || slack(a) - slack(b) || byReference(a.part.ref, b.part.ref);
}

function rank({ standing }: FetRow): number {
  if (!standing) return 2;
  return standing.verdict === 'missed' ? 0 : 1;
}

function slack({ standing }: FetRow): number {
  return standing?.slack ?? 0;
}
