import type { DrawnComponent } from '#shared/circuit/drawing';
import { useProblemsAbout, useSolutionState } from '../../workers/solution';
import { ProblemNote, RemarkMark } from './problem-note';

/** Beside a part that is no FET: why the circuit cannot be solved, where that is about this part, and what is to be noted. */
export function PartProblem({ part }: { part: DrawnComponent }) {
  const state = useSolutionState();
  const problems = useProblemsAbout(part.ref);
  if (state !== 'current' || problems.length === 0) return null;
  const errors = problems.filter(({ severity }) => severity === 'error');
  return errors.length > 0 ? <ProblemNote problems={errors} /> : <RemarkMark problems={problems} />;
}
