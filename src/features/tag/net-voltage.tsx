import { formatVoltage } from '../../formats/figures';
import { useNetVoltage, useSolution } from '../../workers/solution';

/** A net's voltage, for the gap in its wire; nothing while there is none. */
export function NetVoltage({ net }: { net: string }) {
  const { state } = useSolution();
  const volts = useNetVoltage(net);
  if (volts === undefined) return null;
  const busy = state !== 'current';
  return (
    <span aria-busy={busy} className={busy ? 'opacity-45' : undefined} title={formatVoltage(volts, 4)}>
      {formatVoltage(volts)}
    </span>
  );
}
