import { standingOf } from '#shared/analyses/verdict';
import type { DrawnFet } from '#shared/circuit/drawing';
import { formatVoltage } from '../../formats/figures';
import { MarginRuler } from '../../formats/margin-ruler';
import { standingWords } from '../../formats/standing-words';
import { VERDICT_TEXT, VerdictShape } from '../../formats/verdict-shape';
import { useFetPoint, useSolution, useVdsScale } from '../../workers/solution';

/** Width of the ruler in px. */
const RULER = 208;

/** The margin ruler on the sheet's scale, and the verdict in words. */
export function Standing({ part }: { part: DrawnFet }) {
  const point = useFetPoint(part.ref);
  const scaleEnd = useVdsScale();
  const { state } = useSolution();
  if (!point) return null;
  const { intent } = part.values;
  const standing = intent && standingOf(point, intent);
  const words = standing && standingWords(standing);
  const busy = state !== 'current';
  return (
    <div aria-busy={busy} className={busy ? 'opacity-45' : undefined}>
      <MarginRuler point={point} intent={intent} scaleEnd={scaleEnd} width={RULER} />
      <p aria-hidden="true" className="flex justify-between text-faint" style={{ width: RULER }}>
        <span>0</span>
        <span>VDS</span>
        <span>{formatVoltage(scaleEnd, 1)}</span>
      </p>
      {words && (
        <p className={`flex items-center gap-2 pt-1 ${words.verdict === 'met' ? 'text-ink' : 'text-missed'}`}>
          <VerdictShape verdict={words.verdict} />
          <span>
            <span className={VERDICT_TEXT[words.verdict]}>{words.verdict}</span> {words.by}
          </span>
        </p>
      )}
    </div>
  );
}
