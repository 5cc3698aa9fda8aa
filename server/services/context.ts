import type { Sessions } from '../auth/sessions';
import type { Db } from '../db/connect';
import type { Rooms } from '../sync/rooms';
import type { Events } from './events';

/** What every use case works with. */
export interface Context {
  readonly db: Db;
  /** Milliseconds since 1970. */
  readonly now: () => number;
  readonly sessions: Sessions;
  readonly rooms: Rooms;
  readonly events: Events;
  /** The address that links begin with. */
  readonly publicUrl: () => string;
}
