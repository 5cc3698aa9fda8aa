import { type FetPart, isFet } from '../circuit/circuit-file';
import { type Problem, problem } from '../circuit/problem';
import type { Circuit } from '../circuit/read-circuit';
import { byReference } from '../circuit/reference-order';
import { thermalVoltage } from '../device/thermal-voltage';
import { formatValue } from '../units/format-value';
import type { FetPoint, Solution } from './operating-point-record';
import { standingOf } from './verdict';

/** V, overdrive in units of kT/q below which the square law is no longer a good description. */
const WEAK = 4;
/** V, forward voltage above which a body junction conducts. */
const FORWARD = 0.4;

/** What is to be said about each FET at a solution: its intent, and where the model stops. */
export function remarkOnFets(circuit: Circuit, solution: Solution): Problem[] {
  const weak = WEAK * thermalVoltage(circuit.temperature);
  return circuit.parts
    .filter(isFet)
    .toSorted((a, b) => byReference(a.ref, b.ref))
    .flatMap((part) => {
      const point = solution.fets[part.ref];
      return point ? [...remarkOnIntent(part, point), ...remarkOnModel(part, point, weak)] : [];
    });
}

function remarkOnIntent(part: FetPart, point: FetPoint): Problem[] {
  if (!part.intent) return [];
  const { ref } = part;
  const { verdict, margin } = standingOf(point, part.intent);
  switch (verdict) {
    case 'met':
      return [];
    case 'missed':
      return [
        problem(
          'intent-missed',
          `${ref} is ${point.region}, meant to be ${part.intent.region}${margin < 0 ? `: ${volts(-margin)} short of it` : ''}.`,
          { refs: [ref] },
        ),
      ];
    case 'thin':
      return [
        problem(
          'intent-thin',
          `${ref} is ${point.region} as meant, with ${volts(margin)} of the ${volts(part.intent.margin ?? 0)} margin asked for.`,
          { refs: [ref] },
        ),
      ];
  }
}

function remarkOnModel(part: FetPart, point: FetPoint, weak: number): Problem[] {
  const { ref } = part;
  const about = { refs: [ref] };
  const remarks: Problem[] = [];
  if (point.reversed) {
    const message = `${ref} conducts from its labelled source to its labelled drain. Change the two over if that is not meant.`;
    remarks.push(problem('reversed-channel', message, about));
  }
  if (point.region !== 'off' && point.vov < weak) {
    const message = `${ref} is on with an overdrive of ${volts(point.vov)}, below 4·kT/q = ${volts(weak)}: the square law reads too high or too low there.`;
    remarks.push(problem('weak-overdrive', message, about));
  }
  if (point.region === 'off' && point.vov > -weak) {
    const message = `${ref} is called off ${volts(-point.vov)} below its threshold, within 4·kT/q = ${volts(weak)}: a real device still conducts there.`;
    remarks.push(problem('nearly-on', message, about));
  }
  const forward = forwardBodyVoltage(part, point);
  if (forward > FORWARD) {
    const message = `${ref}'s body junction is forward by ${volts(forward)}: it conducts, and the model does not know it. Tie the body to a net that keeps it reversed.`;
    remarks.push(problem('body-forward', message, about));
  }
  return remarks;
}

/** V across the junction from the body to the end of the channel that forwards it most; negative when reverse biased. */
function forwardBodyVoltage(part: FetPart, point: FetPoint): number {
  if (part.body === undefined) return point.reversed ? Math.abs(point.vds) : 0;
  return part.kind === 'nfet' ? -point.vsb : point.vsb;
}

function volts(value: number): string {
  return formatValue(value, 'V');
}
