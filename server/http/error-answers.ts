import type { ErrorRequestHandler, RequestHandler } from 'express';
import { type ErrorAnswer, type ErrorCode, STATUS_OF_CODE } from '#shared/api/errors';
import { Refusal } from '#shared/api/refusal';

export const noSuchRoute: RequestHandler = () => {
  throw new Refusal('not-found', 'There is nothing at this address.');
};

/** The one place where an error becomes an answer. What went wrong inside is in the log, under the id in the answer. */
export const answerErrors: ErrorRequestHandler = (error: unknown, request, response, next) => {
  if (response.headersSent) return next(error);
  const refusal = error instanceof Refusal ? error : asRefusal(error);
  if (!refusal) request.log.error({ err: error }, 'a request failed');
  const { code, message, fields, retryAfter } =
    refusal ??
    new Refusal('internal', `Something went wrong here, not with what you sent. It is logged as ${request.id}.`);
  if (retryAfter !== undefined) response.set('Retry-After', String(Math.max(1, Math.ceil(retryAfter))));
  const answer: ErrorAnswer = { error: { code, message, ...(fields && { fields }) } };
  response.status(STATUS_OF_CODE[code]).json(answer);
};

const PARSER_FAULTS: Readonly<Record<string, [ErrorCode, string]>> = {
  'entity.parse.failed': ['malformed-json', 'The body is not JSON.'],
  'entity.too.large': ['too-large', 'The body is larger than 1 MB.'],
  'charset.unsupported': ['wrong-content-type', 'Send JSON in UTF-8.'],
  'encoding.unsupported': ['wrong-content-type', 'Send the body uncompressed, or with gzip or deflate.'],
};

/** Errors of Express and its body parser that are the sender's doing. */
function asRefusal(error: unknown): Refusal | undefined {
  if (!(error instanceof Error)) return undefined;
  const fault = 'type' in error && typeof error.type === 'string' ? PARSER_FAULTS[error.type] : undefined;
  if (fault) return new Refusal(...fault);
  const status = 'status' in error ? Number(error.status) : 500;
  return status >= 400 && status < 500
    ? new Refusal('malformed-request', 'The request cannot be understood.')
    : undefined;
}
