import type { ChangeEvent } from '#shared/api/events';
import type { SignedIn } from '../auth/sessions';

/** What a route is handed: the request, already bounded and parsed as JSON, and who sent it. */
export interface Call {
  /** A named part of the path. */
  param(name: string): string;
  readonly body: unknown;
  /** The sender's network address. */
  readonly address: string;
  readonly signedIn: SignedIn | null;
  /** Says in the log's line of this request whose account it is about, where no session tells. */
  note(account: string): void;
}
export type SignedInCall = Call & { readonly signedIn: SignedIn };

/** Feeds a stream of events until the function it gave back is called; `end` closes it from this side. */
export type EventSource = (sink: { send(event: ChangeEvent): void; end(): void }) => () => void;

export type Answer =
  | { readonly status: number; readonly body?: unknown; readonly setCookie?: string }
  | { readonly events: EventSource };

interface Path {
  readonly method: 'get' | 'post' | 'patch' | 'delete';
  readonly path: string;
  /** The most calls a minute: by a person, or by a network address where no session is needed. */
  readonly perMinute?: number;
}

export type Route = Path &
  (
    | { readonly access: 'public'; handle(call: Call): Answer | Promise<Answer> }
    | { readonly access: 'signed-in'; handle(call: SignedInCall): Answer | Promise<Answer> }
  );
