import { VERDICT_TEXT, VerdictShape } from '../../formats/verdict-shape';
import type { VerdictTally } from './sheet-summary';

/** `4 met · 1 thin · 1 missed`, each with its shape; nothing while no device has an intent. */
export function VerdictCounts({ counts }: { counts: VerdictTally }) {
  const present = (['met', 'thin', 'missed'] as const).filter((verdict) => counts[verdict] > 0);
  if (present.length === 0) return null;
  return (
    <ul aria-label="Verdicts" className="flex items-center">
      {present.map((verdict) => (
        <li
          key={verdict}
          className="flex items-center not-first:before:px-2 not-first:before:text-faint not-first:before:content-['·']"
        >
          <span className={`flex items-center gap-2 ${VERDICT_TEXT[verdict]}`}>
            <VerdictShape verdict={verdict} />
            {counts[verdict]} {verdict}
          </span>
        </li>
      ))}
    </ul>
  );
}
