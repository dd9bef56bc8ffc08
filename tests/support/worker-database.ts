import { createHash } from 'node:crypto';
import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import mysql, { type Connection, type RowDataPacket } from 'mysql2/promise';

const MADE_FOR_TESTS = /^stillroom_test(_\w+)?$/;

/** Tests empty whole databases, so they refuse one whose name does not say that it is for them. */
export function refuseUnlessForTests(databaseUrl: string): string {
  const name = new URL(databaseUrl).pathname.slice(1);
  if (!MADE_FOR_TESTS.test(name)) throw new Error(`The database “${name}” was not made for tests.`);
  return name;
}

/**
 * One worker's own database: the newest tables and no row. It is made anew when the migrations have changed, which
 * its comment tells. @returns its URL.
 */
export async function prepareWorkerDatabase(testDatabaseUrl: string, worker: string): Promise<string> {
  const name = `${refuseUnlessForTests(testDatabaseUrl)}_${worker}`;
  const url = new URL(testDatabaseUrl);
  url.pathname = `/${name}`;
  // Imported late: db/connection.ts opens its pool on the database that DATABASE_URL names by then.
  process.env.DATABASE_URL = url.href;
  const { connectionOptions } = await import('@/db/connection');
  const { migrateDatabase } = await import('@/db/migrate');
  const connection = await mysql.createConnection(connectionOptions(testDatabaseUrl));
  try {
    if (await isUpToDate(connection, name)) await emptyDatabase(connection, name);
    else {
      await connection.query(`drop database if exists ${name}`);
      await connection.query(`create database ${name} character set utf8mb4 collate utf8mb4_unicode_ci`);
      await migrateDatabase(url.href);
      await connection.query(`alter database ${name} comment = ?`, [migrationsHash()]);
    }
  } finally {
    await connection.end();
  }
  return url.href;
}

async function isUpToDate(connection: Connection, name: string): Promise<boolean> {
  const [rows] = await connection.query<RowDataPacket[]>(
    'select schema_comment as hash from information_schema.schemata where schema_name = ?',
    [name],
  );
  return rows[0]?.hash === migrationsHash();
}

function migrationsHash(): string {
  const folder = path.join(process.cwd(), 'db', 'migrations');
  const hash = createHash('sha256');
  for (const file of readdirSync(folder)
    .filter((each) => each.endsWith('.sql'))
    .sort()) {
    hash.update(file).update(readFileSync(path.join(folder, file)));
  }
  return hash.digest('hex');
}

async function emptyDatabase(connection: Connection, name: string): Promise<void> {
  const [tables] = await connection.query<RowDataPacket[]>(
    "select table_name as name from information_schema.tables where table_schema = ? and table_name not like '\\_\\_%'",
    [name],
  );
  await connection.query('set session foreign_key_checks = 0'); // whatever order they come in, all rows go
  for (const table of tables) await connection.query(`delete from ${name}.\`${table.name}\``);
  await connection.query('set session foreign_key_checks = 1');
}
