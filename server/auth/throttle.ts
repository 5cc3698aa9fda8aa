/**
 * How long sign-in must wait. Guesses from one network address on one account wait longer and longer, up to a minute.
 * An account takes at most 100 failures an hour, of which 20 are kept for addresses its owner has signed in from:
 * strangers can use up their own share only, so nobody can lock the owner out for good.
 */
export interface Attempt {
  readonly address: string;
  readonly succeeded: boolean;
  readonly at: number;
}

export const WINDOW = 3_600_000;
/** How long an address counts as the owner's after a sign-in from it. */
export const KNOWN_FOR = 90 * 24 * WINDOW;
const FREE_FAILURES = 5;
const LONGEST_WAIT = 60_000;
const PER_ACCOUNT = { known: 20, stranger: 80 };
const PER_ADDRESS = 200;

/** Milliseconds until an attempt may be made; 0 when it may be made now. Attempts are of the last hour, newest first. */
export function waitBeforeSignIn(question: {
  readonly now: number;
  readonly address: string;
  readonly knownAddresses: ReadonlySet<string>;
  readonly onAccount: readonly Attempt[];
  readonly failuresFromAddress: readonly Attempt[];
}): number {
  const { now, address, knownAddresses, onAccount, failuresFromAddress } = question;
  const known = knownAddresses.has(address);
  const sameShare = onAccount.filter((it) => !it.succeeded && knownAddresses.has(it.address) === known);
  const fromHere = onAccount.filter((it) => it.address === address);
  const lastSuccess = fromHere.findIndex((it) => it.succeeded);
  const sinceSuccess = lastSuccess < 0 ? fromHere : fromHere.slice(0, lastSuccess);
  return Math.max(
    0,
    untilNext(sinceSuccess, now),
    untilFewer(sameShare, known ? PER_ACCOUNT.known : PER_ACCOUNT.stranger, now),
    untilFewer(failuresFromAddress, PER_ADDRESS, now),
  );
}

function untilNext(failures: readonly Attempt[], now: number): number {
  const [latest] = failures;
  if (!latest || failures.length < FREE_FAILURES) return 0;
  return latest.at + Math.min(1000 * 2 ** (failures.length - FREE_FAILURES), LONGEST_WAIT) - now;
}

/** Until fewer than `most` of these lie within the last hour. */
function untilFewer(failures: readonly Attempt[], most: number, now: number): number {
  const blocking = failures[most - 1];
  return blocking ? blocking.at + WINDOW - now : 0;
}
