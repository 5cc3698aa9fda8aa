import type { Solution } from '#shared/analyses/operating-point-record';
import { standingOf, type Verdict } from '#shared/analyses/verdict';
import { type CircuitFile, isFet } from '#shared/circuit/circuit-file';

export type VerdictTally = Readonly<Record<Verdict, number>>;

export type SheetSummary = {
  /** The devices with an intent by how they stand. */
  readonly verdicts: VerdictTally;
  /**
   * What the supplies deliver, in amperes: the sum over the voltage sources that deliver power of the current that each sends
   * out. A source that takes current in, or that only holds a gate, adds nothing.
   */
  readonly current: number;
  /** What all sources together deliver, in watts, those that take power in counted against it: all that the circuit turns to heat. */
  readonly power: number;
};

export function sheetSummary(circuit: CircuitFile, solution: Pick<Solution, 'fets' | 'sources'>): SheetSummary {
  const verdicts = { met: 0, thin: 0, missed: 0 };
  for (const part of circuit.parts) {
    if (!isFet(part) || !part.intent) continue;
    const point = Object.hasOwn(solution.fets, part.ref) ? solution.fets[part.ref] : undefined;
    if (point) verdicts[standingOf(point, part.intent).verdict] += 1;
  }
  const power = Object.values(solution.sources).reduce((sum, source) => sum + source.power, 0);
  const current = circuit.parts.reduce((sum, { kind, ref }) => {
    const source = kind === 'voltage' && Object.hasOwn(solution.sources, ref) ? solution.sources[ref] : undefined;
    return source && source.power > 0 ? sum + Math.abs(source.current) : sum;
  }, 0);
  return { verdicts, current, power };
}
