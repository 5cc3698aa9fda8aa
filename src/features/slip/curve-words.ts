import { formatValue } from '#shared/units/format-value';
import { formatVoltage } from '../../formats/figures';
import type { DeviceView } from './device-view';

/** What the chart shows, for those who do not see it. */
export function curveText({ point, curve, end, load }: DeviceView): string {
  const ends = `At ${formatVoltage(end)} it would carry ${current(curve.id.at(-1) ?? 0)}.`;
  const knee =
    point.region === 'off' ? 'The device is off.' : `The knee is at VDSsat ${formatVoltage(point.vdsSat)}. ${ends}`;
  const here = `The device stands at VDS ${formatVoltage(Math.abs(point.vds))} with ${current(Math.abs(point.id))}.`;
  return `ID against VDS at VGS ${formatVoltage(point.vgs)}. ${knee} ${here} ${loadText(load)}`.trim();
}

function loadText(load: DeviceView['load']): string {
  if (load?.kind === 'fixed') return 'Ideal sources hold its VDS whatever it carries.';
  const [first, last] = [load?.points[0], load?.points.at(-1)];
  if (!first || !last) return '';
  return `The circuit offers ${current(first.id)} at VDS ${formatVoltage(first.vds)} and ${current(last.id)} at ${formatVoltage(last.vds)}.`;
}

function current(amperes: number): string {
  return formatValue(amperes, 'A');
}
