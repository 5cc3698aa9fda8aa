import { differenceOf, isStartUpHazard } from '#shared/analyses/alternatives';
import type { Solution as Point } from '#shared/analyses/operating-point-record';
import type { CircuitFile } from '#shared/circuit/circuit-file';
import { formatValue } from '#shared/units/format-value';
import { sheetSummary } from './sheet-summary';

export type PointWords = {
  /** What the point is, in a few words. */
  readonly name: string;
  /** What that means to the designer; left out where there is nothing to say. */
  readonly meaning?: string;
  /** Nobody would want the circuit here. */
  readonly grave: boolean;
};

/** What sets a point of a circuit apart from its first. */
export function pointWords(points: readonly Point[], index: number): PointWords {
  const [first] = points;
  const point = points[index];
  if (!first || !point) return { name: 'not known', grave: false };
  if (index > 0 && isStartUpHazard(first, point)) {
    const meaning = 'start-up hazard: the circuit may stay here when it is switched on; add a start-up path';
    return { name: whereNoCurrentFlows(first, point), meaning, grave: true };
  }
  if (point.surelyUnstable) {
    return { name: 'surely unstable', meaning: 'the circuit does not stay here', grave: true };
  }
  return { name: index === 0 ? 'the first point' : 'another point', grave: false };
}

/** The point's sums: how many devices conduct, and what its sources deliver. */
export function pointFigures(circuit: CircuitFile, point: Point): string {
  const fets = Object.values(point.fets);
  const on = fets.filter(({ region }) => region !== 'off').length;
  const { current, power } = sheetSummary(circuit, point);
  return `${on} of ${fets.length} FETs on · ${formatValue(current, 'A')} · ${formatValue(power, 'W')}`;
}

function whereNoCurrentFlows(first: Point, point: Point): string {
  if (Object.values(point.fets).every(({ region }) => region === 'off')) return 'all devices off, no current flows';
  return `no current in ${differenceOf(first, point).fets.join(', ')}`;
}
