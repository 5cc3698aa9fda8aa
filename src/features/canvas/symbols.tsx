import type { Region } from '#shared/circuit/circuit-file';
import type { SymbolKind } from '#shared/geometry/pins';
import { orient, type Place } from '#shared/geometry/place';
import { ownBox } from './symbol-box';

type SymbolProps = {
  readonly kind: SymbolKind;
  /** Colours a FET's channel; unknown while the circuit is unsolved. */
  readonly region?: Region | undefined;
  /** A FET that conducts without a gate voltage: its channel is one solid stroke. */
  readonly depletion?: boolean;
  readonly bodyLedOut?: boolean;
};

/** A symbol after IEC 60617 in its own drawing, its terminals where shared/geometry/pins has them. */
export function PartSymbol({ kind, region, depletion = false, bodyLedOut = false }: SymbolProps) {
  switch (kind) {
    case 'nfet':
    case 'pfet':
      return <FetSymbol n={kind === 'nfet'} region={region} depletion={depletion} bodyLedOut={bodyLedOut} />;
    case 'resistor':
      return (
        <>
          <path className="lead" d="M0-30V-20M0 20V30" />
          <path className="body" d="M-8-20H8V20H-8Z" />
        </>
      );
    case 'capacitor':
      return (
        <>
          <path className="lead" d="M0-20V-3M0 3V20" />
          <path className="body" d="M-12-3H12M-12 3H12" />
        </>
      );
    case 'inductor':
      return (
        <>
          <path className="lead" d="M0-30V-20M0 20V30" />
          <path className="body" d="M0-20a5 5 0 0 1 0 10a5 5 0 0 1 0 10a5 5 0 0 1 0 10a5 5 0 0 1 0 10" />
        </>
      );
    case 'voltage':
      return (
        <>
          <path className="lead" d="M0-30V30M10-27H18M14-31V-23" />
          <circle className="body" r={18} />
        </>
      );
    case 'current':
      return (
        <>
          <path className="lead" d="M0-30V-18M0 18V30M0 11V-4" />
          <path className="arrow" d="M0-12L4.5-3H-4.5Z" />
          <circle className="body" r={18} />
        </>
      );
    case 'ground':
      return (
        <>
          <path className="lead" d="M0 0V10" />
          <path className="body" d="M-11 10H11M-6.5 15H6.5M-2 20H2" />
        </>
      );
    case 'supply':
      return (
        <>
          <path className="lead" d="M0 0V-10" />
          <path className="body" d="M-10-10H10" />
        </>
      );
    case 'net-name':
      return (
        <>
          <path className="lead" d="M0 0H-6" />
          <circle className="body" cx={-9} r={3} />
        </>
      );
    case 'junction':
      return null;
    case 'note':
      return <path className="lead" d="M0 4H22M0 9H22M0 14H14" />;
  }
}

/** Drawn as the N device; P is its mirror image top for bottom, the arrow turned about. */
function FetSymbol({ n, region, depletion, bodyLedOut }: Omit<SymbolProps, 'kind'> & { n: boolean }) {
  const channel = depletion ? 'M-16-35V5' : 'M-16-35V-25M-16-20V-10M-16-5V5';
  const body = bodyLedOut ? 'M-16-15H10V-20H20' : 'M-16-15H0V0';
  return (
    <g transform={n ? undefined : 'scale(1 -1)'}>
      <path className="lead" d={`M-40 0H-23M0-40V-30H-16M0 10V0H-16${body}`} />
      <path className="body" d="M-23 0V-35" />
      <path className="channel" data-region={region} d={channel} />
      <path className="arrow" d={n ? 'M-14-15L-5-19V-11Z' : 'M-3-15L-12-19V-11Z'} />
    </g>
  );
}

/** The SVG transform that lays a symbol's own drawing as it stands on the sheet, about its origin. */
export function orientation(place: Pick<Place, 'turn' | 'flip'>): string {
  const x = orient({ x: 1, y: 0 }, place);
  const y = orient({ x: 0, y: 1 }, place);
  return `matrix(${x.x} ${x.y} ${y.x} ${y.y} 0 0)`;
}

/** How large the tray shows a symbol; the small ones less reduced. */
const ICON_SCALE: Partial<Record<SymbolKind, number>> = {
  capacitor: 0.7,
  ground: 0.9,
  supply: 0.9,
  'net-name': 0.9,
  note: 0.9,
};

/** A symbol as the tray shows it. */
export function SymbolIcon({ kind }: { kind: SymbolKind }) {
  const { left, top, right, bottom } = ownBox(kind);
  const scale = ICON_SCALE[kind] ?? 0.55;
  return (
    <svg
      className="symbol symbol-icon"
      width={(right - left) * scale}
      height={(bottom - top) * scale}
      viewBox={`${left} ${top} ${right - left} ${bottom - top}`}
      aria-hidden="true"
    >
      <PartSymbol kind={kind} />
    </svg>
  );
}
