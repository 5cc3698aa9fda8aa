import type { z } from 'zod';
import { DEEPEST, isDeeperThan } from '#shared/api/nesting';
import { Refusal } from '#shared/api/refusal';

/** The body as its schema says, or a refusal that names each field that is wrong. */
export function parseBody<T>(schema: z.ZodType<T>, body: unknown): T {
  if (body === undefined) throw new Refusal('malformed-request', 'Send a JSON body.');
  if (isDeeperThan(DEEPEST, body)) {
    throw new Refusal('malformed-request', `The body is nested too deep: at most ${DEEPEST} levels.`);
  }
  const read = schema.safeParse(body);
  if (read.success) return read.data;
  const fields: Record<string, string> = {};
  for (const issue of read.error.issues) {
    for (const place of places(issue)) fields[place] ??= issue.message;
  }
  throw new Refusal('invalid', 'Some of what was sent cannot be taken.', { fields });
}

function places(issue: z.core.$ZodIssue): string[] {
  const path = issue.path.map(String);
  const keys = issue.code === 'unrecognized_keys' ? issue.keys : [];
  return keys.length > 0 ? keys.map((key) => [...path, key].join('.')) : [path.join('.') || 'body'];
}
