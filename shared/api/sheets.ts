import { z } from 'zod';
import { ownTeamShape } from './accounts';
import { idField, nameField, timeField } from './fields';

export const SHEET_STATES = ['draft', 'in-review', 'signed-off', 'changed'] as const;
export type SheetState = (typeof SHEET_STATES)[number];

/** `POST /api/teams/:id/sheets`: blank, from a starter's id, or from a circuit file, which the service reads. */
export const createSheetBody = z
  .strictObject({
    name: nameField,
    starter: z.string().min(1).max(64).optional(),
    circuit: z.unknown().optional(),
  })
  .refine((body) => body.starter === undefined || body.circuit === undefined, {
    path: ['starter'],
    message: 'Give a starter or a circuit, not both.',
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
});
export type Sheet = z.infer<typeof sheetShape>;

/** Of `GET` and `PATCH /api/sheets/:id` and of making one: the sheet, and its team with the asker's role. */
export const sheetAnswer = z.object({ sheet: sheetShape, team: ownTeamShape });
export type SheetAnswer = z.infer<typeof sheetAnswer>;

/** `GET /api/teams/:id/sheets`, last changed first, archived ones too. */
export const sheetsAnswer = z.object({ sheets: z.array(sheetShape) });
