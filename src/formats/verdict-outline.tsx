import type { Verdict } from '#shared/analyses/verdict';

/**
 * Sheet-coloured ground and outline of a box, behind its content: a cut corner while an intent is thin, the cut filled
 * while it is missed. The box itself must be positioned and isolated.
 */
export function VerdictOutline({ verdict }: { verdict: Exclude<Verdict, 'met'> }) {
  return (
    <span aria-hidden="true" className="pointer-events-none absolute inset-0 -z-10">
      <span className="absolute inset-0 bg-sheet [clip-path:polygon(0_0,calc(100%-12px)_0,100%_12px,100%_100%,0_100%)]" />
      <span className="absolute inset-0 border-b border-l border-missed" />
      <span className="absolute top-0 right-3 left-0 border-t border-missed" />
      <span className="absolute top-3 right-0 bottom-0 border-r border-missed" />
      <svg width="12" height="12" viewBox="0 0 12 12" fill="none" aria-hidden="true" className="absolute top-0 right-0">
        <path d="M0 .5L11.5 12" stroke="var(--missed)" />
        {verdict === 'missed' && <path d="M2 0H12V10Z" fill="var(--missed)" />}
      </svg>
    </span>
  );
}
