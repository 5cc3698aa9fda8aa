import type { Verdict } from '#shared/analyses/verdict';

/** The small shape of a verdict, always beside its word: open square, open cut corner, filled cut corner. */
export function VerdictShape({ verdict }: { verdict: Verdict }) {
  return (
    <svg width="12" height="12" viewBox="0 0 12 12" fill="none" aria-hidden="true" className="shrink-0">
      {verdict === 'met' ? (
        <path d="M.5 .5H11.5V11.5H.5Z" stroke="var(--faint)" />
      ) : (
        <path d="M.5 .5H6.5L11.5 5.5V11.5H.5Z" stroke="var(--missed)" />
      )}
      {verdict === 'missed' && <path d="M8 0H12V4Z" fill="var(--missed)" />}
    </svg>
  );
}

/** How the word of a verdict is set. */
export const VERDICT_TEXT: Record<Verdict, string> = {
  met: 'text-ink',
  thin: 'text-missed',
  missed: 'text-missed font-bold',
};
