import type { ListedSheet } from '#shared/api/sheets';
import { standingWords } from '../../formats/standing-words';
import { VERDICT_TEXT, VerdictShape } from '../../formats/verdict-shape';

type Standing = ListedSheet['standing'];

/** The device of least slack, or why none is named. */
export function WorstDevice({ standing }: { readonly standing: Standing }) {
  if (standing === null) return <span className="text-faint">being solved</span>;
  switch (standing.status) {
    case 'empty':
      return <span className="text-faint">nothing drawn</span>;
    case 'unsolved':
    case 'invalid':
      return (
        <>
          <span className="block text-missed">cannot be solved</span>
          <span className="line-clamp-2 text-xs text-faint wrap-anywhere">{standing.reason}</span>
        </>
      );
    case 'solved': {
      const { worst, fets } = standing;
      if (worst === null) return <span className="text-faint">{fets === 0 ? 'no FET' : 'no intent set'}</span>;
      const { verdict, by } = standingWords(worst);
      return (
        <span className={VERDICT_TEXT[verdict]}>
          <span className="mr-2 inline-block">
            <VerdictShape verdict={verdict} />
          </span>
          <span className="font-bold">{worst.ref}</span> {verdict} {by}
        </span>
      );
    }
  }
}
