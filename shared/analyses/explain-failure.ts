import { type Problem, problem } from '../circuit/problem';
import type { Circuit } from '../circuit/read-circuit';
import { terminalsOf } from '../circuit/terminals';
import { type Equations, TRUE_CIRCUIT } from '../solver/equations';
import type { Network } from '../solver/network';
import type { Point, Settled } from '../solver/settle';
import { formatValue } from '../units/format-value';

/** Why a circuit has no operating point to report, for a person, and the largest sum of currents left at any net (A). */
export function explainFailure(
  circuit: Circuit,
  equations: Equations,
  failure: Exclude<Settled, Point>,
): { problem: Problem; residual: number } {
  const { network } = equations;
  if (failure.kind === 'free-range') {
    return { problem: explainFreeRange(circuit, network, netsOf(network, failure.range.groups)), residual: 0 };
  }
  equations.evaluate(failure.x, TRUE_CIRCUIT);
  let worst = 0;
  for (const [group, sum] of equations.residual.entries()) {
    if (Math.abs(sum) > Math.abs(equations.residual[worst] ?? 0)) worst = group;
  }
  const residual = Math.abs(equations.residual[worst] ?? 0);
  const nets = netsOf(network, [worst]);
  const refs = partsOn(circuit, nets);
  const finite = Number.isFinite(residual) ? residual : Number.MAX_VALUE;
  const message = `No operating point was found. At net ${nets.join(', ')} the currents of ${refs.join(', ')} are still out of balance by ${formatValue(finite, 'A')}. Look for a current that is forced where every device is off or already carries all it can.`;
  return { problem: problem('no-operating-point', message, { refs, nets }), residual: finite };
}

function explainFreeRange(circuit: Circuit, network: Network, nets: string[]): Problem {
  const refs = partsOn(circuit, nets);
  const touching = new Set(refs);
  const flat = network.fets.filter(({ ref, model }) => touching.has(ref) && model.lambda === 0).map(({ ref }) => ref);
  const currents = network.currents.filter(({ ref }) => touching.has(ref)).map(({ ref }) => ref);
  const opposing = [...currents, ...flat].sort();
  const remedies = [
    ...(flat.length > 0 ? [`give ${flat.sort().join(' or ')} a lambda above 0`] : []),
    `put a resistor from ${nets[0] ?? ''} to ground or a supply`,
  ];
  const message = `${opposing.join(', ')} oppose each other at net ${nets.join(', ')} with equal currents that no voltage changes, so it may lie anywhere in a range. To settle it, ${remedies.join(', or ')}.`;
  return problem('no-unique-answer', message, { refs: opposing.length > 0 ? opposing : refs, nets });
}

function netsOf(network: Network, groups: readonly number[]): string[] {
  return groups.flatMap((group) => (network.groups[group] ?? []).map((net) => network.nets[net] ?? '')).sort();
}

/** Parts whose current the nets see. */
function partsOn(circuit: Circuit, nets: readonly string[]): string[] {
  const wanted = new Set(nets);
  return circuit.parts
    .filter((part) =>
      terminalsOf(part).some(
        ({ name, net }) => wanted.has(net) && name !== 'gate' && name !== 'body' && part.kind !== 'capacitor',
      ),
    )
    .map(({ ref }) => ref)
    .sort();
}
