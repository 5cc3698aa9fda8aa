const WIDTH = 640;
const HEIGHT = 440;
const FOOT = 400;
const LEFT = 40;
const LAMBDA = 0.08;
const OVERDRIVES = [0.16, 0.24, 0.32, 0.4] as const;
/** The device the point rests on. */
const SHOWN = 0.32;
const POINT_VDS = 0.56;
const VDS_END = 1;

/** Square law with the channel-length factor in both regions, in units of kn·V². */
function current(overdrive: number, vds: number): number {
  const channel = vds < overdrive ? (overdrive - vds / 2) * vds : overdrive ** 2 / 2;
  return channel * (1 + LAMBDA * vds);
}

const x = (vds: number) => LEFT + (vds / VDS_END) * 560;
const y = (id: number) => FOOT - (id / 0.092) * 360;

function path(curve: (vds: number) => number, from: number, to: number): string {
  const steps = 48;
  return Array.from({ length: steps + 1 }, (_, step) => {
    const vds = from + ((to - from) * step) / steps;
    return `${step === 0 ? 'M' : 'L'}${x(vds).toFixed(1)} ${y(curve(vds)).toFixed(1)}`;
  }).join('');
}

/** What the product is about, in one figure: a device's curves, the locus of their knees, a load and the point at rest. */
export function CurveFamily() {
  const id = current(SHOWN, POINT_VDS);
  const point = { x: x(POINT_VDS), y: y(id) };
  // The load runs through the point and meets the axis where the supply would be.
  const supply = 0.94;
  const slope = id / (supply - POINT_VDS);
  return (
    <svg viewBox={`0 0 ${WIDTH} ${HEIGHT}`} className="w-full max-w-180 text-xs" fill="none" aria-hidden="true">
      <path d={`M${LEFT + 0.5} 20V${FOOT + 0.5}H${WIDTH - 20}`} stroke="var(--ink)" />
      <path d={path((vds) => current(vds, vds), 0, 0.42)} stroke="var(--faint)" strokeDasharray="2 4" />
      {OVERDRIVES.map((overdrive) => {
        const shown = overdrive === SHOWN;
        const curve = (vds: number) => current(overdrive, vds);
        return (
          <g key={overdrive} strokeWidth={shown ? 2.5 : 1}>
            <path d={path(curve, 0, overdrive)} stroke={shown ? 'var(--triode)' : 'var(--edge)'} />
            <path d={path(curve, overdrive, VDS_END)} stroke={shown ? 'var(--saturated)' : 'var(--edge)'} />
          </g>
        );
      })}
      <path d={path((vds) => slope * (supply - vds), 0.14, supply)} stroke="var(--ink)" />
      <path d={`M${point.x} ${point.y}V${FOOT}`} stroke="var(--ink)" strokeDasharray="3 3" />
      <circle cx={point.x} cy={point.y} r={6} fill="var(--ink)" stroke="var(--sheet)" strokeWidth={2} />
      <g fill="var(--faint)">
        <text x={LEFT} y={14} textAnchor="middle">
          ID
        </text>
        <text x={WIDTH - 20} y={FOOT + 22} textAnchor="end">
          VDS
        </text>
        <text x={x(0.425)} y={y(current(0.42, 0.42)) - 6} textAnchor="middle">
          knee
        </text>
        <text x={x(supply) + 8} y={FOOT - 10}>
          load
        </text>
      </g>
      <text x={x(0.1) + 14} y={y(current(SHOWN, 0.1)) + 22} fill="var(--triode)" className="font-bold">
        triode
      </text>
      <text x={x(0.8)} y={y(current(SHOWN, 0.8)) - 10} fill="var(--saturated)" className="font-bold">
        saturated
      </text>
      <text x={point.x + 14} y={point.y + 26} fill="var(--ink)">
        the still point
      </text>
    </svg>
  );
}
