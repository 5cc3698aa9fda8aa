import type { Sessions } from '../auth/sessions';
import type { Db } from '../db/connect';
import type { Solving } from '../solving/solving';
import type { Rooms } from '../sync/rooms';
import type { Events } from './events';
import type { ListNews } from './list-news';
import type { Standings } from './standings';

/** What every use case works with. */
export interface Context {
  readonly db: Db;
  /** Milliseconds since 1970. */
  readonly now: () => number;
  readonly sessions: Sessions;
  readonly rooms: Rooms;
  readonly solving: Solving;
  readonly events: Events;
  readonly standings: Standings;
  readonly listNews: ListNews;
  /** The address that links begin with. */
  readonly publicUrl: () => string;
}
