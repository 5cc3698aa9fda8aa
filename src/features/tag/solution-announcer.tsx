import { useEffect, useRef } from 'react';
import type { OperatingPointRecord } from '#shared/analyses/operating-point-record';
import { byGravity } from '../../formats/problem-words';
import { useSolution, useSolvedCircuit } from '../../workers/solution';

/** Tells a polite live region what another solve changed: a device's region, or that there is an answer, or why there is none. */
export function SolutionAnnouncer({ announce }: { announce: (message: string) => void }) {
  const solution = useSolution();
  const empty = useSolvedCircuit()?.parts.length === 0;
  const told = useRef<OperatingPointRecord>(undefined);
  useEffect(() => {
    if (solution.state === 'failed') announce(solution.reason);
    // Nothing drawn is no failure to be told.
    if (solution.state !== 'current' || empty) return;
    const message = news(told.current, solution.record);
    told.current = solution.record;
    if (message !== undefined) announce(message);
  }, [solution, empty, announce]);
  return null;
}

/** What a person should hear of a new record; the first of all, when solved, is no news. */
export function news(before: OperatingPointRecord | undefined, now: OperatingPointRecord): string | undefined {
  if (now.status !== 'solved') {
    const [problem] = byGravity(now.problems);
    const message = `Could not be solved: ${problem?.message ?? 'no reason was found.'}`;
    const same = before?.status === now.status && byGravity(before.problems)[0]?.message === problem?.message;
    return same ? undefined : message;
  }
  if (!before) return undefined;
  if (before.status !== 'solved') return 'Solved.';
  const moves = Object.entries(now.fets).flatMap(([ref, { region }]) => {
    const was = Object.hasOwn(before.fets, ref) ? before.fets[ref]?.region : undefined;
    return was === undefined || was === region ? [] : [`${ref} went to ${region}`];
  });
  return moves.length === 0 ? undefined : `${moves.join(', ')}.`;
}
