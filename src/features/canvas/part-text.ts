import { catalogueEntry } from '#shared/circuit/catalogue';
import { type DrawnFet, type DrawnPart, isComponent, isFet, type WireEnd } from '#shared/circuit/drawing';
import { matchOf } from '#shared/circuit/match-group';
import { noteLines } from '#shared/circuit/note-lines';
import { formatExact } from '#shared/units/format-value';

/** What stands in bold beside a symbol: its reference, or the net it names. */
export function nameOf(part: DrawnPart): string | undefined {
  if (isComponent(part)) return part.ref;
  return part.kind === 'supply' || part.kind === 'net-name' ? part.values.net : undefined;
}

/** What stands under a reference: its value, and the group whose values are kept equal, `8/1 =A`. */
export function valueText(part: DrawnPart): string | undefined {
  const value = plainValue(part);
  const match = matchOf(part);
  return value === undefined || match === undefined ? value : `${value} =${match}`;
}

/** `27 kΩ`, or a FET's W/L in µm with its count, `2×5/1`. */
function plainValue(part: DrawnPart): string | undefined {
  switch (part.kind) {
    case 'nfet':
    case 'pfet':
      return sizeText(part);
    case 'resistor':
      return formatExact(part.values.resistance, 'Ω');
    case 'capacitor':
      return formatExact(part.values.capacitance, 'F');
    case 'inductor':
      return formatExact(part.values.inductance, 'H');
    case 'voltage':
      return formatExact(part.values.voltage, 'V');
    case 'current':
      return formatExact(part.values.current, 'A');
    default:
      return undefined;
  }
}

function sizeText({ values: { width, length, k, count = 1 } }: DrawnFet): string | undefined {
  const times = count > 1 ? `${count}×` : '';
  if (k !== undefined) return times + formatExact(k, 'A/V²');
  return width === undefined || length === undefined
    ? undefined
    : `${times}${micrometres(width)}/${micrometres(length)}`;
}

function micrometres(metres: number): string {
  return String(Number((metres * 1e6).toPrecision(12)));
}

/** A part as it is spoken of: `Resistor R3, 10 kΩ`. */
export function spokenPart(part: DrawnPart): string {
  return described(part, nameOf(part));
}

/** A part beside its name: `Resistor, 10 kΩ`. */
export function describedPart(part: DrawnPart): string {
  return described(part, undefined);
}

function described(part: DrawnPart, name: string | undefined): string {
  const { label } = catalogueEntry(part.kind);
  const title = [label.charAt(0).toUpperCase() + label.slice(1), name].filter(Boolean).join(' ');
  if (part.kind === 'note') return [title, noteLines(part.values.text)[0]].filter(Boolean).join(': ');
  const value = plainValue(part);
  if (value === undefined) return title;
  const spoken = isFet(part) && part.values.k === undefined ? `${title}, W/L ${value} µm` : `${title}, ${value}`;
  const match = matchOf(part);
  return match === undefined ? spoken : `${spoken}, kept equal as ${match}`;
}

/** A part within a sentence: `R3`, `the supply vdd`, `the ground`. */
export function shortPart(part: DrawnPart): string {
  if (isComponent(part)) return part.ref;
  return ['the', catalogueEntry(part.kind).label, nameOf(part)].filter(Boolean).join(' ');
}

/** A terminal within a sentence: `Q1 drain`, `the ground`. */
export function spokenTerminal(part: DrawnPart, pin: string): string {
  return isComponent(part) ? `${part.ref} ${pin}` : shortPart(part);
}

/** A terminal's handle for people who write tests and bookmarks: `Q1.drain`. */
export function terminalTitle(part: DrawnPart, pin: WireEnd['pin']): string {
  return `${nameOf(part) ?? part.kind}.${pin}`;
}
