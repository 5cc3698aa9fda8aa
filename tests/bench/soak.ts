import { firstOperatingPoint, searchAlternatives } from '#shared/analyses/operating-point';
import { randomCircuit } from '../shared/solver/random-circuit';
import { print } from './print';

const CIRCUITS = 2000;

/** Solves seeded random circuits of 3 to 60 FETs cold and counts; every unsolved one is named by its seed. True when there is none. */
export function soak(): boolean {
  const unsolved: number[] = [];
  let several = 0;
  let replaced = 0;
  let iterations = 0;
  let [first, search] = [0, 0];
  for (let seed = 1; seed <= CIRCUITS; seed++) {
    const circuit = randomCircuit(seed, 3 + ((seed * 37) % 58));
    const from = performance.now();
    const answer = firstOperatingPoint(circuit);
    const between = performance.now();
    if (answer.record.status !== 'solved') unsolved.push(seed);
    iterations += answer.record.iterations;
    const steps = searchAlternatives(answer);
    let step = steps.next();
    while (!step.done) step = steps.next();
    first += between - from;
    search += performance.now() - between;
    const { alternatives, nets } = step.value;
    if (alternatives.length > 0) several++;
    if (Object.entries(nets).some(([net, voltage]) => Math.abs(voltage - (answer.record.nets[net] ?? 0)) > 1e-6))
      replaced++;
  }
  print(
    `\n${CIRCUITS} random circuits, seeds 1 to ${CIRCUITS}: ${unsolved.length} unsolved${unsolved.length > 0 ? ` (seeds ${unsolved.join(', ')})` : ''}`,
  );
  print(
    `    ${(iterations / CIRCUITS).toFixed(1)} Newton steps and ${(first / CIRCUITS).toFixed(2)} ms each to the first answer, ${(search / CIRCUITS).toFixed(1)} ms for the search`,
  );
  print(
    `    ${several} with several operating points; in ${replaced} the search met one that is listed before the first answer`,
  );
  return unsolved.length === 0;
}
