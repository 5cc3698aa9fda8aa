import type { Person, SignUpBody } from '#shared/api/accounts';
import { Refusal } from '#shared/api/refusal';
import { passwordFault } from '../auth/password-rules';
import { hashPassword } from '../auth/passwords';
import type { SignedIn } from '../auth/sessions';
import { newId } from '../auth/tokens';
import type { Db } from '../db/connect';
import { findPersonByEmail, insertPerson } from '../db/queries/people';
import { insertMembership, insertTeam } from '../db/queries/teams';
import { joinByInvitation } from './accept-invitation';
import type { Context } from './context';
import { endSession } from './sign-out';
import { tellTeam } from './tell-team';

/** Makes an account and signs it in, into the team that invited it or else one of its own; ends the session the browser had. */
export async function signUp(
  ctx: Context,
  body: SignUpBody,
  before: SignedIn | null,
): Promise<{ person: Person; setCookie: string }> {
  const fault = passwordFault(body.password, body);
  if (fault) throw new Refusal('invalid', 'This password cannot be taken.', { fields: { password: fault } });
  const passwordHash = await hashPassword(body.password);
  const person: Person = { id: newId(), name: body.name, email: body.email };
  const teamId = ctx.db.transaction((tx) => {
    if (findPersonByEmail(tx, body.email)) {
      const message = 'There is an account with this address: sign in instead.';
      throw new Refusal('address-taken', message, { fields: { email: message } });
    }
    const now = ctx.now();
    insertPerson(tx, { ...person, passwordHash, createdAt: now });
    return body.invitation === undefined
      ? ownTeam(tx, person, now)
      : joinByInvitation(tx, body.invitation, person, now).id;
  });
  tellTeam(ctx, teamId, { kind: 'member', teamId, personId: person.id });
  if (before) endSession(ctx, before);
  return { person, setCookie: await ctx.sessions.open(person.id) };
}

function ownTeam(db: Db, person: Person, now: number): string {
  const teamId = newId();
  insertTeam(db, { id: teamId, name: `${person.name}’s team`, createdAt: now });
  insertMembership(db, { teamId, personId: person.id, role: 'owner', joinedAt: now });
  return teamId;
}
