import type { OperatingPointRecord, Solution as Point } from '#shared/analyses/operating-point-record';
import type { Problem, ProblemCode } from '#shared/circuit/problem';

/** The point that somebody looks at. It is chosen among those of one record, and another record begins at its first. */
export type PointChoice = { readonly record: OperatingPointRecord; readonly index: number };

/** All points of a circuit as a page shows them. */
export type OperatingPoints = {
  /** In the order of the record; empty while there are none. */
  readonly points: readonly Point[];
  /** Which of them the figures are of. */
  readonly shown: number;
  /** How many there are, as far as is known: while a changed circuit is solved and searched, as many as before. */
  readonly count: number;
};

export const NO_POINTS: OperatingPoints = { points: [], shown: 0, count: 0 };

export function operatingPoints(
  record: OperatingPointRecord | undefined,
  choice: PointChoice | undefined,
  countBefore: number | undefined,
): OperatingPoints {
  if (record?.status !== 'solved') return NO_POINTS;
  const points = [record, ...record.alternatives];
  const shown = choice?.record === record && choice.index < points.length ? choice.index : 0;
  return { points, shown, count: Math.max(points.length, countBefore ?? 0) };
}

/** What is told of a circuit's first point and may be otherwise at another. */
const OF_THE_POINT: ReadonlySet<ProblemCode> = new Set<ProblemCode>([
  'reversed-channel',
  'weak-overdrive',
  'nearly-on',
  'body-forward',
  'beyond-supplies',
  'undriven-net',
  'intent-missed',
  'intent-thin',
]);

/**
 * The problems that hold at the point shown: a record tells those of its first point alone. A hazardous voltage stays told
 * whatever is looked at.
 */
export function problemsAt(record: OperatingPointRecord, shown: number): readonly Problem[] {
  return shown === 0 ? record.problems : record.problems.filter(({ code }) => !OF_THE_POINT.has(code));
}
