import { PLACED_PROCESS } from './catalogue';
import type { ProcessSet } from './circuit-file';
import type { SheetSettings } from './drawing';

/** A process that comes with the program. No foundry makes it: every figure is invented, and the page says so. */
const BUOY_3: ProcessSet = {
  referenceTemperature: 27,
  nfet: {
    kPrime: 2.8e-4,
    threshold: 0.45,
    earlyVoltagePerLength: 1.25e7,
    gamma: 0.4,
    surfacePotential: 0.8,
    thresholdTempco: 8e-4,
    mobilityExponent: 1.5,
    pelgromVt: 4e-9,
    pelgromBeta: 1e-8,
  },
  pfet: {
    kPrime: 8e-5,
    threshold: -0.45,
    earlyVoltagePerLength: 1.25e7,
    gamma: 0.4,
    surfacePotential: 0.8,
    thresholdTempco: 8e-4,
    mobilityExponent: 1.2,
    pelgromVt: 4e-9,
    pelgromBeta: 1e-8,
  },
};

export const BUILT_IN_PROCESSES: SheetSettings['processes'] = { [PLACED_PROCESS]: BUOY_3 };

/** Whether a process of this name came with the program and so has invented figures. */
export function isInvented(processName: string): boolean {
  return Object.hasOwn(BUILT_IN_PROCESSES, processName);
}
