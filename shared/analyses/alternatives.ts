import { type Problem, problem } from '../circuit/problem';
import { byReference } from '../circuit/reference-order';
import type { FetPoint, Solution } from './operating-point-record';

/** V and A, beside a share of a millionth: what differs by less does not differ. */
const SAME_VOLTAGE = 1e-6;
const SAME_CURRENT = 1e-12;
/** The share of a device's current at one point that counts as none at another. */
const NO_CURRENT = 1e-6;

/** The parts and nets at which two operating points of a circuit differ. */
export interface Difference {
  readonly fets: readonly string[];
  readonly nets: readonly string[];
}

export function differenceOf(one: Solution, other: Solution): Difference {
  const fets = Object.keys(one.fets).filter((ref) => {
    const [a, b] = [one.fets[ref], other.fets[ref]];
    return (
      a && b && (a.region !== b.region || !isSame(a.id, b.id, SAME_CURRENT) || !isSame(a.vds, b.vds, SAME_VOLTAGE))
    );
  });
  const nets = Object.keys(one.nets).filter((net) => !isSame(one.nets[net] ?? 0, other.nets[net] ?? 0, SAME_VOLTAGE));
  return { fets, nets };
}

/**
 * Whether a circuit that was never started may stay at `other` instead of coming to `point`: none of the devices at which
 * the two differ carries current there, and some of them do at `point`.
 */
export function isStartUpHazard(point: Solution, other: Solution): boolean {
  const { fets } = differenceOf(point, other);
  const current = (fet: FetPoint | undefined): number => Math.abs(fet?.id ?? 0);
  const most = Math.max(0, ...fets.map((ref) => current(point.fets[ref])));
  return most > 0 && fets.every((ref) => current(other.fets[ref]) <= NO_CURRENT * most);
}

/** What is to be said where a circuit has further operating points. */
export function remarkOnAlternatives(point: Solution, alternatives: readonly Solution[]): Problem[] {
  if (alternatives.length === 0) return [];
  const differences = alternatives.map((other) => differenceOf(point, other));
  const refs = [...new Set(differences.flatMap(({ fets }) => fets))].sort(byReference);
  const nets = [...new Set(differences.flatMap((difference) => difference.nets))].sort();
  const count = `${alternatives.length} more operating ${alternatives.length === 1 ? 'point' : 'points'}`;
  const about = refs.length > 0 ? ` of ${refs.join(', ')}` : '';
  const hazard = alternatives.some((other) => isStartUpHazard(point, other))
    ? ' One of them carries no current, and the circuit may stay there when it is switched on: it needs a start-up path that feeds a little current in.'
    : '';
  const unstable = alternatives.filter(({ surelyUnstable }) => surelyUnstable).length;
  const stability = unstable > 0 ? ` Surely unstable among them: ${unstable}.` : '';
  const message = `This circuit has ${count}${about}.${hazard}${stability}`;
  return [problem('several-operating-points', message, { refs, nets })];
}

function isSame(a: number, b: number, least: number): boolean {
  return Math.abs(a - b) <= least + 1e-6 * Math.max(Math.abs(a), Math.abs(b));
}
