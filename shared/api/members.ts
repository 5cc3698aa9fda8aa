import { z } from 'zod';
import { idField, roleField, timeField } from './fields';

/** `PATCH /api/teams/:id/members/:personId`. */
export const changeRoleBody = z.strictObject({ role: roleField });
export type ChangeRoleBody = z.infer<typeof changeRoleBody>;

/** A member; `id` is the person's. */
export const memberShape = z.object({
  id: idField,
  name: z.string(),
  email: z.string(),
  role: roleField,
  joinedAt: timeField,
});
export type Member = z.infer<typeof memberShape>;

export const memberAnswer = z.object({ member: memberShape });
/** `GET /api/teams/:id/members`, by name. */
export const membersAnswer = z.object({ members: z.array(memberShape) });
