import { z } from 'zod';

/** Every code an answer may carry, with its HTTP status. */
export const STATUS_OF_CODE = {
  'malformed-json': 400,
  'malformed-request': 400,
  'not-signed-in': 401,
  'wrong-credentials': 401,
  'not-allowed': 403,
  'foreign-origin': 403,
  'invitation-for-another': 403,
  'not-found': 404,
  'invitation-not-valid': 404,
  'address-taken': 409,
  'already-member': 409,
  'last-owner': 409,
  'signed-off': 409,
  archived: 409,
  'too-large': 413,
  'wrong-content-type': 415,
  invalid: 422,
  'too-many': 429,
  internal: 500,
  busy: 503,
  'took-too-long': 503,
} as const satisfies Record<string, number>;

export type ErrorCode = keyof typeof STATUS_OF_CODE;

/** The body of every answer that is an error; `fields` names the places in the request that are wrong. */
export const errorAnswer = z.object({
  error: z.object({
    code: z.string(),
    message: z.string(),
    fields: z.record(z.string(), z.string()).optional(),
  }),
});
export type ErrorAnswer = z.infer<typeof errorAnswer>;
