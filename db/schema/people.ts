import { sql } from 'drizzle-orm';
import {
  boolean,
  char,
  check,
  foreignKey,
  index,
  int,
  mysqlTable,
  primaryKey,
  unique,
  varchar,
} from 'drizzle-orm/mysql-core';
import { codeColumn, createdAt, exactText, idColumn, instant, sha256Column } from '../columns';

/** A house: the tenant that owns every row beside it. */
export const teams = mysqlTable('teams', {
  id: idColumn().primaryKey(),
  name: varchar({ length: 120 }).notNull(),
  /** ISO 4217: the one currency that the house calculates in. */
  currency: char({ length: 3 }).notNull(),
  isDemo: boolean().notNull().default(false),
  createdAt: createdAt(),
});

export const users = mysqlTable(
  'users',
  {
    id: idColumn().primaryKey(),
    email: exactText({ length: 254 }).notNull(),
    name: varchar({ length: 120 }).notNull(),
    passwordHash: varchar({ length: 200 }).notNull(),
    createdAt: createdAt(),
  },
  (t) => [unique('users_email').on(t.email)],
);

/** The id is the SHA-256 of the token in the cookie: nothing stored here signs anyone in. */
export const sessions = mysqlTable(
  'sessions',
  {
    id: sha256Column().primaryKey(),
    userId: idColumn()
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    /** Idle end: moved on while the session is used. */
    expiresAt: instant().notNull(),
    /** Absolute end: never moved. */
    endsAt: instant().notNull(),
    /** The house the person works in now. */
    teamId: idColumn().notNull(),
    createdAt: createdAt(),
  },
  (t) => [index('sessions_user').on(t.userId), index('sessions_expiry').on(t.expiresAt)],
);

export const memberships = mysqlTable(
  'memberships',
  {
    teamId: idColumn()
      .notNull()
      .references(() => teams.id, { onDelete: 'cascade' }),
    userId: idColumn()
      .notNull()
      .references(() => users.id, { onDelete: 'cascade' }),
    createdAt: createdAt(),
  },
  (t) => [primaryKey({ columns: [t.teamId, t.userId] }), index('memberships_user').on(t.userId)],
);

/** A member holds one or several roles; what they may do is the union. */
export const membershipRoles = mysqlTable(
  'membership_roles',
  {
    teamId: idColumn().notNull(),
    userId: idColumn().notNull(),
    role: codeColumn({ length: 16 }).notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.teamId, t.userId, t.role] }),
    foreignKey({
      name: 'membership_roles_member',
      columns: [t.teamId, t.userId],
      foreignColumns: [memberships.teamId, memberships.userId],
    }).onDelete('cascade'),
    check('membership_roles_role', sql`${t.role} in ('owner','perfumer','evaluator','buyer','safety','student')`),
  ],
);

/** Counts guesses by key (a hash of what is limited) and window, shared by all instances. */
export const attempts = mysqlTable(
  'attempts',
  {
    key: sha256Column().notNull(),
    windowStart: instant().notNull(),
    count: int().notNull(),
  },
  (t) => [primaryKey({ columns: [t.key, t.windowStart] }), index('attempts_window').on(t.windowStart)],
);
