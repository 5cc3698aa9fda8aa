import { ABSOLUTE_ZERO, type FetPart, type Overrides, type ProcessSet } from '../circuit/circuit-file';

const DEFAULT_REFERENCE_TEMPERATURE = 27;
const DEFAULT_SURFACE_POTENTIAL = 0.7;

/**
 * A FET's parameters at one temperature, written for N: a P device has the same with every voltage and current negated,
 * so an enhancement device of either polarity has a positive threshold here.
 */
export interface FetModel {
  /** +1 for N, −1 for P. */
  readonly sign: 1 | -1;
  /** A/V², of all `count` devices together. */
  readonly kn: number;
  /** V, at zero body bias. */
  readonly threshold: number;
  /** 1/V */
  readonly lambda: number;
  /** √V */
  readonly gamma: number;
  /** 2φF, V */
  readonly surfacePotential: number;
  /** The body is tied to the source inside the part: VSB = 0 always, also when reversed. */
  readonly bodyTied: boolean;
}

/** The parameters of a checked part: overrides before its process, both brought to `temperature` (°C). */
export function fetModel(
  part: FetPart,
  processes: Readonly<Record<string, ProcessSet>>,
  temperature: number,
): FetModel {
  const process = part.process === undefined ? undefined : processes[part.process];
  const own = part.overrides ?? {};
  const given: Overrides = process?.[part.kind] ?? {};
  const sign = part.kind === 'nfet' ? 1 : -1;
  const reference = process?.referenceTemperature ?? DEFAULT_REFERENCE_TEMPERATURE;

  const mobilityExponent = own.mobilityExponent ?? given.mobilityExponent ?? 0;
  const mobility = ((temperature - ABSOLUTE_ZERO) / (reference - ABSOLUTE_ZERO)) ** -mobilityExponent;
  const tempco = own.thresholdTempco ?? given.thresholdTempco ?? 0;

  return {
    sign,
    kn: (part.count ?? 1) * transconductance(part, own.kPrime ?? given.kPrime ?? 0) * mobility,
    threshold: sign * (own.threshold ?? given.threshold ?? 0) - tempco * (temperature - reference),
    lambda: channelLengthModulation(part, own, given),
    gamma: own.gamma ?? given.gamma ?? 0,
    surfacePotential: own.surfacePotential ?? given.surfacePotential ?? DEFAULT_SURFACE_POTENTIAL,
    bodyTied: part.body === undefined,
  };
}

function transconductance(part: FetPart, kPrime: number): number {
  if (part.k !== undefined) return part.k;
  return part.width === undefined || part.length === undefined ? 0 : (kPrime * part.width) / part.length;
}

/** λ, where an override of either form wins over the process, and the early voltage wins over `lambda` from the same place. */
function channelLengthModulation(part: FetPart, own: Overrides, given: Overrides): number {
  for (const { earlyVoltagePerLength, lambda } of [own, given]) {
    if (earlyVoltagePerLength !== undefined && part.length !== undefined) {
      return 1 / (earlyVoltagePerLength * part.length);
    }
    if (lambda !== undefined) return lambda;
  }
  return 0;
}
