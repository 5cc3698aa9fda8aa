import { and, desc, eq, gt, isNull } from 'drizzle-orm';
import type { Db } from '../connect';
import { invitations, people, teams } from '../schema';

const invitationRow = {
  id: invitations.id,
  teamId: invitations.teamId,
  team: teams.name,
  email: invitations.email,
  role: invitations.role,
  invitedBy: people.name,
  createdAt: invitations.createdAt,
  expiresAt: invitations.expiresAt,
};
export type InvitationRow = ReturnType<typeof openInvitationsOf>[number];

function openInvitations(db: Db) {
  return db
    .select(invitationRow)
    .from(invitations)
    .innerJoin(people, eq(people.id, invitations.invitedBy))
    .innerJoin(teams, eq(teams.id, invitations.teamId));
}

export function insertInvitation(db: Db, invitation: typeof invitations.$inferInsert): void {
  db.insert(invitations).values(invitation).run();
}

/** Those nobody has taken and whose time is not over, newest first. */
export function openInvitationsOf(db: Db, teamId: string, now: number) {
  return openInvitations(db)
    .where(and(eq(invitations.teamId, teamId), isNull(invitations.takenAt), gt(invitations.expiresAt, now)))
    .orderBy(desc(invitations.createdAt), desc(invitations.id))
    .all();
}

export function findOpenInvitation(db: Db, tokenHash: string, now: number): InvitationRow | undefined {
  return openInvitations(db)
    .where(and(eq(invitations.tokenHash, tokenHash), isNull(invitations.takenAt), gt(invitations.expiresAt, now)))
    .get();
}

export function findInvitation(db: Db, id: string): { id: string; teamId: string } | undefined {
  return db
    .select({ id: invitations.id, teamId: invitations.teamId })
    .from(invitations)
    .where(and(eq(invitations.id, id), isNull(invitations.takenAt)))
    .get();
}

export function markTaken(db: Db, id: string, takenBy: string, takenAt: number): void {
  db.update(invitations).set({ takenAt, takenBy }).where(eq(invitations.id, id)).run();
}

export function deleteInvitation(db: Db, id: string): void {
  db.delete(invitations).where(eq(invitations.id, id)).run();
}
