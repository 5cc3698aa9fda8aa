import type { Role } from '#shared/access/roles';
import type { Person } from '#shared/api/accounts';
import type { Drawing } from '#shared/circuit/drawing';
import { readDrawing } from '#shared/doc/read-drawing';
import type { OpenLog } from './log';
import type { Member } from './member';
import { Room } from './room';
import { CLOSE, type CloseCode } from './socket-codes';

/** Whether a session may have a sheet open, and as what. An archived sheet is only looked at. */
export type Admission =
  | { readonly admitted: true; readonly role: Role; readonly archived: boolean }
  | { readonly admitted: false; readonly code: CloseCode; readonly reason: string };
export type Admit = (who: { personId: string; sessionId: string }, sheetId: string) => Admission;

interface RoomsDeps {
  readonly openLog: OpenLog;
  readonly admit: Admit;
  readonly onError: (error: unknown, about: { sheetId: string }) => void;
  /** Someone came to a sheet or left it, or its changes have fallen quiet. */
  readonly onStir: (sheetId: string) => void;
}

/** Every sheet that somebody has open. */
export class Rooms {
  private readonly rooms = new Map<string, Room>();
  private readonly openLog: OpenLog;
  private readonly admit: Admit;
  private readonly onError: RoomsDeps['onError'];
  private readonly onStir: RoomsDeps['onStir'];

  constructor(deps: RoomsDeps) {
    this.openLog = deps.openLog;
    this.admit = deps.admit;
    this.onError = deps.onError;
    this.onStir = deps.onStir;
  }

  /** The room of this sheet, loaded when nobody has it open. Throws when the log cannot be read. */
  open(sheetId: string): Room {
    const open = this.rooms.get(sheetId);
    if (open) return open;
    const room = new Room(this.openLog(sheetId), {
      stirred: () => this.onStir(sheetId),
      failed: (failed, error) => this.fail(sheetId, failed, error),
      notCompacted: (error) => this.onError(error, { sheetId }),
    });
    this.rooms.set(sheetId, room);
    return room;
  }

  leave(sheetId: string, room: Room, member: Member): void {
    room.leave(member);
    if (room.members.size === 0 && this.rooms.get(sheetId) === room) this.release(sheetId, room);
  }

  /** The sheet as it is now, stored to the last change. */
  drawing(sheetId: string): Drawing {
    const room = this.open(sheetId);
    if (!room.flush()) throw new Error(`The last changes of sheet ${sheetId} could not be stored.`);
    const { drawing } = readDrawing(room.doc);
    if (room.members.size === 0) this.release(sheetId, room);
    return drawing;
  }

  /** Who has the sheet open, each person once however many windows they have. */
  peopleIn(sheetId: string): Person[] {
    const members = this.rooms.get(sheetId)?.members ?? [];
    return [...new Map([...members].map(({ person }) => [person.id, person])).values()];
  }

  /** To be called when a person's session, membership or role has changed: cuts or changes what they have open. */
  recheck(personId: string): void {
    for (const [sheetId, room] of [...this.rooms]) {
      for (const member of [...room.members]) {
        if (member.person.id === personId) this.recheckMember(sheetId, room, member);
      }
    }
  }

  /** To be called when a sheet was archived or brought back. */
  recheckSheet(sheetId: string): void {
    const room = this.rooms.get(sheetId);
    if (room) for (const member of [...room.members]) this.recheckMember(sheetId, room, member);
  }

  recheckMember(sheetId: string, room: Room, member: Member): void {
    const admission = this.admit({ personId: member.person.id, sessionId: member.sessionId }, sheetId);
    if (!admission.admitted) {
      this.leave(sheetId, room, member);
      member.close(admission.code, admission.reason);
      return;
    }
    member.archived = admission.archived;
    if (admission.role !== member.role) {
      member.role = admission.role;
      room.restamp(member);
    }
  }

  /** Closes a sheet that is about to be deleted. */
  dissolve(sheetId: string): void {
    const room = this.rooms.get(sheetId);
    if (!room) return;
    this.rooms.delete(sheetId);
    room.closeAll(CLOSE.noSuchSheet, 'this sheet was deleted');
    room.destroy();
  }

  /** Stores everything and sends everybody away; they come back when the server does. */
  shutDown(): void {
    for (const [sheetId, room] of [...this.rooms]) {
      room.flush();
      room.closeAll(CLOSE.goingAway, 'the server stops');
      if (this.rooms.get(sheetId) === room) this.release(sheetId, room);
    }
  }

  private release(sheetId: string, room: Room): void {
    if (!room.flush()) return;
    this.rooms.delete(sheetId);
    room.compact();
    room.destroy();
  }

  /**
   * A change could not be stored. It is in the document in memory, so that document is let go: the next to come loads
   * what is stored, and whoever made the change still has it and sends it again.
   */
  private fail(sheetId: string, room: Room, error: unknown): void {
    this.onError(error, { sheetId });
    if (this.rooms.get(sheetId) === room) this.rooms.delete(sheetId);
    room.closeAll(CLOSE.tryLater, 'the last changes could not be stored');
    room.destroy();
  }
}
