import type { CircuitPart } from '#shared/circuit/circuit-file';
import type { Problem } from '#shared/circuit/problem';
import { terminalsOf } from '#shared/circuit/terminals';

/**
 * The problems to be told beside a part: those that name it, and those that name no part but a net it is on. A hazardous
 * voltage is told once for the whole sheet, or every part at a supply would carry it.
 */
export function problemsAbout(part: CircuitPart, problems: readonly Problem[]): readonly Problem[] {
  if (problems.length === 0) return NONE;
  const nets = new Set(terminalsOf(part).map(({ net }) => net));
  const about = problems.filter(
    ({ code, refs, nets: named }) =>
      refs.includes(part.ref) || (code !== 'high-voltage' && refs.length === 0 && named.some((net) => nets.has(net))),
  );
  return about.length === 0 ? NONE : about;
}

const NONE: readonly Problem[] = [];
