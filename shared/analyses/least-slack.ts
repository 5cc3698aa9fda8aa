import type { CircuitPart } from '../circuit/circuit-file';
import { byReference } from '../circuit/reference-order';
import type { OperatingPointRecord } from './operating-point-record';
import { type Standing, standingOf } from './verdict';

export type StandingOfDevice = Standing & { readonly ref: string };

/** Every device that has an intent and a point, least slack first; what is out of its region comes before all that is in it. */
export function leastSlackFirst(parts: readonly CircuitPart[], record: OperatingPointRecord): StandingOfDevice[] {
  return parts
    .flatMap((part) => {
      if (part.kind !== 'nfet' && part.kind !== 'pfet') return [];
      const point = Object.hasOwn(record.fets, part.ref) ? record.fets[part.ref] : undefined;
      return point && part.intent ? [{ ref: part.ref, ...standingOf(point, part.intent) }] : [];
    })
    .sort((a, b) => rank(a) - rank(b) || a.slack - b.slack || byReference(a.ref, b.ref));
}

function rank({ verdict }: Standing): number {
  return verdict === 'missed' ? 0 : 1;
}
