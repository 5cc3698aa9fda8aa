import { figureColumn } from '../../formats/figures';
import type { DeviceView } from './device-view';

/** The chart's numbers: at each VDS what the device would carry and what the circuit would give it. */
export function CurveTable({ view: { curve, load, point } }: { view: DeviceView }) {
  const offered = new Map(load?.kind === 'swept' ? load.points.map(({ vds, id }) => [vds, id]) : []);
  const columns = [
    { name: 'VDS', ...figureColumn(curve.vds, 'V', 0) },
    { name: 'ID device', ...figureColumn(curve.id, 'A') },
    {
      name: 'ID load',
      ...figureColumn(
        curve.vds.map((vds) => offered.get(vds)),
        'A',
      ),
    },
  ];
  const here = Math.abs(point.vds);
  const markOf = (vds: number) => (vds === here ? 'point' : vds === point.vdsSat && vds > 0 ? 'knee' : undefined);
  // Half of the even steps tell a reader enough; the two that matter are always there.
  const rows = curve.vds.flatMap((vds, row) => (row % 2 === 0 || markOf(vds) ? [{ vds, row, mark: markOf(vds) }] : []));
  return (
    <table aria-label="Numbers of the curve" className="w-full text-xs whitespace-nowrap">
      <thead className="text-faint shadow-[inset_0_-1px_var(--rule)]">
        <tr>
          {columns.map(({ name, unit }) => (
            <th key={name} scope="col" className="whitespace-normal pr-3 pb-0.5 align-bottom last:pr-0">
              {name} / {unit}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {rows.map(({ vds, row, mark }) => (
          <tr key={vds} className={mark === 'point' ? 'font-bold' : undefined}>
            {columns.map(({ name, texts }, column) => (
              <td key={name} className="pr-3 last:pr-0">
                {texts[row]}
                {column === 0 && mark && <span className="text-faint"> {mark}</span>}
              </td>
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
}
