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
      <path d={path((vds) => slope * (supply - vds), supply - 0.09 / slope, supply)} stroke="var(--ink)" />
      <path d={`M${point.x} ${point.y}V${FOOT}`} stroke="var(--ink)" strokeDasharray="3 3" />
      <circle cx={point.x} cy={point.y} r={6} fill="var(--ink)" stroke="var(--sheet)" strokeWidth={2} />
      {/* Words break the lines they cross, as a net's name breaks its wire. */}
      <g stroke="var(--sheet)" strokeWidth={8} style={{ paintOrder: 'stroke' }}>
        <text x={LEFT} y={14} textAnchor="middle" fill="var(--faint)">
          ID
        </text>
        <text x={WIDTH - 20} y={FOOT + 22} textAnchor="end" fill="var(--faint)">
          VDS
        </text>
        <text x={x(0.42)} y={y(current(0.42, 0.42)) - 8} textAnchor="middle" fill="var(--faint)">
          knee
        </text>
        <text x={x(0.8)} y={y(slope * (supply - 0.8)) + 4} textAnchor="middle" fill="var(--faint)">
          load
        </text>
        <text x={x(0.2)} y={y(current(SHOWN, 0.2)) + 4} textAnchor="middle" fill="var(--triode)" className="font-bold">
          triode
        </text>
        <text
          x={x(0.88)}
          y={y(current(SHOWN, 0.88)) + 4}
          textAnchor="middle"
          fill="var(--saturated)"
          className="font-bold"
        >
          saturated
        </text>
        <text x={point.x + 12} y={point.y - 14} fill="var(--ink)">
          the still point
        </text>
      </g>
    </svg>
  );
}
