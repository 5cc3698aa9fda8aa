import type { Overrides } from '#shared/circuit/circuit-file';
import type { DrawnFet, SheetSettings } from '#shared/circuit/drawing';
import { formatExact } from '#shared/units/format-value';
import { type ParsedValue, parseValue } from '#shared/units/parse-value';

export type ParameterName = keyof Overrides;

/** One field of a process: what it is called and in what it is written. */
export type Parameter = {
  readonly name: ParameterName;
  readonly label: string;
  /** In words, for the hover. */
  readonly meaning: string;
  show(value: number): string;
  read(text: string): ParsedValue;
};

export const PARAMETERS: readonly Parameter[] = [
  {
    name: 'threshold',
    label: 'VT0',
    meaning: 'threshold voltage without body bias',
    show: (value) => formatExact(value, 'V'),
    read: (text) => parseValue(text, { unit: 'V' }),
  },
  {
    name: 'kPrime',
    label: 'k′',
    meaning: 'mobility times oxide capacitance',
    show: (value) => formatExact(value, 'A/V²'),
    read: (text) => above0(parseValue(text, { unit: 'A/V²' })),
  },
  written('lambda', 'λ', '1/V', 0, 'channel-length modulation', orMore),
  written('earlyVoltagePerLength', 'VA/L', 'V/µm', 6, 'Early voltage per channel length, in place of λ', above0),
  written('gamma', 'γ', 'V½', 0, 'body effect', orMore),
  written('surfacePotential', '2φF', 'V', 0, 'surface potential', above0),
  written('thresholdTempco', 'dVT/dT', 'mV/K', -3, 'how much the threshold’s size falls with each kelvin'),
  written('mobilityExponent', 'µ exp.', '', 0, 'power of temperature by which mobility falls'),
  written('pelgromVt', 'AVT', 'mV·µm', -9, 'mismatch of thresholds (Pelgrom)', orMore),
  written('pelgromBeta', 'Aβ', '%·µm', -8, 'mismatch of kn (Pelgrom)', orMore),
];

/** What the device's process says of a parameter; undefined where it says nothing. */
export function processValue(
  { kind, values: { process } }: DrawnFet,
  processes: SheetSettings['processes'],
  name: ParameterName,
): number | undefined {
  return process !== undefined && Object.hasOwn(processes, process) ? processes[process]?.[kind]?.[name] : undefined;
}

/** Those that the process gives or the device has of its own; all of them for a device without a process. */
export function parametersOf(part: DrawnFet, processes: SheetSettings['processes']): readonly Parameter[] {
  const { process, overrides } = part.values;
  if (process === undefined) return PARAMETERS;
  return PARAMETERS.filter(
    ({ name }) => overrides?.[name] !== undefined || processValue(part, processes, name) !== undefined,
  );
}

/** A device's own parameters with one more, or one less for undefined; null when none is left. */
export function withParameter(
  overrides: Overrides | undefined,
  name: ParameterName,
  value: number | undefined,
): Overrides | null {
  const { [name]: _, ...rest } = overrides ?? {};
  const next = value === undefined ? rest : { ...rest, [name]: value };
  return Object.keys(next).length === 0 ? null : next;
}

/** A parameter written as a bare number of `unit`, which is 10^`exponent` of the SI unit. */
function written(
  name: ParameterName,
  label: string,
  unit: string,
  exponent: number,
  meaning: string,
  within: (reading: ParsedValue) => ParsedValue = (reading) => reading,
): Parameter {
  return {
    name,
    label,
    meaning,
    show: (value) => `${Number((value * 10 ** -exponent).toPrecision(12))}${unit === '' ? '' : `\u00a0${unit}`}`,
    read(text) {
      const digits = text.replace(unit, '').replaceAll(/\s/g, '').replace(',', '.').replace('−', '-');
      const value = digits === '' ? Number.NaN : Number(digits);
      if (!Number.isFinite(value)) return { ok: false, reason: `Write a plain number${unit && ` of ${unit}`}.` };
      return within({ ok: true, value: Number(`${value}e${exponent}`) || value * 10 ** exponent });
    },
  };
}

function above0(reading: ParsedValue): ParsedValue {
  return reading.ok && reading.value <= 0 ? { ok: false, reason: 'This must be more than 0.' } : reading;
}

function orMore(reading: ParsedValue): ParsedValue {
  return reading.ok && reading.value < 0 ? { ok: false, reason: 'This must be 0 or more.' } : reading;
}
