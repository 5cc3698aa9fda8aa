import type { Person, SignInBody } from '#shared/api/accounts';
import { Refusal } from '#shared/api/refusal';
import { hashPassword, isWeakHash, verifyPassword } from '../auth/passwords';
import type { SignedIn } from '../auth/sessions';
import { KNOWN_FOR, WINDOW, waitBeforeSignIn } from '../auth/throttle';
import { hashToken, pseudonym } from '../auth/tokens';
import { findPersonByEmail, setPasswordHash } from '../db/queries/people';
import {
  attemptsOnAccount,
  failuresFromAddress,
  hasSucceededFrom,
  insertAttempt,
  markSucceeded,
} from '../db/queries/sign-in-attempts';
import type { Context } from './context';
import { endSession } from './sign-out';

/** Starts a new session, and ends the one that the same browser had. */
export async function signIn(
  ctx: Context,
  body: SignInBody,
  from: { address: string; signedIn: SignedIn | null; note(account: string): void },
): Promise<{ person: Person; setCookie: string }> {
  const person = findPersonByEmail(ctx.db, body.email);
  from.note(person?.id ?? pseudonym(body.email));
  const attempt = beginAttempt(ctx, hashToken(body.email), from.address);
  const right = await verifyPassword(person?.passwordHash, body.password);
  // One text for an unknown address and for a wrong password: neither tells who has an account.
  if (!person || !right) throw new Refusal('wrong-credentials', 'The address or the password is wrong.');
  markSucceeded(ctx.db, attempt);
  if (isWeakHash(person.passwordHash)) setPasswordHash(ctx.db, person.id, await hashPassword(body.password));
  if (from.signedIn) endSession(ctx, from.signedIn);
  return {
    person: { id: person.id, name: person.name, email: person.email },
    setCookie: await ctx.sessions.open(person.id),
  };
}

/** Counts as a failure until it succeeds, so that guesses made all at once are counted too. */
function beginAttempt({ db, now }: Context, account: string, address: string): number {
  const at = now();
  const onAccount = attemptsOnAccount(db, account, at - WINDOW);
  const addresses = new Set([address, ...onAccount.map((attempt) => attempt.address)]);
  const wait = waitBeforeSignIn({
    now: at,
    address,
    knownAddresses: new Set([...addresses].filter((it) => hasSucceededFrom(db, account, it, at - KNOWN_FOR))),
    onAccount,
    failuresFromAddress: failuresFromAddress(db, address, at - WINDOW),
  });
  if (wait > 0) {
    const seconds = Math.ceil(wait / 1000);
    throw new Refusal('too-many', `Too many attempts: try again in ${seconds} s.`, { retryAfter: seconds });
  }
  return insertAttempt(db, { account, address, succeeded: false, at });
}
