import { ChevronDown } from 'lucide-react';
import { Popover } from 'radix-ui';
import type { OperatingPointRecord } from '#shared/analyses/operating-point-record';
import { byGravity, problemInShort } from '../../formats/problem-words';

/** What is wrong with the sheet in a few words, and all of it when opened. */
export function ProblemSummary({ record }: { record: OperatingPointRecord }) {
  const problems = byGravity(record.problems);
  if (problems.length === 0) return null;
  const grave = record.status !== 'solved' || problems.some(({ code }) => code === 'high-voltage');
  return (
    <Popover.Root>
      <Popover.Trigger
        className={`flex min-h-6 items-center gap-1.5 ${grave ? 'font-bold text-missed' : 'text-faint'}`}
      >
        {inShort(record)}
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
        </Popover.Content>
      </Popover.Portal>
    </Popover.Root>
  );
}

function inShort({ status, problems }: OperatingPointRecord): string {
  if (status !== 'solved') {
    const [first] = byGravity(problems);
    return first ? `not solved: ${problemInShort(first)}` : 'not solved';
  }
  const hazard = problems.find(({ code }) => code === 'high-voltage');
  if (hazard) return problemInShort(hazard);
  return problems.length === 1 ? '1 problem' : `${problems.length} problems`;
}
