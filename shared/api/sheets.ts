import { z } from 'zod';
import { ownTeamShape } from './accounts';
import { idField, nameField, timeField } from './fields';

export const SHEET_STATES = ['draft', 'in-review', 'signed-off', 'changed'] as const;
export type SheetState = (typeof SHEET_STATES)[number];

/**
 * `POST /api/teams/:id/sheets`: blank, from a starter's id, from a circuit file, which the service reads, or as a copy of
 * a sheet that the asker may open.
 */
export const createSheetBody = z
  .strictObject({
    name: nameField,
    starter: z.string().min(1).max(64).optional(),
    circuit: z.unknown().optional(),
    copyOf: idField.optional(),
  })
  .refine(({ starter, circuit, copyOf }) => [starter, circuit, copyOf].filter((one) => one !== undefined).length < 2, {
    path: ['starter'],
    message: 'Give a starter, a circuit or a sheet to copy, and no two of them.',
  });
export type CreateSheetBody = z.infer<typeof createSheetBody>;

/** `PATCH /api/sheets/:id`. */
export const changeSheetBody = z
  .strictObject({ name: nameField.optional(), archived: z.boolean().optional() })
  .refine((body) => body.name !== undefined || body.archived !== undefined, 'Give a name or archived.');
export type ChangeSheetBody = z.infer<typeof changeSheetBody>;

export const sheetShape = z.object({
  id: idField,
  teamId: idField,
  name: z.string(),
  state: z.enum(SHEET_STATES),
  archived: z.boolean(),
  createdAt: timeField,
  changedAt: timeField,
  /** The name of whoever began it. */
  createdBy: z.string(),
});
export type Sheet = z.infer<typeof sheetShape>;

/** Of `GET` and `PATCH /api/sheets/:id` and of making one: the sheet, and its team with the asker's role. */
export const sheetAnswer = z.object({ sheet: sheetShape, team: ownTeamShape });
export type SheetAnswer = z.infer<typeof sheetAnswer>;

/** A device against its intent, in volts. */
const deviceStandingShape = z.object({
  ref: z.string(),
  verdict: z.enum(['met', 'thin', 'missed']),
  margin: z.number(),
  slack: z.number(),
});

/** What the operating point says of a whole sheet. `fets` counts the devices drawn. */
export const sheetStandingShape = z.discriminatedUnion('status', [
  z.object({ status: z.literal('empty'), fets: z.literal(0) }),
  z.object({
    status: z.literal('solved'),
    fets: z.number(),
    verdicts: z.object({ met: z.number(), thin: z.number(), missed: z.number() }),
    /** The device of least slack; null where none has an intent. */
    worst: deviceStandingShape.nullable(),
  }),
  z.object({ status: z.enum(['unsolved', 'invalid']), fets: z.number(), reason: z.string() }),
]);
export type SheetStanding = z.infer<typeof sheetStandingShape>;

/** A sheet in its team's list. */
export const listedSheetShape = sheetShape.extend({
  /** Of the sheet as it is stored now; null while it is being solved, and a `sheets` event tells when that is done. */
  standing: sheetStandingShape.nullable(),
  /** Who has it open, each once, by name. */
  here: z.array(z.object({ id: idField, name: z.string() })),
});
export type ListedSheet = z.infer<typeof listedSheetShape>;

/** `GET /api/teams/:id/sheets`, last changed first, archived ones too. */
export const sheetsAnswer = z.object({ sheets: z.array(listedSheetShape) });
