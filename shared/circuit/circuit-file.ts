import { z } from 'zod';
import { recordByName } from './record-by-name';

/** Absolute zero in degrees Celsius: temperatures lie above it. */
export const ABSOLUTE_ZERO = -273.15;

export const refSchema = z
  .string()
  .regex(/^[A-Za-z][A-Za-z0-9_]{0,15}$/, 'must be a letter followed by letters, digits or _, at most 16 characters');
export const netNameSchema = z
  .string()
  .regex(/^[A-Za-z0-9_+.-]{1,32}$/, 'must be a net name: 1 to 32 of letters, digits and _ + - .');

const temperatureSchema = z.number().gt(ABSOLUTE_ZERO);
const fraction = z.number().min(0).lt(1);

/** What a process may say about one polarity. Units: V, A/V², 1/V, V/m, √V, V·m, m, V/K. */
const polarityShape = {
  kPrime: z.number().positive().optional(),
  lambda: z.number().nonnegative().optional(),
  earlyVoltagePerLength: z.number().positive().optional(),
  gamma: z.number().nonnegative().optional(),
  surfacePotential: z.number().positive().optional(),
  pelgromVt: z.number().nonnegative().optional(),
  pelgromBeta: z.number().nonnegative().optional(),
  thresholdTempco: z.number().optional(),
  mobilityExponent: z.number().optional(),
};

export const polarityFieldsSchema = z.strictObject({ threshold: z.number(), ...polarityShape });
export const overridesSchema = z.strictObject({ threshold: z.number().optional(), ...polarityShape });

/** One entry of `processes`. */
export const processSetSchema = z.strictObject({
  referenceTemperature: temperatureSchema.optional(),
  nfet: polarityFieldsSchema.optional(),
  pfet: polarityFieldsSchema.optional(),
});

export const regionSchema = z.enum(['off', 'triode', 'saturated']);

export const intentSchema = z.strictObject({ region: regionSchema, margin: z.number().nonnegative().optional() });

const fetShape = {
  ref: refSchema,
  drain: netNameSchema,
  gate: netNameSchema,
  source: netNameSchema,
  body: netNameSchema.optional(),
  process: z.string().optional(),
  width: z.number().positive().optional(),
  length: z.number().positive().optional(),
  k: z.number().positive().optional(),
  count: z.int().min(1).optional(),
  overrides: overridesSchema.optional(),
  intent: intentSchema.optional(),
};

const twoTerminals = { ref: refSchema, a: netNameSchema, b: netNameSchema };

const resistorSchema = z.strictObject({
  kind: z.literal('resistor'),
  ...twoTerminals,
  resistance: z.number().positive(),
});
const voltageSchema = z.strictObject({
  kind: z.literal('voltage'),
  ref: refSchema,
  plus: netNameSchema,
  minus: netNameSchema,
  voltage: z.number(),
});
const currentSchema = z.strictObject({
  kind: z.literal('current'),
  ref: refSchema,
  from: netNameSchema,
  to: netNameSchema,
  current: z.number(),
});
const capacitorSchema = z.strictObject({
  kind: z.literal('capacitor'),
  ...twoTerminals,
  capacitance: z.number().positive(),
});
const inductorSchema = z.strictObject({
  kind: z.literal('inductor'),
  ...twoTerminals,
  inductance: z.number().positive(),
});
const nfetSchema = z.strictObject({ kind: z.literal('nfet'), ...fetShape });
const pfetSchema = z.strictObject({ kind: z.literal('pfet'), ...fetShape });

export const partSchema = z.discriminatedUnion('kind', [
  resistorSchema,
  voltageSchema,
  currentSchema,
  capacitorSchema,
  inductorSchema,
  nfetSchema,
  pfetSchema,
]);

export const spreadSchema = z.strictObject({
  threshold: z.number().nonnegative().optional(),
  kPrime: fraction.optional(),
  resistance: fraction.optional(),
  supplies: recordByName(fraction).optional(),
  temperatures: z.array(temperatureSchema).min(1).optional(),
});

export const CIRCUIT_FORMAT = 'stillpoint.circuit';
export const CIRCUIT_VERSION = 1;

/** The circuit file without its parts, which are read one by one so that each can be named when it is wrong. */
export const circuitHeadSchema = z.strictObject({
  format: z.literal(CIRCUIT_FORMAT),
  version: z.literal(CIRCUIT_VERSION),
  title: z.string().optional(),
  ground: netNameSchema,
  temperature: temperatureSchema.optional(),
  processes: recordByName(processSetSchema).optional(),
  parts: z.array(z.unknown()),
  spread: spreadSchema.optional(),
  drawing: z.unknown().optional(),
});

/** The whole circuit file as it is written: SI base units, temperatures in °C. `readCircuit` also checks what it means. */
export const circuitFileSchema = circuitHeadSchema.extend({ parts: z.array(partSchema) });

export type Region = z.infer<typeof regionSchema>;
export type PolarityFields = z.infer<typeof polarityFieldsSchema>;
export type Overrides = z.infer<typeof overridesSchema>;
export type ProcessSet = z.infer<typeof processSetSchema>;
export type Intent = z.infer<typeof intentSchema>;
export type Spread = z.infer<typeof spreadSchema>;
export type CircuitPart = z.infer<typeof partSchema>;
export type PartKind = CircuitPart['kind'];
export type FetPart = Extract<CircuitPart, { kind: 'nfet' | 'pfet' }>;
export type Polarity = FetPart['kind'];
export type ResistorPart = z.infer<typeof resistorSchema>;
export type VoltagePart = z.infer<typeof voltageSchema>;
export type CurrentPart = z.infer<typeof currentSchema>;
export type CapacitorPart = z.infer<typeof capacitorSchema>;
export type InductorPart = z.infer<typeof inductorSchema>;
export type CircuitFile = z.infer<typeof circuitFileSchema>;

export function isFet(part: CircuitPart): part is FetPart {
  return part.kind === 'nfet' || part.kind === 'pfet';
}
