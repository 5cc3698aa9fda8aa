import { z } from 'zod';
import { SYMBOL_PINS } from '../geometry/pins';
import {
  intentSchema,
  netNameSchema,
  overridesSchema,
  processSetSchema,
  refSchema,
  spreadSchema,
} from './circuit-file';

/** How far from the origin a thing may be drawn, in px. */
const FURTHEST = 100_000;

const coordinateSchema = z.number().int().multipleOf(10).min(-FURTHEST).max(FURTHEST);
export const gridPointSchema = z.strictObject({ x: coordinateSchema, y: coordinateSchema });
export const placeSchema = z.strictObject({
  x: coordinateSchema,
  y: coordinateSchema,
  turn: z.union([z.literal(0), z.literal(1), z.literal(2), z.literal(3)]),
  flip: z.boolean(),
});

export const partIdSchema = z
  .string()
  .min(1)
  .max(64)
  .regex(/^[\w-]+$/)
  .brand<'PartId'>();
export const wireIdSchema = z
  .string()
  .min(1)
  .max(64)
  .regex(/^[\w-]+$/)
  .brand<'WireId'>();
export type PartId = z.infer<typeof partIdSchema>;
export type WireId = z.infer<typeof wireIdSchema>;

const positive = z.number().positive();

/** The group of parts of one kind whose values are kept equal, by its name: `A`. */
export const matchSchema = z
  .string()
  .regex(/^[A-Z][A-Za-z0-9]{0,7}$/, 'must be a capital letter, then letters or digits');
const match = { match: matchSchema.optional() };

/** Most characters of a note. */
export const LONGEST_NOTE = 2000;

/** Sizes in metres, k in A/V²; which of them a device has is checked when the circuit is solved. */
const fetValuesSchema = z.strictObject({
  width: positive.optional(),
  length: positive.optional(),
  k: positive.optional(),
  count: z.number().int().min(1).optional(),
  process: z.string().max(64).optional(),
  overrides: overridesSchema.optional(),
  intent: intentSchema.optional(),
  bodyLedOut: z.boolean().optional(),
  ...match,
});

const drawn = { id: partIdSchema, place: placeSchema };

/** A symbol on the sheet. Values are in SI base units; ground, supply, net name, junction and note are drawing only. */
export const drawnPartSchema = z.discriminatedUnion('kind', [
  z.strictObject({ ...drawn, kind: z.literal('nfet'), ref: refSchema, values: fetValuesSchema }),
  z.strictObject({ ...drawn, kind: z.literal('pfet'), ref: refSchema, values: fetValuesSchema }),
  z.strictObject({
    ...drawn,
    kind: z.literal('resistor'),
    ref: refSchema,
    values: z.strictObject({ resistance: positive, ...match }),
  }),
  z.strictObject({
    ...drawn,
    kind: z.literal('capacitor'),
    ref: refSchema,
    values: z.strictObject({ capacitance: positive, ...match }),
  }),
  z.strictObject({
    ...drawn,
    kind: z.literal('inductor'),
    ref: refSchema,
    values: z.strictObject({ inductance: positive, ...match }),
  }),
  z.strictObject({
    ...drawn,
    kind: z.literal('voltage'),
    ref: refSchema,
    values: z.strictObject({ voltage: z.number(), ...match }),
  }),
  z.strictObject({
    ...drawn,
    kind: z.literal('current'),
    ref: refSchema,
    values: z.strictObject({ current: z.number(), ...match }),
  }),
  z.strictObject({ ...drawn, kind: z.literal('ground'), values: z.strictObject({}) }),
  z.strictObject({ ...drawn, kind: z.literal('supply'), values: z.strictObject({ net: netNameSchema }) }),
  z.strictObject({ ...drawn, kind: z.literal('net-name'), values: z.strictObject({ net: netNameSchema }) }),
  z.strictObject({ ...drawn, kind: z.literal('junction'), values: z.strictObject({}) }),
  z.strictObject({
    ...drawn,
    kind: z.literal('note'),
    values: z.strictObject({ text: z.string().max(LONGEST_NOTE) }),
  }),
]);
export type DrawnPart = z.infer<typeof drawnPartSchema>;
export type DrawnKind = DrawnPart['kind'];
/** A part that the circuit knows by its reference. */
export type DrawnComponent = Extract<DrawnPart, { ref: string }>;
export type DrawnFet = Extract<DrawnPart, { kind: 'nfet' | 'pfet' }>;

export const wireEndSchema = z.strictObject({ part: partIdSchema, pin: z.string().max(16) });
export type WireEnd = z.infer<typeof wireEndSchema>;

/** Most corners of one's own choice on a wire. */
export const MOST_BENDS = 64;

export const wireSchema = z.strictObject({
  id: wireIdSchema,
  from: wireEndSchema,
  to: wireEndSchema,
  bends: z.array(gridPointSchema).max(MOST_BENDS),
});
export type Wire = z.infer<typeof wireSchema>;

/** Everything on a sheet, as plain data: what the live document holds and what a circuit file carries under `drawing`. */
export type Drawing = {
  readonly parts: readonly DrawnPart[];
  readonly wires: readonly Wire[];
  readonly settings: SheetSettings;
};

export const sheetSettingsSchema = z.strictObject({
  ground: netNameSchema,
  temperature: z.number().gt(-273.15),
  processes: z.record(z.string(), processSetSchema),
  spread: spreadSchema.optional(),
});
export type SheetSettings = z.infer<typeof sheetSettingsSchema>;

export function isComponent(part: DrawnPart): part is DrawnComponent {
  return 'ref' in part;
}

export function isFet(part: DrawnPart): part is DrawnFet {
  return part.kind === 'nfet' || part.kind === 'pfet';
}

export function bodyLedOut(part: DrawnPart): boolean {
  return isFet(part) && part.values.bodyLedOut === true;
}

/** Whether a wire may end at this terminal of this part. */
export function hasPin(part: DrawnPart, pin: string): boolean {
  return Object.hasOwn(SYMBOL_PINS[part.kind], pin) && (pin !== 'body' || bodyLedOut(part));
}
