import { hash, verify } from '@node-rs/argon2';

/** argon2id (the library's default) with OWASP's least parameters: 19 MiB, 2 passes, 1 lane. */
const COST = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** The same text typed on two keyboards may come in two encodings; NFKC makes them one. */
const encode = (password: string) => password.normalize('NFKC');

export function hashPassword(password: string): Promise<string> {
  return hash(encode(password), COST);
}

/** Verified when there is no such account, so that an unknown address takes as long as a wrong password. */
const dummyHash = hashPassword('no account has this');

/** Whether this is the password; always false, after the same work, without a hash. */
export async function verifyPassword(stored: string | undefined, password: string): Promise<boolean> {
  const right = await verify(stored ?? (await dummyHash), encode(password));
  return right && stored !== undefined;
}

/** Whether a hash was made with less work than one made now. */
export function isWeakHash(stored: string): boolean {
  const cost = /^\$argon2id\$v=19\$m=(\d+),t=(\d+),p=(\d+)\$/.exec(stored);
  return cost === null || Number(cost[1]) < COST.memoryCost || Number(cost[2]) < COST.timeCost;
}
