import { existsSync, statSync } from 'node:fs';
import path from 'node:path';
import mysql, { type Connection } from 'mysql2/promise';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { connectionOptions } from '@/db/connection';
import { migrateDatabase } from '@/db/migrate';
import { newId } from '@/lib/id';
import { grantRows, prepareProductDatabase } from '../../db/run/accounts.mjs';
import { startMariadb, TEST_SERVER } from '../../db/run/mariadb.mjs';

/** The two accounts of the product, as `npm start` makes them, on a database of their own. */
const DATABASE = 'stillroom_test_accounts';

let app: Connection;
let server: Awaited<ReturnType<typeof startMariadb>>;

beforeAll(async () => {
  server = await startMariadb(TEST_SERVER); // it runs already: this borrows it
  await server.sql(`drop database if exists ${DATABASE}`);
  const { appUrl, migrationUrl } = await prepareProductDatabase(server, TEST_SERVER.folder, DATABASE);
  await migrateDatabase(migrationUrl);
  await grantRows(server, DATABASE);
  app = await mysql.createConnection(connectionOptions(appUrl));
});
afterAll(async () => {
  await app?.end();
  await server.sql(`drop database if exists ${DATABASE}`);
});

const DENIED = { errno: 1142 };

it('lets the app add to the activity log, and neither change nor remove what it says', async () => {
  const teamId = newId();
  await app.query('insert into teams (id, name, currency) values (?, ?, ?)', [teamId, 'House', 'EUR']);
  await app.query('insert into activity (team_id, id, user_id, action, detail) values (?, ?, ?, ?, ?)', [
    teamId,
    newId(),
    newId(),
    'test',
    '{}',
  ]);
  await expect(app.query("update activity set action = 'other'")).rejects.toMatchObject(DENIED);
  await expect(app.query('delete from activity')).rejects.toMatchObject(DENIED);
});

it('lets the app change rows and no table', async () => {
  await app.query("update teams set name = 'New name'");
  for (const statement of ['drop table teams', 'create table more (id int primary key)', 'truncate activity']) {
    await expect(app.query(statement), statement).rejects.toMatchObject(DENIED);
  }
  await expect(app.query('alter table teams add column more int')).rejects.toMatchObject(DENIED);
});

it('shows the app no other database', async () => {
  await expect(app.query('select * from mysql.user')).rejects.toMatchObject(DENIED);
  await expect(app.query('use stillroom_test')).rejects.toMatchObject({ errno: 1044 });
});

it('keeps the passwords where only their owner reads them', () => {
  const file = path.join(TEST_SERVER.folder, 'accounts.json');
  expect(existsSync(file)).toBe(true);
  expect(statSync(file).mode & 0o077).toBe(0);
  expect(statSync(TEST_SERVER.folder).mode & 0o077).toBe(0);
});
