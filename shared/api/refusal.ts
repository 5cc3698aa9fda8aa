import type { ErrorCode } from './errors';

/**
 * A request refused for a reason its sender must be told. It is thrown, not returned, so that no route can forget
 * to look at it; one error handler turns it into the answer.
 */
export class Refusal extends Error {
  readonly code: ErrorCode;
  readonly fields: Readonly<Record<string, string>> | undefined;
  /** Seconds after which trying again can succeed. */
  readonly retryAfter: number | undefined;

  constructor(
    code: ErrorCode,
    message: string,
    more: { fields?: Readonly<Record<string, string>>; retryAfter?: number } = {},
  ) {
    super(message);
    this.name = 'Refusal';
    this.code = code;
    this.fields = more.fields;
    this.retryAfter = more.retryAfter;
  }
}
