import { standingOf } from '#shared/analyses/verdict';
import type { DrawnFet } from '#shared/circuit/drawing';
import { dimmed } from '../../formats/dimmed';
import { standingWords } from '../../formats/standing-words';
import { VERDICT_TEXT, VerdictShape } from '../../formats/verdict-shape';
import { useFetPoint, useSolutionState } from '../../workers/solution';

/** How a FET stands against its intent, in words; nothing without either. */
export function VerdictLine({ part }: { part: DrawnFet }) {
  const point = useFetPoint(part.ref);
  const busy = useSolutionState() !== 'current';
  const { intent } = part.values;
  if (!point || !intent) return null;
  const { verdict, by } = standingWords(standingOf(point, intent));
  return (
    <p
      aria-busy={busy}
      className={`flex items-center gap-2 ${verdict === 'met' ? 'text-ink' : 'text-missed'} ${dimmed(busy)}`}
    >
      <VerdictShape verdict={verdict} />
      <span>
        <span className={VERDICT_TEXT[verdict]}>{verdict}</span> {by}
      </span>
    </p>
  );
}
