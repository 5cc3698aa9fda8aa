import type { Region } from '#shared/circuit/circuit-file';

/** The piece of the device's own curve that it stands on. */
const CURVE: Record<Region, string> = {
  off: 'M1.5 11.5H13',
  triode: 'M2 11.5L12 2',
  saturated: 'M1.5 12C2.5 5.5 4.5 3 8.5 3H13',
};

export const REGION_COLOUR: Record<Region, string> = {
  off: 'text-off',
  triode: 'text-triode',
  saturated: 'text-saturated',
};

/** Always beside the region's word, which says the same. */
export function RegionGlyph({ region }: { region: Region }) {
  return (
    <svg width="14" height="14" viewBox="0 0 14 14" fill="none" aria-hidden="true" className="shrink-0">
      <path d="M1.5 1V12.5H13" stroke="var(--edge)" />
      <path d={CURVE[region]} stroke={`var(--${region})`} strokeWidth="2" />
    </svg>
  );
}
