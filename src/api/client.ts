import type { z } from 'zod';
import { errorAnswer } from '#shared/api/errors';

/** An answer that is an error, or none at all (`code` is then `unreachable`, `status` 0). */
export class ApiError extends Error {
  readonly status: number;
  readonly code: string;
  /** What is wrong with each field of the request, by its name there. */
  readonly fields: Readonly<Record<string, string>>;

  constructor(status: number, code: string, message: string, fields: Readonly<Record<string, string>> = {}) {
    super(message);
    this.name = 'ApiError';
    this.status = status;
    this.code = code;
    this.fields = fields;
  }
}

type Method = 'GET' | 'POST' | 'PATCH' | 'DELETE';

/** Calls the server and reads its answer by `shape`. Throws `ApiError`, whose message is for a person. */
export async function call<Shape extends z.ZodType>(
  method: Method,
  path: string,
  shape: Shape,
  body?: unknown,
): Promise<z.output<Shape>> {
  const answer = await send(method, path, body);
  const read = shape.safeParse(await answer.json().catch(() => undefined));
  if (!read.success) throw notUnderstood(answer.status);
  return read.data;
}

/** Calls the server where it answers without a body. Throws `ApiError`. */
export async function callForNothing(method: Method, path: string, body?: unknown): Promise<void> {
  await send(method, path, body);
}

async function send(method: Method, path: string, body: unknown): Promise<Response> {
  let answer: Response;
  try {
    answer = await fetch(path, {
      method,
      headers: body === undefined ? {} : { 'Content-Type': 'application/json' },
      ...(body === undefined ? {} : { body: JSON.stringify(body) }),
    });
  } catch {
    throw new ApiError(0, 'unreachable', 'The server cannot be reached. Check the connection, then try again.');
  }
  if (answer.ok) return answer;
  const read = errorAnswer.safeParse(await answer.json().catch(() => undefined));
  if (!read.success) throw notUnderstood(answer.status);
  const { code, message, fields } = read.data.error;
  throw new ApiError(answer.status, code, message, fields);
}

function notUnderstood(status: number): ApiError {
  return new ApiError(
    status,
    'not-understood',
    `The server gave an answer this page does not understand (status ${status}). Reload the page, then try again.`,
  );
}
