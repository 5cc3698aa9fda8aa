import { and, asc, count, eq } from 'drizzle-orm';
import type { Role } from '#shared/access/roles';
import type { OwnTeam } from '#shared/api/accounts';
import type { Db } from '../connect';
import { memberships, people, teams } from '../schema';

export function insertTeam(db: Db, team: typeof teams.$inferInsert): void {
  db.insert(teams).values(team).run();
}

export function insertMembership(db: Db, membership: typeof memberships.$inferInsert): void {
  db.insert(memberships).values(membership).run();
}

const ownTeam = { id: teams.id, name: teams.name, role: memberships.role };

/** The person's teams with their role in each, by name. */
export function teamsOf(db: Db, personId: string): OwnTeam[] {
  return db
    .select(ownTeam)
    .from(memberships)
    .innerJoin(teams, eq(teams.id, memberships.teamId))
    .where(eq(memberships.personId, personId))
    .orderBy(asc(teams.name), asc(teams.id))
    .all();
}

/** The team with this person's role in it; undefined when there is none or they are not in it. */
export function findOwnTeam(db: Db, teamId: string, personId: string): OwnTeam | undefined {
  return db
    .select(ownTeam)
    .from(memberships)
    .innerJoin(teams, eq(teams.id, memberships.teamId))
    .where(and(eq(memberships.teamId, teamId), eq(memberships.personId, personId)))
    .get();
}

const memberRow = {
  id: people.id,
  name: people.name,
  email: people.email,
  role: memberships.role,
  joinedAt: memberships.joinedAt,
};
export type MemberRow = { id: string; name: string; email: string; role: Role; joinedAt: number };

export function membersOf(db: Db, teamId: string): MemberRow[] {
  return db
    .select(memberRow)
    .from(memberships)
    .innerJoin(people, eq(people.id, memberships.personId))
    .where(eq(memberships.teamId, teamId))
    .orderBy(asc(people.name), asc(people.id))
    .all();
}

export function findMember(db: Db, teamId: string, personId: string): MemberRow | undefined {
  return db
    .select(memberRow)
    .from(memberships)
    .innerJoin(people, eq(people.id, memberships.personId))
    .where(and(eq(memberships.teamId, teamId), eq(memberships.personId, personId)))
    .get();
}

export function countOwners(db: Db, teamId: string): number {
  const row = db
    .select({ n: count() })
    .from(memberships)
    .where(and(eq(memberships.teamId, teamId), eq(memberships.role, 'owner')))
    .get();
  return row?.n ?? 0;
}

export function setRole(db: Db, teamId: string, personId: string, role: Role): void {
  db.update(memberships)
    .set({ role })
    .where(and(eq(memberships.teamId, teamId), eq(memberships.personId, personId)))
    .run();
}

export function deleteMembership(db: Db, teamId: string, personId: string): void {
  db.delete(memberships)
    .where(and(eq(memberships.teamId, teamId), eq(memberships.personId, personId)))
    .run();
}
