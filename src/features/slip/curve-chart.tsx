import { useLayoutEffect, useRef } from 'react';
import UPlot from 'uplot';
import 'uplot/dist/uPlot.min.css';
import { engineeringExponent, formatScaled } from '#shared/units/format-value';
import { type ChartColours, readColours, useThemeChanges } from './chart-colours';
import { drawMarks } from './curve-marks';
import { currentEnd } from './curve-scale';
import { curveText } from './curve-words';
import type { DeviceView } from './device-view';

/** In px. */
export type ChartSize = { readonly width: number; readonly height: number; readonly axis: number };

const FONT = '12px "JetBrains Mono", monospace';

/** The device's own curve, its knee locus, the load it sees, and where the two meet. */
export default function CurveChart({ view, size }: { view: DeviceView; size: ChartSize }) {
  const place = useRef<HTMLDivElement>(null);
  const theme = useThemeChanges();
  useLayoutEffect(() => {
    // The theme is read from the page, where React cannot see it change.
    void theme;
    if (!place.current) return;
    const chart = new UPlot(options(view, size, readColours(place.current)), data(view), place.current);
    return () => chart.destroy();
  }, [view, size, theme]);
  return <div ref={place} role="img" aria-label={curveText(view)} style={{ height: size.height }} />;
}

/** VDS; then knee locus, load, and the device's curve below and above its knee. */
function data({ point, curve, load }: DeviceView): UPlot.AlignedData {
  const offered = new Map(load?.kind === 'swept' ? load.points.map(({ vds, id }) => [vds, id]) : []);
  const isOff = point.region === 'off';
  return [
    [...curve.vds],
    [...curve.knee],
    curve.vds.map((vds) => offered.get(vds) ?? null),
    curve.vds.map((vds, index) => (isOff || vds <= point.vdsSat ? (curve.id[index] ?? null) : null)),
    curve.vds.map((vds, index) => (!isOff && vds >= point.vdsSat ? (curve.id[index] ?? null) : null)),
  ];
}

function options(view: DeviceView, { width, height, axis }: ChartSize, colours: ChartColours): UPlot.Options {
  const { point, end, curve, load } = view;
  const most = currentEnd(curve.id, load?.kind === 'swept' ? load.points.map(({ id }) => id) : []);
  const exponent = engineeringExponent(most);
  const bare: UPlot.Series = { points: { show: false } };
  return {
    width,
    height,
    padding: [28, 0, 0, 0],
    // Rounded to whole pixels, a curve that hardly rises would climb in steps.
    pxAlign: false,
    legend: { show: false },
    cursor: { show: false },
    scales: { x: { time: false, range: [0, end] }, y: { range: [0, most] } },
    axes: [
      { show: false },
      {
        size: axis,
        gap: 6,
        font: FONT,
        stroke: colours.faint,
        splits: [most / 2, most],
        values: (_, splits) => splits.map((amperes) => shortest(amperes, exponent)),
        grid: { stroke: colours.rule, width: 1 },
        ticks: { show: false },
      },
    ],
    series: [
      {},
      { ...bare, stroke: colours.faint, width: 1, dash: [1, 3] },
      { ...bare, stroke: colours.ink, width: 1 },
      { ...bare, stroke: point.region === 'off' ? colours.off : colours.triode, width: 2 },
      { ...bare, stroke: colours.saturated, width: 2 },
    ],
    hooks: { draw: [(chart) => drawMarks(chart, view, colours, exponent, FONT)] },
  };
}

/** A round number in full, without zeros at its end. */
function shortest(amperes: number, exponent: number): string {
  return String(Number(formatScaled(amperes, exponent, 3)));
}
