import { useId } from 'react';
import type { FetPoint } from '#shared/analyses/operating-point-record';
import type { Intent } from '#shared/circuit/circuit-file';
import { formatVoltage } from './figures';
import { formatMillivolts } from './standing-words';

const HEIGHT = 14;
const BAR_TOP = 8;
const BAR_FOOT = 11;
const MARKER_Y = 3.5;

/**
 * A ruler along VDS from 0 to `scaleEnd` volts: triode below the knee, saturated above, a tick at the knee, a dot where the
 * device is (an arrow where it is off the scale), a notch at the margin asked for. `width` in px.
 */
export function MarginRuler({
  point,
  intent,
  scaleEnd,
  width,
}: {
  point: FetPoint;
  intent: Intent | undefined;
  scaleEnd: number;
  width: number;
}) {
  const clip = useId();
  const at = (volts: number) => (volts / scaleEnd) * width;
  const knee = Math.min(width, at(point.vdsSat));
  const vds = at(Math.abs(point.vds));
  const notch = notchAt(point, intent);
  const notchX = notch === undefined ? undefined : at(notch);
  const whole = `M0 0H${width}V${HEIGHT}H0Z`;
  return (
    <svg
      width={width}
      height={HEIGHT}
      viewBox={`0 0 ${width} ${HEIGHT}`}
      role="img"
      aria-label={rulerText(point, intent)}
      className="block overflow-visible"
    >
      {notchX !== undefined && notchX <= width && (
        <clipPath id={clip}>
          <path
            clipRule="evenodd"
            d={`${whole}M${notchX - 1} ${BAR_TOP}H${notchX + 1}L${notchX + 2.5} ${BAR_FOOT}H${notchX - 2.5}Z`}
          />
        </clipPath>
      )}
      <g clipPath={notchX !== undefined && notchX <= width ? `url(#${clip})` : undefined}>
        {point.region === 'off' ? (
          <path d={bar(0, width)} fill="var(--off)" />
        ) : (
          <>
            <path d={bar(0, knee)} fill="var(--triode)" />
            <path d={bar(knee, width)} fill="var(--saturated)" />
          </>
        )}
      </g>
      {point.region !== 'off' && <path d={`M${hairline(knee)} 6V13`} stroke="var(--ink)" />}
      {vds <= width ? (
        <circle cx={vds} cy={MARKER_Y} r="3" fill="var(--ink)" />
      ) : (
        <g>
          <path d={`M${width - 13} ${MARKER_Y}H${width - 5}`} stroke="var(--ink)" />
          <path
            d={`M${width - 6} ${MARKER_Y - 3}L${width} ${MARKER_Y}L${width - 6} ${MARKER_Y + 3}Z`}
            fill="var(--ink)"
          />
        </g>
      )}
    </svg>
  );
}

function bar(from: number, to: number): string {
  return `M${from} ${BAR_TOP}H${to}V${BAR_FOOT}H${from}Z`;
}

function hairline(x: number): number {
  return Math.floor(x) + 0.5;
}

/** The VDS at which the margin asked for would just be had; an off device's margin lies along VGS instead. */
function notchAt({ vdsSat, region }: FetPoint, intent: Intent | undefined): number | undefined {
  if (region === 'off' || !intent?.margin) return undefined;
  if (intent.region === 'saturated') return vdsSat + intent.margin;
  return intent.region === 'triode' && vdsSat > intent.margin ? vdsSat - intent.margin : undefined;
}

/** What the ruler shows, in words. */
export function rulerText(
  { region, vds, vdsSat, saturationMargin, vov }: FetPoint,
  intent: Intent | undefined,
): string {
  const at = `VDS ${formatVoltage(vds)}`;
  const asked = intent?.margin ? `, ${formatMillivolts(intent.margin)} asked for` : '';
  if (region === 'off') return `${at}, VOV ${formatVoltage(vov)}${asked}`;
  const side = saturationMargin < 0 ? 'below' : 'above';
  return `${at}, ${formatMillivolts(Math.abs(saturationMargin))} ${side} VDSsat ${formatVoltage(vdsSat)}${asked}`;
}
