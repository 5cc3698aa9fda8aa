import { sql } from 'drizzle-orm';
import { blob, check, index, integer, primaryKey, sqliteTable, text } from 'drizzle-orm/sqlite-core';
import { ROLES, type Role } from '#shared/access/roles';
import { SHEET_STATES } from '#shared/api/sheets';

// Times are integers, in milliseconds since 1970, but for sessions.expires_at, which lucia keeps in seconds.

const ROLE_LIST = sql.raw(ROLES.map((role) => `'${role}'`).join(', '));
const STATE_LIST = sql.raw(SHEET_STATES.map((state) => `'${state}'`).join(', '));

export const people = sqliteTable('people', {
  id: text('id').primaryKey(),
  name: text('name').notNull(),
  /** Lower-cased, so that unique means unique whatever the case. */
  email: text('email').notNull().unique(),
  passwordHash: text('password_hash').notNull(),
  createdAt: integer('created_at').notNull(),
});

/** `id` is the SHA-256 of the token in the cookie: who reads this table cannot sign in with it. */
export const sessions = sqliteTable(
  'sessions',
  {
    id: text('id').primaryKey(),
    userId: text('person_id')
      .notNull()
      .references(() => people.id, { onDelete: 'cascade' }),
    expiresAt: integer('expires_at').notNull(),
    createdAt: integer('created_at').notNull(),
    seenAt: integer('seen_at').notNull(),
  },
  (table) => [index('sessions_by_person').on(table.userId)],
);

export const teams = sqliteTable('teams', {
  id: text('id').primaryKey(),
  name: text('name').notNull(),
  createdAt: integer('created_at').notNull(),
});

export const memberships = sqliteTable(
  'memberships',
  {
    teamId: text('team_id')
      .notNull()
      .references(() => teams.id, { onDelete: 'cascade' }),
    personId: text('person_id')
      .notNull()
      .references(() => people.id, { onDelete: 'cascade' }),
    role: text('role').$type<Role>().notNull(),
    joinedAt: integer('joined_at').notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.teamId, table.personId] }),
    index('memberships_by_person').on(table.personId),
    check('memberships_role', sql`${table.role} in (${ROLE_LIST})`),
  ],
);

/** Good until `expires_at`, once. Only the SHA-256 of the link's token is kept. */
export const invitations = sqliteTable(
  'invitations',
  {
    id: text('id').primaryKey(),
    teamId: text('team_id')
      .notNull()
      .references(() => teams.id, { onDelete: 'cascade' }),
    tokenHash: text('token_hash').notNull().unique(),
    email: text('email'),
    role: text('role').$type<Role>().notNull(),
    invitedBy: text('invited_by')
      .notNull()
      .references(() => people.id),
    createdAt: integer('created_at').notNull(),
    expiresAt: integer('expires_at').notNull(),
    takenAt: integer('taken_at'),
    takenBy: text('taken_by').references(() => people.id),
  },
  (table) => [
    index('invitations_by_team').on(table.teamId),
    check('invitations_role', sql`${table.role} in (${ROLE_LIST})`),
  ],
);

export const sheets = sqliteTable(
  'sheets',
  {
    id: text('id').primaryKey(),
    teamId: text('team_id')
      .notNull()
      .references(() => teams.id, { onDelete: 'cascade' }),
    name: text('name').notNull(),
    state: text('state', { enum: SHEET_STATES }).notNull().default('draft'),
    archived: integer('archived', { mode: 'boolean' }).notNull().default(false),
    createdBy: text('created_by')
      .notNull()
      .references(() => people.id),
    createdAt: integer('created_at').notNull(),
    changedAt: integer('changed_at').notNull(),
  },
  (table) => [index('sheets_by_team').on(table.teamId), check('sheets_state', sql`${table.state} in (${STATE_LIST})`)],
);

/** The live document: Yjs updates in the order they were stored; compaction puts one row in the place of many. */
export const sheetUpdates = sqliteTable(
  'sheet_updates',
  {
    seq: integer('seq').primaryKey({ autoIncrement: true }),
    sheetId: text('sheet_id')
      .notNull()
      .references(() => sheets.id, { onDelete: 'cascade' }),
    content: blob('content', { mode: 'buffer' }).notNull(),
  },
  (table) => [index('sheet_updates_by_sheet').on(table.sheetId)],
);

/** In the database and not in memory, so that a restart gives nobody a fresh set of guesses. */
export const signInAttempts = sqliteTable(
  'sign_in_attempts',
  {
    id: integer('id').primaryKey({ autoIncrement: true }),
    /** SHA-256 of the e-mail address tried, which need not be one that exists. */
    account: text('account').notNull(),
    /** The network address it came from. */
    address: text('address').notNull(),
    succeeded: integer('succeeded', { mode: 'boolean' }).notNull(),
    at: integer('at').notNull(),
  },
  (table) => [
    index('sign_in_attempts_by_account').on(table.account, table.at),
    index('sign_in_attempts_by_address').on(table.address, table.at),
  ],
);
