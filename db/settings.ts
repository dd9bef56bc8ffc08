import { sql } from 'drizzle-orm';
import { db } from './connection';

type Variables = Map<string, string>;
type Variable = { Variable_name: string; Value: string };

/** What a server must be set to, and what would happen otherwise: the sentence that a person reads. */
const REQUIRED: { name: string; wanted: string; holds: (value: string, all: Variables) => boolean; why: string }[] = [
  { name: 'innodb_flush_log_at_trx_commit', wanted: '1', holds: is('1'), why: 'a crash could lose what was saved' },
  { name: 'innodb_doublewrite', wanted: 'ON', holds: isOn, why: 'a crash could leave pages half written' },
  {
    name: 'sync_binlog',
    wanted: '1 while log_bin is ON',
    holds: (value, all) => value === '1' || !isOn(all.get('log_bin') ?? 'OFF'),
    why: 'a crash could lose what was saved',
  },
  {
    name: 'sql_mode',
    wanted: 'a value with STRICT_ALL_TABLES or STRICT_TRANS_TABLES',
    holds: (value) => /\bSTRICT_(ALL|TRANS)_TABLES\b/.test(value),
    why: 'values that do not fit would be cut silently',
  },
  { name: 'character_set_server', wanted: 'utf8mb4', holds: is('utf8mb4'), why: 'some names could not be stored' },
  {
    name: 'innodb_snapshot_isolation',
    wanted: 'ON',
    holds: isOn,
    why: 'of two people who change one row, one would be overwritten unseen',
  },
  {
    name: 'innodb_rollback_on_timeout',
    wanted: 'ON',
    holds: isOn,
    why: 'after a lock that took too long, half a change would be kept',
  },
  { name: 'innodb_force_primary_key', wanted: 'ON', holds: isOn, why: 'a cluster cannot replicate rows without a key' },
  {
    name: 'idle_transaction_timeout',
    wanted: 'above 0 s',
    holds: isLimit,
    why: 'a lost client could hold rows for ever',
  },
  {
    name: 'max_statement_time',
    wanted: 'above 0 s',
    holds: isLimit,
    why: 'one statement could hold the server for ever',
  },
];

/** The app does not work on a server that could lose or mix up what people entered. */
export class UnsafeServer extends Error {
  override name = 'UnsafeServer';
}

/** @throws UnsafeServer, naming each setting that is wrong, its value, the wanted one and the reason. */
export async function checkServer(): Promise<void> {
  if (!process.env.DATABASE_URL) {
    throw new UnsafeServer('DATABASE_URL is not set: it names the MariaDB server to work on (npm start sets it).');
  }
  const faults = serverFaults(await readVariables());
  if (faults.length > 0) throw new UnsafeServer(`This database server is not safe to work on:\n${faults.join('\n')}`);
}

/** A server that does not know a setting cannot have it: an old one, or another make. */
export function serverFaults(variables: Variables): string[] {
  return REQUIRED.filter(({ name, holds }) => !holds(variables.get(name) ?? '', variables)).map(
    ({ name, wanted, why }) => `- ${name} is ${variables.get(name) || 'not known there'}, must be ${wanted}: ${why}.`,
  );
}

async function readVariables(): Promise<Variables> {
  try {
    const [rows] = (await db.execute(sql`show global variables`)) as unknown as [Variable[]];
    return new Map(rows.map((row) => [row.Variable_name, row.Value]));
  } catch (error) {
    const reason = error instanceof Error && error.cause instanceof Error ? error.cause.message : String(error);
    throw new UnsafeServer(`The database server that DATABASE_URL names cannot be used: ${reason}`, { cause: error });
  }
}

function is(wanted: string) {
  return (value: string) => value === wanted;
}

function isOn(value: string) {
  return value === 'ON' || value === '1';
}

function isLimit(value: string) {
  return Number(value) > 0;
}
