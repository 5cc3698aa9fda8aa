import type { Role } from '#shared/access/roles';
import type { Person } from '#shared/api/accounts';
import type { CloseCode } from './socket-codes';

/** Who opened a socket, and by which session. */
export interface Opener {
  readonly person: Person;
  readonly sessionId: string;
}

/** One open sheet of one person, as its room knows it. */
export interface Member extends Opener {
  role: Role;
  /** Whether the sheet is archived. */
  archived: boolean;
  send(message: Uint8Array): void;
  close(code: CloseCode, reason: string): void;
}
