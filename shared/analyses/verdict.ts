import type { Intent } from '../circuit/circuit-file';
import type { FetPoint } from './operating-point-record';

export type Verdict = 'met' | 'thin' | 'missed';

/** A device against its intent, in volts. */
export type Standing = {
  readonly verdict: Verdict;
  /** How far it is inside the intended region, on that region's own axis. */
  readonly margin: number;
  /** The margin less the margin asked for. */
  readonly slack: number;
};

/** V: a margin this little short of what was asked is equal to it, since no solution is computed finer. */
const SAME = 1e-9;

/**
 * How a device stands against its intent. The region itself comes before any margin: an off device can have a large
 * saturation margin and still misses an intent to be saturated.
 */
export function standingOf(
  point: Pick<FetPoint, 'region' | 'vov' | 'saturationMargin'>,
  { region, margin: asked = 0 }: Intent,
): Standing {
  const margin = marginIn(region, point);
  const slack = margin - asked;
  const verdict = point.region !== region ? 'missed' : slack < -SAME ? 'thin' : 'met';
  return { verdict, margin, slack };
}

function marginIn(region: Intent['region'], point: Pick<FetPoint, 'vov' | 'saturationMargin'>): number {
  switch (region) {
    case 'saturated':
      return point.saturationMargin;
    case 'triode':
      // Zero less, not negated: a margin of −0 would be shown as such.
      return 0 - point.saturationMargin;
    case 'off':
      return 0 - point.vov;
  }
}
