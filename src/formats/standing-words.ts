import type { Standing, Verdict } from '#shared/analyses/verdict';
import { formatScaled } from '#shared/units/format-value';

/** Margins are always told in millivolts, so that they compare. */
export function formatMillivolts(volts: number): string {
  return `${formatScaled(volts, -3)}\u00a0mV`;
}

/** By how much a verdict is what it is: `missed by 114 mV`; a device in the wrong region with slack to spare is just missed. */
export function standingWords({ verdict, slack }: Standing): { verdict: Verdict; by: string } {
  if (verdict === 'met') return { verdict, by: `with ${formatMillivolts(slack)} to spare` };
  return { verdict, by: slack < 0 ? `by ${formatMillivolts(-slack)}` : '' };
}
