/**
 * How our own server is run: what has been acknowledged survives a crash, what is not exactly right is refused, and
 * nothing waits for ever. `db/settings.ts` refuses to work on a server that lacks these.
 */
export const SERVER_SETTINGS = {
  // Nothing acknowledged is lost, nothing is half written.
  'innodb-flush-log-at-trx-commit': '1',
  'innodb-doublewrite': 'ON',
  'sync-binlog': '1',
  // Two people who read the same row and then write it: the second is told (error 1020), not silently obeyed.
  'innodb-snapshot-isolation': 'ON',
  // Without it a lock that ran out of time undoes one statement and keeps the rest of the transaction.
  'innodb-rollback-on-timeout': 'ON',
  'innodb-force-primary-key': 'ON',
  'innodb-strict-mode': 'ON',
  'sql-mode': 'STRICT_ALL_TABLES,ERROR_FOR_DIVISION_BY_ZERO,NO_ENGINE_SUBSTITUTION',
  'character-set-server': 'utf8mb4',
  'collation-server': 'utf8mb4_unicode_ci',
  'default-time-zone': '+00:00',
  // Seconds. A statement, a wait for a lock and an idle transaction each have an end.
  'max-statement-time': '30',
  'innodb-lock-wait-timeout': '10',
  'idle-transaction-timeout': '60',
  'max-connections': '120',
  'max-allowed-packet': '64M',
  // Only this machine reaches it.
  'bind-address': '127.0.0.1',
  'skip-name-resolve': 'ON',
  'local-infile': 'OFF',
};
