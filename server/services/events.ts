import type { ChangeEvent } from '#shared/api/events';
import type { SignedIn } from '../auth/sessions';

interface Listener extends SignedIn {
  send(event: ChangeEvent): void;
  end(): void;
}

/** Tells open pages what changed, so that they fetch it again. */
export interface Events {
  listen(listener: Listener): () => void;
  /** Tells these people. */
  tell(personIds: Iterable<string>, event: ChangeEvent): void;
  /** Ends the person's streams whose session has ended. */
  recheck(personId: string): void;
  endAll(): void;
}

export function createEvents(sessionLives: (sessionId: string) => boolean): Events {
  const listeners = new Map<string, Set<Listener>>();
  const of = (personId: string) => listeners.get(personId) ?? new Set();

  return {
    listen(listener) {
      const { id } = listener.person;
      const own = of(id).add(listener);
      listeners.set(id, own);
      return () => {
        own.delete(listener);
        if (own.size === 0 && listeners.get(id) === own) listeners.delete(id);
      };
    },
    tell(personIds, event) {
      for (const id of new Set(personIds)) {
        for (const listener of of(id)) {
          // Sessions also end by time, of which nobody is told.
          if (sessionLives(listener.sessionId)) listener.send(event);
          else listener.end();
        }
      }
    },
    recheck(personId) {
      for (const listener of of(personId)) if (!sessionLives(listener.sessionId)) listener.end();
    },
    endAll() {
      for (const own of listeners.values()) for (const listener of own) listener.end();
    },
  };
}
