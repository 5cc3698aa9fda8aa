import { hashPassword, verifyPassword } from '../auth/passwords';
import { newId } from '../auth/tokens';
import type { Config } from '../config';
import type { Db } from '../db/connect';
import { anyPerson, findPersonByEmail, insertPerson, setPasswordHash } from '../db/queries/people';
import { insertMembership, insertTeam } from '../db/queries/teams';
import { storeNewSheet } from '../services/store-new-sheet';
import { demoPassword } from './password';
import { DEMO_PEOPLE, DEMO_TEAM } from './people';
import { demoSheets } from './sheets';

const DAY = 86_400_000;

export interface Demo {
  readonly password: string;
  readonly people: readonly { email: string; role: string }[];
}

/**
 * In demo mode puts the demo team into an empty database, and sees to it that its people have the password that will
 * be printed. A real team is never served from a database with the demo's people in it.
 */
export async function prepareDemo(db: Db, config: Config, now: () => number): Promise<Demo | undefined> {
  const [owner] = DEMO_PEOPLE;
  const seeded = owner !== undefined && findPersonByEmail(db, owner.email) !== undefined;
  if (config.mode === 'serve') {
    if (!seeded) return undefined;
    throw new Error(
      `${config.databaseFile} holds the demo, whose sign-ins others know. Set DATABASE_FILE to another file to serve a team.`,
    );
  }
  if (!seeded && anyPerson(db)) return undefined;
  const password = demoPassword(config.databaseFile, config.demoPassword);
  if (seeded) await renewPasswords(db, password);
  else seed(db, await hashPassword(password), now());
  return { password, people: DEMO_PEOPLE };
}

async function renewPasswords(db: Db, password: string): Promise<void> {
  for (const { email } of DEMO_PEOPLE) {
    const person = findPersonByEmail(db, email);
    if (person && !(await verifyPassword(person.passwordHash, password))) {
      setPasswordHash(db, person.id, await hashPassword(password));
    }
  }
}

function seed(db: Db, passwordHash: string, now: number): void {
  db.transaction((tx) => {
    const teamId = newId();
    insertTeam(tx, { id: teamId, name: DEMO_TEAM, createdAt: now });
    const idOf = new Map<string, string>();
    for (const { name, email, role } of DEMO_PEOPLE) {
      const id = newId();
      insertPerson(tx, { id, name, email, passwordHash, createdAt: now });
      insertMembership(tx, { teamId, personId: id, role, joinedAt: now });
      idOf.set(email, id);
    }
    for (const { name, begunBy, daysAgo, drawing } of demoSheets()) {
      const createdBy = idOf.get(begunBy);
      if (createdBy === undefined) throw new Error(`${begunBy} is not one of the demo's people.`);
      const at = now - daysAgo * DAY;
      storeNewSheet(tx, { id: newId(), teamId, name, createdBy, createdAt: at, changedAt: at }, drawing);
    }
  });
}
