import { ABSOLUTE_ZERO } from '../circuit/circuit-file';

/** Boltzmann's constant, J/K, and the elementary charge, C: both exact (CODATA 2018). */
const BOLTZMANN = 1.380649e-23;
const ELEMENTARY_CHARGE = 1.602176634e-19;

/** kT/q in volts at a temperature in °C. */
export function thermalVoltage(celsius: number): number {
  return (BOLTZMANN * (celsius - ABSOLUTE_ZERO)) / ELEMENTARY_CHARGE;
}
