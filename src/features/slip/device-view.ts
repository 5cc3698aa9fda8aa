import { useEffect, useMemo, useState } from 'react';
import { curveVoltages, type DeviceCurve, deviceCurve } from '#shared/analyses/device-curve';
import type { LoadLine } from '#shared/analyses/load-line';
import type { FetPoint } from '#shared/analyses/operating-point-record';
import { type CircuitFile, isFet } from '#shared/circuit/circuit-file';
import type { DrawnFet } from '#shared/circuit/drawing';
import { DEFAULT_TEMPERATURE } from '#shared/circuit/read-circuit';
import {
  useAskLoadLine,
  useFetPoint,
  useIsOtherPoint,
  useSolutionState,
  useSolvedCircuit,
} from '../../workers/solution';
import { curveEnd } from './curve-scale';

/** A FET where it stands: its point, its own curve and, as soon as it is known, the load it sees. V and A as magnitudes. */
export type DeviceView = {
  readonly point: FetPoint;
  /** Where the VDS scale ends. */
  readonly end: number;
  readonly curve: DeviceCurve;
  readonly load: LoadLine | undefined;
  /** These are the figures of an earlier circuit. */
  readonly outdated: boolean;
};

/** Undefined while the circuit is not solved. */
export function useDeviceView({ ref, values: { intent } }: DrawnFet): DeviceView | undefined {
  const point = useFetPoint(ref);
  const circuit = useSolvedCircuit();
  const outdated = useSolutionState() !== 'current';
  const own = useMemo(() => {
    const part = circuit?.parts.find((candidate) => candidate.ref === ref);
    if (!circuit || !point || !part || !isFet(part)) return undefined;
    const end = curveEnd(point, intent);
    const voltages = curveVoltages(point, end);
    const { processes = {}, temperature = DEFAULT_TEMPERATURE } = circuit;
    return { point, end, curve: deviceCurve(part, processes, temperature, point, voltages) };
  }, [circuit, point, ref, intent]);
  // The load is known as it is at the first point.
  const elsewhere = useIsOtherPoint();
  const line = useLoadLine(ref, own?.curve.vds, outdated || elsewhere ? undefined : circuit);
  const load = elsewhere ? undefined : line;
  return useMemo(() => own && { ...own, load, outdated }, [own, load, outdated]);
}

/** The load a FET sees in a circuit that was solved; undefined until it is known. */
function useLoadLine(
  ref: string,
  voltages: readonly number[] | undefined,
  circuit: CircuitFile | undefined,
): LoadLine | undefined {
  const ask = useAskLoadLine();
  const [known, setKnown] = useState<{ readonly of: readonly number[]; readonly line: LoadLine | undefined }>();
  useEffect(() => {
    if (!circuit || !voltages) return;
    let wanted = true;
    void ask(ref, voltages).then((line) => wanted && setKnown({ of: voltages, line }));
    return () => {
      wanted = false;
    };
  }, [ask, ref, voltages, circuit]);
  // Voltages are laid out anew for each circuit, so they tell whose answer this is.
  return known?.of === voltages ? known?.line : undefined;
}
