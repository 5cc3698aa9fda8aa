import { z } from 'zod';
import { idField } from './fields';

/** `GET /api/events`: what changed for this person, by ids only; the event's name is its `kind`. */
export const changeEvent = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('member'), teamId: idField, personId: idField }),
  z.object({ kind: z.literal('sheet'), teamId: idField, sheetId: idField }),
  /** In the team's list: who has which sheet open, or how one of them stands. */
  z.object({ kind: z.literal('sheets'), teamId: idField }),
]);
export type ChangeEvent = z.infer<typeof changeEvent>;
