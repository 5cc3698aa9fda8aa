import type UPlot from 'uplot';
import { PREFIX_FOR_EXPONENT } from '#shared/units/si-prefix';
import { formatVoltage } from '../../formats/figures';
import type { ChartColours } from './chart-colours';
import type { DeviceView } from './device-view';

/** What stands on the chart beside its lines: axes, names, and the point on its way down to the ruler. In px of the page. */
export function drawMarks(
  chart: UPlot,
  view: DeviceView,
  colours: ChartColours,
  /** Power of ten of the current axis. */
  exponent: number,
  font: string,
): void {
  const { ctx } = chart;
  const scale = devicePixelRatio;
  const frame = {
    left: chart.bbox.left / scale,
    top: chart.bbox.top / scale,
    right: (chart.bbox.left + chart.bbox.width) / scale,
    foot: (chart.bbox.top + chart.bbox.height) / scale,
  };
  const at = (vds: number, id: number) => ({
    x: chart.valToPos(vds, 'x') + frame.left,
    y: chart.valToPos(id, 'y') + frame.top,
  });
  ctx.save();
  ctx.scale(scale, scale);
  ctx.font = font;
  ctx.textBaseline = 'alphabetic';

  const line = (colour: string, points: readonly (readonly [number, number])[], dash: number[] = []) => {
    ctx.strokeStyle = colour;
    ctx.lineWidth = 1;
    ctx.setLineDash(dash);
    ctx.beginPath();
    for (const [x, y] of points) ctx.lineTo(x, y);
    ctx.stroke();
  };
  /** Text over a ground of its own, so that lines run behind it. */
  const text = (words: string, x: number, y: number, colour: string, align: CanvasTextAlign = 'left') => {
    ctx.textAlign = align;
    ctx.setLineDash([]);
    ctx.lineJoin = 'round';
    ctx.lineWidth = 5;
    ctx.strokeStyle = colours.sheet;
    ctx.strokeText(words, x, y);
    ctx.fillStyle = colour;
    ctx.fillText(words, x, y);
  };

  line(colours.edge, [
    [half(frame.left), frame.top],
    [half(frame.left), half(frame.foot) - 1],
    [frame.right, half(frame.foot) - 1],
  ]);
  const head = frame.top - 15;
  text(`ID / ${PREFIX_FOR_EXPONENT.get(exponent) ?? ''}A`, 0, head, colours.faint);
  nameKnee();
  nameCurve();
  nameLoad();
  markPoint();
  ctx.restore();

  function nameKnee(): void {
    const { curve, point } = view;
    if (point.region === 'off') return;
    const most = chart.scales.y?.max ?? 0;
    const leaves = curve.knee.findIndex((id) => id > most);
    const index = leaves < 0 ? curve.vds.length - 1 : leaves;
    const { x } = at(curve.vds[index] ?? 0, 0);
    text('knee', Math.min(frame.right - 30, Math.max(frame.left + 42, x - 15)), head, colours.faint);
  }

  function nameCurve(): void {
    const { point, curve } = view;
    const colour = point.region === 'off' ? colours.off : colours.saturated;
    const { y } = at(0, curve.id.at(-1) ?? 0);
    text(`VGS ${formatVoltage(point.vgs)}`, frame.right, y - 7, colour, 'right');
  }

  function nameLoad(): void {
    const { load } = view;
    if (load?.kind === 'fixed') {
      const { x } = at(load.vds, 0);
      line(colours.ink, [
        [half(x), frame.top],
        [half(x), frame.foot],
      ]);
      return;
    }
    const spot = load && roomiestSpot(load.points.map(({ vds, id }) => at(vds, id)));
    if (!spot) return;
    if (spot.isLevel) {
      text('load', Math.min(spot.x, frame.right - 30), spot.y - 6, colours.ink);
      return;
    }
    const toTheRight = spot.x + 36 <= frame.right;
    text('load', toTheRight ? spot.x + 6 : spot.x - 6, spot.y + 4, colours.ink, toTheRight ? 'left' : 'right');
  }

  /** The spot on the load line that is furthest from the device's curve, away from the frame's edges. */
  function roomiestSpot(spots: readonly { x: number; y: number }[]) {
    const { curve } = view;
    const drawn = spots.map((spot, index) => {
      const next = spots[index + 1] ?? spots[index - 1] ?? spot;
      return { ...spot, isLevel: Math.abs(next.y - spot.y) < Math.abs(next.x - spot.x) / 2 };
    });
    const lines = curve.vds.map((vds, index) => at(vds, curve.id[index] ?? 0));
    const distance = (spot: { x: number; y: number }) =>
      Math.min(...lines.map(({ x, y }) => Math.hypot(x - spot.x, y - spot.y)));
    const within = drawn.filter(({ x, y }) => y > frame.top + 10 && y < frame.foot - 8 && x > frame.left + 8);
    return within.toSorted((one, other) => distance(other) - distance(one))[0];
  }

  function markPoint(): void {
    const { point } = view;
    const { x, y } = at(Math.abs(point.vds), Math.abs(point.id));
    line(
      colours.ink,
      [
        [half(x), y],
        [half(x), frame.foot],
      ],
      [2, 2],
    );
    ctx.setLineDash([]);
    ctx.fillStyle = colours.ink;
    ctx.strokeStyle = colours.sheet;
    ctx.lineWidth = 2;
    ctx.beginPath();
    ctx.arc(x, y, 4.5, 0, 2 * Math.PI);
    ctx.stroke();
    ctx.fill();
  }
}

function half(px: number): number {
  return Math.floor(px) + 0.5;
}
