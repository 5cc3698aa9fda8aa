import type { DrawnFet, SheetSettings } from '#shared/circuit/drawing';

export type Sizing = 'channel' | 'k';

/** Whether a device is given by its channel's width and length, or by its own k as discrete parts are. */
export function sizingOf({ values }: DrawnFet): Sizing {
  return values.k === undefined ? 'channel' : 'k';
}

const ORDINARY_LENGTH = 1e-6;
const ORDINARY_WIDTH = 10e-6;
const ORDINARY_K = 1e-3;

/** The values that give the same device the other way, as far as its process says how; null takes a value away. */
export function resized(
  { kind, values }: DrawnFet,
  to: Sizing,
  processes: SheetSettings['processes'],
): Readonly<Record<'width' | 'length' | 'k', number | null>> {
  const named = values.process !== undefined && Object.hasOwn(processes, values.process) ? values.process : undefined;
  const kPrime = values.overrides?.kPrime ?? (named === undefined ? undefined : processes[named]?.[kind]?.kPrime);
  if (to === 'k') {
    const k = kPrime && values.width && values.length ? (kPrime * values.width) / values.length : ORDINARY_K;
    return { width: null, length: null, k: Number(k.toPrecision(6)) };
  }
  const width = kPrime && values.k ? (values.k / kPrime) * ORDINARY_LENGTH : ORDINARY_WIDTH;
  return { k: null, width: Number(width.toPrecision(6)), length: ORDINARY_LENGTH };
}
