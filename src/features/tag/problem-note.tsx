import { Tooltip } from 'radix-ui';
import type { ReactNode } from 'react';
import type { Problem } from '#shared/circuit/problem';
import { byGravity, problemInShort } from '../../formats/problem-words';

/** Why there are no figures, in a few words beside the part; the whole message on hover and on focus. */
export function ProblemNote({ problems }: { problems: readonly Problem[] }) {
  const [first] = byGravity(problems);
  if (!first) return null;
  const more = problems.length > 1 ? ` and ${problems.length - 1} more` : '';
  return (
    <WithMessages problems={problems}>
      <button type="button" className="pointer-events-auto min-h-6 text-left font-bold text-missed text-xs">
        {problemInShort(first)}
        {more}
      </button>
    </WithMessages>
  );
}

/** A small mark for warnings and notes that leave the figures standing. */
export function RemarkMark({ problems }: { problems: readonly Problem[] }) {
  const [first] = byGravity(problems);
  if (!first) return null;
  const colour = first.severity === 'note' ? 'text-faint' : 'text-missed';
  return (
    <WithMessages problems={problems}>
      <button
        type="button"
        aria-label={`${problems.length === 1 ? problemInShort(first) : `${problems.length} remarks`}`}
        className={`pointer-events-auto -my-1 -mr-1.5 grid size-6 place-items-center ${colour}`}
      >
        <svg width="12" height="12" viewBox="0 0 12 12" fill="none" stroke="currentColor" aria-hidden="true">
          <path d="M1.5 .5V11.5" />
          <path d="M1.5 1.5H10L7.5 4L10 6.5H1.5" fill={first.severity === 'note' ? 'none' : 'currentColor'} />
        </svg>
      </button>
    </WithMessages>
  );
}

function WithMessages({ problems, children }: { problems: readonly Problem[]; children: ReactNode }) {
  return (
    <Tooltip.Provider delayDuration={200}>
      <Tooltip.Root>
        <Tooltip.Trigger asChild>{children}</Tooltip.Trigger>
        <Tooltip.Portal>
          <Tooltip.Content
            sideOffset={4}
            collisionPadding={8}
            className="z-50 grid max-w-80 gap-2 border border-edge bg-sheet p-2 text-ink text-xs"
          >
            {byGravity(problems).map((problem) => (
              <p key={problem.code + problem.message}>{problem.message}</p>
            ))}
          </Tooltip.Content>
        </Tooltip.Portal>
      </Tooltip.Root>
    </Tooltip.Provider>
  );
}
