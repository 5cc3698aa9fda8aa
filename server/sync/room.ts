import { Awareness } from 'y-protocols/awareness';
import * as Y from 'yjs';
import { can } from '#shared/access/roles';
import { changesNothing } from './changes-nothing';
import type { SheetLog } from './log';
import type { Member } from './member';
import { askForMissing, type ClientMessage, tellMissing, tellPresence, tellRefused, tellUpdate } from './messages';
import { requirePlain } from './plain-update';
import { Presences } from './presences';
import type { CloseCode } from './socket-codes';

export interface RoomNews {
  /** Someone came or went, or the changes have fallen quiet. */
  stirred(): void;
  /** Changes could not be stored: the document in memory is ahead of the log and must be let go. */
  failed(room: Room, error: unknown): void;
  /** The log could not be shortened; nothing is lost. */
  notCompacted(error: unknown): void;
}

/** How long changes are gathered into one commit, in milliseconds. */
const GATHER = 3;
/** How long nothing must change for the changes to have fallen quiet, in milliseconds. */
const QUIET = 1_000;
/** Rows in the log at which one row is put in their place. */
const COMPACT_AT = 500;
/** The largest change taken at once; the frame around it may be larger, so that its sender can be told. */
const LARGEST_UPDATE = 1_048_576;

/**
 * One sheet's live document. Nobody sees a change before it is stored: changes go into the document, are gathered for
 * a few milliseconds, stored in one commit, and only then sent on.
 */
export class Room {
  readonly doc = new Y.Doc();
  readonly members = new Set<Member>();
  private readonly presences: Presences;
  private pending: { update: Uint8Array; from: unknown }[] = [];
  private timer: NodeJS.Timeout | undefined;
  private quiet: NodeJS.Timeout | undefined;
  private rows: number;
  private readonly log: SheetLog;
  private readonly news: RoomNews;

  /** Loads the sheet. Throws when its log cannot be read. */
  constructor(log: SheetLog, news: RoomNews) {
    this.log = log;
    this.news = news;
    const updates = log.load();
    this.rows = updates.length;
    this.doc.transact(() => {
      for (const update of updates) Y.applyUpdate(this.doc, update);
    });
    this.doc.on('update', (update: Uint8Array, from: unknown) => {
      this.pending.push({ update, from });
      this.timer ??= setTimeout(() => this.flush(), GATHER);
    });
    const awareness = new Awareness(this.doc);
    this.presences = new Presences(awareness);
    awareness.on('update', ({ added, updated, removed }: Record<'added' | 'updated' | 'removed', number[]>) => {
      // To their sender too: a client that hears nothing for 30 s, not even itself, thinks the line is dead.
      this.broadcast(tellPresence(awareness, [...added, ...updated, ...removed]));
    });
  }

  join(member: Member): void {
    this.members.add(member);
    member.send(askForMissing(this.doc));
    const everyone = this.presences.all();
    if (everyone) member.send(everyone);
    this.news.stirred();
  }

  leave(member: Member): void {
    if (!this.members.delete(member)) return;
    this.presences.remove(member);
    this.news.stirred();
  }

  /** Shows everybody the member's new role. */
  restamp(member: Member): void {
    this.presences.restamp(member);
  }

  /** Throws when the message is no valid one. */
  receive(member: Member, message: ClientMessage): void {
    switch (message.kind) {
      case 'sync-step-1':
        // What is told must be stored, and what is stored told.
        if (this.flush()) member.send(tellMissing(this.doc, message.stateVector));
        return;
      case 'sync-step-2':
      case 'update':
        this.change(member, message.update);
        return;
      case 'awareness':
        this.presences.take(member, message.presences);
        return;
      case 'query-awareness': {
        const everyone = this.presences.all();
        if (everyone) member.send(everyone);
        return;
      }
    }
  }

  private change(member: Member, update: Uint8Array): void {
    const refusal = refusalOf(member);
    if (refusal !== undefined) {
      if (!changesNothing(this.doc, update)) member.send(tellRefused(refusal));
      return;
    }
    if (update.byteLength > LARGEST_UPDATE) {
      member.send(tellRefused('too-large: a change may have at most 1 MB'));
      return;
    }
    requirePlain(update);
    const waiting = this.doc.store.pendingStructs !== null;
    Y.applyUpdate(this.doc, update, member);
    // An earlier change of theirs is missing: ask for it, once.
    if (!waiting && this.doc.store.pendingStructs !== null) member.send(askForMissing(this.doc));
  }

  /** Stores what has been gathered and sends it on; false when it could not be stored. */
  flush(): boolean {
    clearTimeout(this.timer);
    this.timer = undefined;
    const stored = this.pending;
    if (stored.length === 0) return true;
    this.pending = [];
    try {
      this.log.append(stored.map(({ update }) => update));
    } catch (error) {
      this.news.failed(this, error);
      return false;
    }
    for (const { update, from } of stored) this.broadcast(tellUpdate(update), from);
    this.rows += stored.length;
    if (this.rows >= COMPACT_AT) this.compact();
    clearTimeout(this.quiet);
    this.quiet = setTimeout(() => this.news.stirred(), QUIET);
    return true;
  }

  /** One row with the whole state, which also forgets what was deleted. */
  compact(): void {
    if (this.rows < 2) return;
    try {
      this.log.compact(Y.encodeStateAsUpdate(this.doc));
      this.rows = 1;
    } catch (error) {
      this.news.notCompacted(error);
    }
  }

  closeAll(code: CloseCode, reason: string): void {
    for (const member of [...this.members]) {
      this.members.delete(member);
      member.close(code, reason);
    }
  }

  /** Lets go of the document. What has not been stored is lost, so flush first. */
  destroy(): void {
    clearTimeout(this.timer);
    clearTimeout(this.quiet);
    this.members.clear();
    this.doc.destroy();
  }

  private broadcast(message: Uint8Array, except?: unknown): void {
    for (const member of this.members) if (member !== except) member.send(message);
  }
}

/** Why this member cannot change the sheet; undefined for those who can. */
function refusalOf({ role, archived }: Member): string | undefined {
  if (!can(role, 'edit-sheet')) return `not-allowed: as ${role} you see this sheet but cannot change it`;
  return archived ? 'archived: this sheet is archived and cannot be changed' : undefined;
}
