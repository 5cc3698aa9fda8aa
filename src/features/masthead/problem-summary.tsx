import { ChevronDown } from 'lucide-react';
import { Popover } from 'radix-ui';
import type { PointStatus } from '#shared/analyses/operating-point-record';
import type { Problem } from '#shared/circuit/problem';
import { byGravity, isVerdict, problemInShort } from '../../formats/problem-words';

/** What is wrong with the sheet in a few words, and all of it when opened; verdicts are counted elsewhere. */
export function ProblemSummary({ status, problems: all }: { status: PointStatus; problems: readonly Problem[] }) {
  const problems = byGravity(all).filter((problem) => !isVerdict(problem));
  if (problems.length === 0) return null;
  const hazard = problems.some(({ code }) => code === 'high-voltage');
  const grave = status !== 'solved' || hazard;
  return (
    <Popover.Root>
      <Popover.Trigger
        className={`flex min-h-6 items-center gap-1.5 ${grave ? 'font-bold text-missed' : 'text-faint'}`}
      >
        {inShort(status, problems)}
        <ChevronDown size={14} aria-hidden="true" />
      </Popover.Trigger>
      <Popover.Portal>
        <Popover.Content
          align="end"
          sideOffset={6}
          collisionPadding={8}
          aria-label="Problems"
          className="z-50 max-h-[60dvh] w-[min(30rem,calc(100vw-1rem))] overflow-auto border border-ink bg-sheet text-xs"
        >
          <ul>
            {problems.map((problem) => (
              <li
                key={`${problem.code} ${problem.message}`}
                className="grid grid-cols-[4rem_minmax(0,1fr)] gap-x-3 border-rule border-b px-3 py-2 last:border-b-0"
              >
                <span className={problem.severity === 'note' ? 'text-faint' : 'text-missed'}>{problem.severity}</span>
                <span>{problem.message}</span>
              </li>
            ))}
          </ul>
          {hazard && (
            <p className="border-rule border-t px-3 py-2 font-bold">
              Above 60 V, local rules and a qualified person decide how it may be built and touched; this sheet does
              not.
            </p>
          )}
        </Popover.Content>
      </Popover.Portal>
    </Popover.Root>
  );
}

/** `problems` gravest first. */
function inShort(status: PointStatus, problems: readonly Problem[]): string {
  const [first] = problems;
  if (status !== 'solved') return first ? `not solved: ${problemInShort(first)}` : 'not solved';
  const hazard = problems.find(({ code }) => code === 'high-voltage');
  if (hazard) return problemInShort(hazard);
  return problems.length === 1 ? '1 problem' : `${problems.length} problems`;
}
