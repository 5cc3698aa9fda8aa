import { z } from 'zod';
import { ownTeamShape } from './accounts';
import { nameField } from './fields';

/** `POST /api/teams`. */
export const createTeamBody = z.strictObject({ name: nameField });
export type CreateTeamBody = z.infer<typeof createTeamBody>;

export const teamAnswer = z.object({ team: ownTeamShape });
/** `GET /api/teams`. */
export const teamsAnswer = z.object({ teams: z.array(ownTeamShape) });
