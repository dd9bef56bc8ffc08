import path from 'node:path';
import { drizzle } from 'drizzle-orm/mysql2';
import { migrate } from 'drizzle-orm/mysql2/migrator';
import mysql, { type RowDataPacket } from 'mysql2/promise';
import { connectionOptions } from './connection';

const LOCK = 'stillroom.migrate';
const WAIT_S = 120;

/**
 * Brings a database to the newest tables. Several instances may start at once: one migrates, the others wait for it
 * and then find nothing left to do.
 */
export async function migrateDatabase(databaseUrl: string): Promise<void> {
  const connection = await mysql.createConnection(connectionOptions(databaseUrl));
  try {
    await connection.query('set session max_statement_time = 0'); // a large table takes its time
    const [rows] = await connection.query<RowDataPacket[]>('select get_lock(?, ?) as taken', [LOCK, WAIT_S]);
    if (rows[0]?.taken !== 1) throw new Error(`Another migration has held the lock for ${WAIT_S} s.`);
    await migrate(drizzle(connection), { migrationsFolder: path.join(process.cwd(), 'db', 'migrations') });
  } finally {
    await connection.end(); // gives the lock back too
  }
}

if (process.argv[1] === import.meta.filename) {
  const databaseUrl = process.env.MIGRATION_DATABASE_URL ?? process.env.DATABASE_URL;
  if (!databaseUrl) throw new Error('Set MIGRATION_DATABASE_URL or DATABASE_URL to the database to migrate.');
  await migrateDatabase(databaseUrl);
}
