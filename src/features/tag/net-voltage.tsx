import { dimmed } from '../../formats/dimmed';
import { formatVoltage } from '../../formats/figures';
import { useNetVoltage, useSolutionState } from '../../workers/solution';

/** A net's voltage, for the gap in its wire; nothing while there is none. */
export function NetVoltage({ net }: { net: string }) {
  const state = useSolutionState();
  const volts = useNetVoltage(net);
  if (volts === undefined) return null;
  const busy = state !== 'current';
  return (
    <span aria-busy={busy} className={dimmed(busy)} title={formatVoltage(volts, 4)}>
      {formatVoltage(volts)}
    </span>
  );
}
