import { sql } from 'drizzle-orm';
import { expect, it } from 'vitest';
import { checkServer, serverFaults } from '@/db/settings';
import { db } from '../support/database';

const variables = async () => {
  const [rows] = (await db.execute(sql`show global variables`)) as unknown as [
    { Variable_name: string; Value: string }[],
  ];
  return new Map(rows.map((row) => [row.Variable_name, row.Value]));
};

it('accepts the server that we start ourselves', async () => {
  await checkServer();
});

it.each([
  ['innodb_flush_log_at_trx_commit', '2'],
  ['innodb_doublewrite', 'OFF'],
  ['sql_mode', 'NO_ENGINE_SUBSTITUTION'],
  ['character_set_server', 'latin1'],
  ['innodb_snapshot_isolation', 'OFF'],
  ['innodb_rollback_on_timeout', 'OFF'],
  ['innodb_force_primary_key', 'OFF'],
  ['idle_transaction_timeout', '0'],
  ['max_statement_time', '0.000000'],
])('refuses a server whose %s is %s, and names it', async (name, value) => {
  const wrong = (await variables()).set(name, value);
  expect(serverFaults(wrong)).toEqual([expect.stringContaining(`${name} is ${value}, must be`)]);
});

it('wants each commit in the binary log only while there is one', async () => {
  const without = (await variables()).set('sync_binlog', '0').set('log_bin', 'OFF');
  expect(serverFaults(without)).toEqual([]);
  expect(serverFaults(without.set('log_bin', 'ON'))).toEqual([expect.stringContaining('sync_binlog is 0')]);
});

it('refuses a server that does not know a setting', async () => {
  const old = await variables();
  old.delete('innodb_snapshot_isolation');
  expect(serverFaults(old)).toEqual([expect.stringContaining('innodb_snapshot_isolation is not known there')]);
});
