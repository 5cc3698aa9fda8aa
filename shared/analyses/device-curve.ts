import type { FetPart, ProcessSet } from '../circuit/circuit-file';
import { fetModel } from '../device/fet-model';
import { emptySquareLaw, squareLaw } from '../device/square-law';
import type { FetPoint } from './operating-point-record';

/** A device's output characteristic at the VGS and VSB of its operating point: V and A, all as magnitudes. */
export type DeviceCurve = {
  readonly vds: readonly number[];
  /** ID at each VDS. */
  readonly id: readonly number[];
  /** ID that the device has at its knee when VDSsat is this VDS, as VGS varies. */
  readonly knee: readonly number[];
};

/** The share of a scale within which two voltages are one. */
const SAME = 1e-6;

/** Where a curve is computed: evenly from 0 to `end`, and exactly at the operating point and at the knee. In volts. */
export function curveVoltages(
  { vds, vdsSat }: Pick<FetPoint, 'vds' | 'vdsSat'>,
  end: number,
  intervals = 40,
): number[] {
  const exact = [...new Set([Math.abs(vds), vdsSat])].filter((volts) => volts <= end);
  const even = Array.from({ length: intervals + 1 }, (_, index) => (end * index) / intervals);
  const apart = even.filter((volts) => exact.every((other) => Math.abs(volts - other) > SAME * end));
  return [...exact, ...apart].sort((x, y) => x - y);
}

/** The curve of one device over `voltages`; its VDS runs from the end of the channel that is its source now. */
export function deviceCurve(
  part: FetPart,
  processes: Readonly<Record<string, ProcessSet>>,
  /** °C */
  temperature: number,
  { vgs, vsb, vt }: Pick<FetPoint, 'vgs' | 'vsb' | 'vt'>,
  voltages: readonly number[],
): DeviceCurve {
  const model = fetModel(part, processes, temperature);
  const law = emptySquareLaw();
  const current = (gate: number, vds: number): number => {
    squareLaw(model, gate, vds, model.sign * vsb, law);
    return law.id;
  };
  return {
    vds: voltages,
    id: voltages.map((vds) => current(model.sign * vgs, vds)),
    knee: voltages.map((vds) => current(model.sign * vt + vds, vds)),
  };
}
