import type { FetPoint } from '#shared/analyses/operating-point-record';
import type { Intent } from '#shared/circuit/circuit-file';

const VDS_STEPS = [1, 2, 5, 10];
const CURRENT_STEPS = [1, 1.5, 2, 3, 4, 5, 6, 8, 10];
/** Room beyond the furthest mark, as a share of it. */
const ROOM = 1.15;
/** Where a device carries nothing and nothing is known of its load, the current axis ends here, in amperes. */
const NO_CURRENT = 1e-6;

/** Where the VDS scale of a device's curve ends, in volts: past the point, the knee and the margin asked for. */
export function curveEnd({ vds, vdsSat }: FetPoint, intent: Intent | undefined): number {
  const furthest = Math.max(Math.abs(vds), vdsSat + (intent?.region === 'saturated' ? (intent.margin ?? 0) : 0));
  return furthest === 0 ? 1 : roundUp(furthest * ROOM, VDS_STEPS);
}

/** Where the current axis ends, in amperes: past all that the device carries; for one that is off, all that its load gives. */
export function currentEnd(device: readonly number[], load: readonly number[]): number {
  const most = Math.max(0, ...device) || Math.max(0, ...load);
  return most === 0 ? NO_CURRENT : roundUp(most * ROOM, CURRENT_STEPS);
}

function roundUp(value: number, steps: readonly number[]): number {
  const decade = 10 ** Math.floor(Math.log10(value));
  const step = steps.find((candidate) => value <= candidate * decade * (1 + 1e-9)) ?? 10;
  return Number((step * decade).toPrecision(2));
}
