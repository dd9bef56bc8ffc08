import { drizzle } from 'drizzle-orm/mysql2';
import mysql, { type Pool, type PoolOptions } from 'mysql2/promise';
import { hideValuesOfFailedQueries } from './told-error';

const POOL_SIZE = 12;

/**
 * How every connection of ours behaves. Decimals stay text, times are UTC, one statement at a time, and the driver
 * generates no code from the names of fields that a server sends.
 */
export function connectionOptions(databaseUrl: string): PoolOptions {
  const { hostname, port, username, password, pathname } = new URL(databaseUrl);
  return {
    host: hostname,
    port: Number(port || 3306),
    user: decodeURIComponent(username),
    password: decodeURIComponent(password),
    database: decodeURIComponent(pathname.slice(1)),
    timezone: 'Z',
    charset: 'utf8mb4_unicode_ci',
    decimalNumbers: false,
    supportBigNumbers: true,
    disableEval: true,
    multipleStatements: false,
    connectTimeout: 10_000,
  };
}

/**
 * While the pages are being built there is no database and none is asked; the invented host says so if one is.
 * A started app without DATABASE_URL is refused by `checkServer`.
 */
const NO_DATABASE = 'mysql://nobody@database-url-is-not-set.invalid/none';

function openPool(): Pool {
  const pool = mysql.createPool({
    ...connectionOptions(process.env.DATABASE_URL || NO_DATABASE),
    connectionLimit: POOL_SIZE,
    maxIdle: POOL_SIZE,
    idleTimeout: 60_000,
    enableKeepAlive: true,
  });
  // The statement goes into the new connection's queue before anybody else's. A connection that refuses it is unsafe.
  pool.pool.on('connection', (connection) => {
    connection.query("set session innodb_snapshot_isolation = on, time_zone = '+00:00'", (error) => {
      if (error) connection.destroy();
    });
  });
  return pool;
}

/** Kept across the reloads of development, or each one would leave a pool behind. */
const kept = globalThis as typeof globalThis & { stillroomPool?: Pool };
kept.stillroomPool ??= openPool();

hideValuesOfFailedQueries();

export const pool = kept.stillroomPool;
export const db = drizzle(pool, { casing: 'snake_case' });

/** For scripts and tests, which should end; the app's pool lives as long as the app. */
export async function closePool() {
  kept.stillroomPool = undefined;
  await pool.end();
}
