import { eq } from 'drizzle-orm';
import type { Db } from '../connect';
import { people } from '../schema';

export type PersonRow = typeof people.$inferSelect;

export function findPersonByEmail(db: Db, email: string): PersonRow | undefined {
  return db.select().from(people).where(eq(people.email, email)).get();
}

export function anyPerson(db: Db): boolean {
  return db.select({ id: people.id }).from(people).limit(1).get() !== undefined;
}

export function insertPerson(db: Db, person: PersonRow): void {
  db.insert(people).values(person).run();
}

export function setPasswordHash(db: Db, personId: string, passwordHash: string): void {
  db.update(people).set({ passwordHash }).where(eq(people.id, personId)).run();
}
