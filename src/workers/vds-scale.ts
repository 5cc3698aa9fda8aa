import type { Solution } from '#shared/analyses/operating-point-record';

const STEPS = [1, 2, 5, 10];

/**
 * Where the margin rulers of a sheet end, in volts: the 1-2-5 number nearest to the largest |VDS| on it, so that all rulers
 * compare and knees are not squeezed together, but never below a knee or the place of a margin that is asked for.
 */
export function vdsScale({ fets }: Pick<Solution, 'fets'>, askedOf: (ref: string) => number = () => 0): number {
  let largest = 0;
  let furthestMark = 0;
  for (const [ref, { vds, vdsSat }] of Object.entries(fets)) {
    largest = Math.max(largest, Math.abs(vds));
    furthestMark = Math.max(furthestMark, vdsSat > 0 ? vdsSat + askedOf(ref) : 0);
  }
  if (largest === 0 && furthestMark === 0) return 1;
  const nearest = largest === 0 ? 0 : roundNumber(largest, (step, next) => Math.sqrt(step * next));
  return Math.max(nearest, furthestMark <= nearest ? 0 : roundNumber(furthestMark, (step) => step));
}

/** The first 1-2-5 number whose limit `value` does not pass; the limit lies between that number and the next. */
function roundNumber(value: number, limit: (step: number, next: number) => number): number {
  const decade = 10 ** Math.floor(Math.log10(value));
  const digits = value / decade;
  for (const [index, step] of STEPS.entries()) {
    if (digits <= limit(step, STEPS[index + 1] ?? 20) * (1 + 1e-9)) return Number((step * decade).toPrecision(1));
  }
  return 10 * decade;
}
