import { PLACED_PROCESS } from './catalogue';
import type { ProcessSet } from './circuit-file';
import type { SheetSettings } from './drawing';

// Processes that come with the program. Nobody makes them: every figure is invented, and the page says so.

/** Integrated FETs for 1.8 V, given by width and length. */
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

/** Discrete FETs for 12 V, given by their own `k`; in such a part the body is tied to the source. */
const DECK_12: ProcessSet = {
  referenceTemperature: 25,
  nfet: { threshold: 2, lambda: 0.01, thresholdTempco: 4e-3, mobilityExponent: 1.5 },
  pfet: { threshold: -2, lambda: 0.015, thresholdTempco: 4e-3, mobilityExponent: 1.3 },
};

/** The process of discrete parts, whose FETs have a `k` and no width or length. */
export const DISCRETE_PROCESS = 'deck-12';

export const BUILT_IN_PROCESSES: SheetSettings['processes'] = {
  [PLACED_PROCESS]: BUOY_3,
  [DISCRETE_PROCESS]: DECK_12,
};

/** Whether a process of this name came with the program and so has invented figures. */
export function isInvented(processName: string): boolean {
  return Object.hasOwn(BUILT_IN_PROCESSES, processName);
}
