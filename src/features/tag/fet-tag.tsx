import { memo } from 'react';
import type { FetPoint } from '#shared/analyses/operating-point-record';
import { standingOf } from '#shared/analyses/verdict';
import type { DrawnFet } from '#shared/circuit/drawing';
import type { Problem } from '#shared/circuit/problem';
import { formatValue } from '#shared/units/format-value';
import { dimmed } from '../../formats/dimmed';
import { MarginRuler } from '../../formats/margin-ruler';
import { isVerdict } from '../../formats/problem-words';
import { REGION_COLOUR, RegionGlyph } from '../../formats/region-glyph';
import { standingWords } from '../../formats/standing-words';
import { VerdictOutline } from '../../formats/verdict-outline';
import { useFetPoint, useProblemsAbout, useSolutionState, useVdsScale } from '../../workers/solution';
import { ProblemNote, RemarkMark } from './problem-note';

/** Width of the ruler in px; the tag is 8 px wider on either side. */
const RULER = 104;

/** The annotation beside a FET: region, current and margin ruler, or why there is none. */
export function FetTag({ part }: { part: DrawnFet }) {
  const state = useSolutionState();
  const point = useFetPoint(part.ref);
  const problems = useProblemsAbout(part.ref);
  const busy = state === 'outdated' || state === 'pending';
  return (
    <figure
      aria-label={`${part.ref} at the operating point`}
      aria-busy={busy}
      className={`relative isolate w-30 px-2 pt-1.5 pb-1 text-xs ${dimmed(busy)}`}
    >
      {point ? (
        <Figures point={point} intent={part.values.intent} problems={problems} />
      ) : (
        <NoFigures working={busy} problems={problems.filter((problem) => !isVerdict(problem))} />
      )}
    </figure>
  );
}

/** Drawn again only when something in it changed: an edit dims every tag, and most then come back as they were. */
const Figures = memo(function Figures({
  point,
  intent,
  problems: all,
}: {
  point: FetPoint;
  intent: DrawnFet['values']['intent'];
  problems: readonly Problem[];
}) {
  const problems = all.filter((problem) => !isVerdict(problem));
  const scaleEnd = useVdsScale();
  const standing = intent && standingOf(point, intent);
  const words = standing && standingWords(standing);
  return (
    <>
      {standing && standing.verdict !== 'met' && <VerdictOutline verdict={standing.verdict} />}
      {/* A new key starts the fade of a tag that changes region. */}
      <p
        key={point.region}
        className={`flex transition-opacity duration-150 starting:opacity-0 items-center gap-1.5 font-bold ${REGION_COLOUR[point.region]}`}
      >
        <RegionGlyph region={point.region} />
        {point.region}
      </p>
      <p className="flex items-center justify-between">
        <span title={formatValue(point.id, 'A', 4)}>{formatValue(point.id, 'A')}</span>
        <RemarkMark problems={problems} />
      </p>
      <MarginRuler point={point} intent={intent} scaleEnd={scaleEnd} width={RULER} />
      {words && <p className="sr-only">{`${words.verdict} ${words.by}`}</p>}
    </>
  );
});

function NoFigures({ working, problems }: { working: boolean; problems: readonly Problem[] }) {
  const errors = problems.filter(({ severity }) => severity === 'error');
  return (
    <>
      <p className="text-faint">{working ? 'solving' : 'not solved'}</p>
      {!working && (errors.length > 0 ? <ProblemNote problems={errors} /> : <RemarkMark problems={problems} />)}
    </>
  );
}
