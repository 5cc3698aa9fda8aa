import { type Awareness, applyAwarenessUpdate, removeAwarenessStates } from 'y-protocols/awareness';
import type { Member } from './member';
import { type Presence, presenceUpdate, tellPresence } from './messages';

/** The largest presence taken, in characters of JSON. */
const LARGEST = 4096;

/**
 * Who is in a room and where. Anybody can claim any identity in the protocol, so who is who is told by the server:
 * a client id belongs to the person that used it first, a socket has one client id, and the name on a presence is
 * the session's.
 */
export class Presences {
  private readonly awareness: Awareness;
  private readonly ownerOf = new Map<number, string>();
  private readonly clientOf = new Map<Member, number>();

  constructor(awareness: Awareness) {
    this.awareness = awareness;
    // The server is in no room itself.
    awareness.setLocalState(null);
  }

  take(member: Member, presences: readonly Presence[]): void {
    // Stock clients pass on what they heard of others; that is left aside.
    for (const presence of presences) {
      const claimed = this.clientOf.get(member);
      if (claimed === undefined ? this.claim(member, presence) : claimed === presence.clientId) {
        this.apply(member, presence, claimed === undefined);
      }
    }
  }

  private claim(member: Member, { clientId, state }: Presence): boolean {
    const owner = this.ownerOf.get(clientId) ?? member.person.id;
    if (state === null || owner !== member.person.id || clientId === this.awareness.clientID) return false;
    // The same person's line was cut and the old socket has not been missed yet.
    for (const [other, id] of this.clientOf) if (id === clientId) this.clientOf.delete(other);
    this.ownerOf.set(clientId, owner);
    this.clientOf.set(member, clientId);
    return true;
  }

  private apply(member: Member, { clientId, clock, state }: Presence, first: boolean): void {
    const known = this.awareness.meta.get(clientId)?.clock;
    // After a reconnect a client goes on counting where it was, which everybody would take for old news.
    const next = first && known !== undefined ? Math.max(clock, known + 1) : clock;
    const stamped = state && this.stamp(member, state);
    if (stamped && JSON.stringify(stamped).length > LARGEST) return;
    applyAwarenessUpdate(this.awareness, presenceUpdate([{ clientId, clock: next, state: stamped }]), member);
  }

  private stamp({ person, role }: Member, state: Readonly<Record<string, unknown>>): Record<string, unknown> {
    return { ...state, user: { id: person.id, name: person.name, initials: initialsOf(person.name), role } };
  }

  /** Writes the member's present role on their presence. */
  restamp(member: Member): void {
    const clientId = this.clientOf.get(member);
    const state = clientId === undefined ? undefined : this.awareness.getStates().get(clientId);
    if (clientId !== undefined && state) this.apply(member, { clientId, clock: 0, state }, true);
  }

  remove(member: Member): void {
    const clientId = this.clientOf.get(member);
    if (clientId === undefined) return;
    this.clientOf.delete(member);
    removeAwarenessStates(this.awareness, [clientId], member);
  }

  /** The message that tells of everyone present, or undefined when nobody is. */
  all(): Uint8Array | undefined {
    const ids = [...this.awareness.getStates().keys()];
    return ids.length > 0 ? tellPresence(this.awareness, ids) : undefined;
  }
}

/** The first letters of the first and the last word. */
function initialsOf(name: string): string {
  const words = name.split(/\s+/).filter((word) => word !== '');
  const ends = words.length > 1 ? [words[0], words.at(-1)] : words;
  return ends
    .map((word) => [...(word ?? '')][0] ?? '')
    .join('')
    .toUpperCase();
}
