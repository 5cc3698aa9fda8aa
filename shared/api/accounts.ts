import { z } from 'zod';
import { emailField, idField, nameField, roleField, tokenField } from './fields';

export const PASSWORD_LENGTH = { least: 8, most: 256 } as const;

/** A new password: 8 to 256 characters (code points), of any kind; the server also refuses common ones. */
export const newPasswordField = z
  .string()
  .refine((text) => [...text].length >= PASSWORD_LENGTH.least, `At least ${PASSWORD_LENGTH.least} characters.`)
  .refine((text) => [...text].length <= PASSWORD_LENGTH.most, `At most ${PASSWORD_LENGTH.most} characters.`);

/** `POST /api/sign-up`; with an invitation the person joins its team, without one a team of their own is made. */
export const signUpBody = z.strictObject({
  name: nameField,
  email: emailField,
  password: newPasswordField,
  invitation: tokenField.optional(),
});
export type SignUpBody = z.infer<typeof signUpBody>;

/** `POST /api/sign-in`. */
export const signInBody = z.strictObject({
  email: emailField,
  // Only the bound: the rules for new passwords must not tell what an old one can be.
  password: z.string().min(1, 'Give the password.').max(1024, 'At most 1024 characters.'),
});
export type SignInBody = z.infer<typeof signInBody>;

export const personShape = z.object({ id: idField, name: z.string(), email: z.string() });
export type Person = z.infer<typeof personShape>;

/** A team as one of its members sees it. */
export const ownTeamShape = z.object({ id: idField, name: z.string(), role: roleField });
export type OwnTeam = z.infer<typeof ownTeamShape>;

/** Of sign-up and sign-in. */
export const personAnswer = z.object({ person: personShape });
/** `GET /api/me`. */
export const meAnswer = z.object({ person: personShape, teams: z.array(ownTeamShape) });
export type MeAnswer = z.infer<typeof meAnswer>;
