import { sql } from 'drizzle-orm';
import { customType, datetime, decimal, int } from 'drizzle-orm/mysql-core';

/**
 * The columns that recur. Decimals cross into TypeScript as strings, never as binary floating point.
 *
 * Ids and codes compare byte by byte (`ascii_bin`), e-mail addresses too (`utf8mb4_bin`): with the server's usual
 * collation `AbC` would equal `abc`.
 */

/** A time-ordered id made by the application (26 characters; see lib/id.ts). */
export const idColumn = customType<{ data: string }>({
  dataType: () => 'char(26) character set ascii collate ascii_bin',
  toDriver: asciiOrNobody,
});

/** A short machine word, such as a role or a unit. */
export const codeColumn = customType<{ data: string; config: { length: number } }>({
  dataType: (config) => `varchar(${config?.length ?? 32}) character set ascii collate ascii_bin`,
  toDriver: asciiOrNobody,
});

/** Text that compares exactly, letter case and accents included. */
export const exactText = customType<{ data: string; config: { length: number } }>({
  dataType: (config) => `varchar(${config?.length ?? 254}) character set utf8mb4 collate utf8mb4_bin`,
});

/** A SHA-256, hexadecimal in TypeScript, 32 bytes in the database. */
export const sha256Column = customType<{ data: string; driverData: Buffer }>({
  dataType: () => 'binary(32)',
  toDriver: (hex) => Buffer.from(hex, 'hex'),
  fromDriver: (bytes) => bytes.toString('hex'),
});

/** JSON that stays `unknown` until a schema has parsed it. */
export const jsonColumn = customType<{ data: unknown; driverData: string }>({
  dataType: () => 'longtext character set utf8mb4 collate utf8mb4_bin',
  toDriver: (value) => JSON.stringify(value),
  fromDriver: (text) => JSON.parse(text) as unknown,
});

export const money = () => decimal({ precision: 14, scale: 4 });
/** A mass fraction 0..1. */
export const massFraction = () => decimal({ precision: 10, scale: 8 });
/** The share of a line in a solved blend, where traces matter. */
export const blendShare = () => decimal({ precision: 16, scale: 14 });
/** A mass in grams, or a volume in millilitres. */
export const amount = () => decimal({ precision: 14, scale: 6 });
/** An instant in UTC with milliseconds. */
export const instant = () => datetime({ mode: 'date', fsp: 3 });
export const createdAt = () => instant().notNull().default(sql`(utc_timestamp(3))`);
/** Counts the writes to a row; a write names the revision it read. */
export const revision = () => int().notNull().default(1);

/** A stranger may ask for the id “é”: MariaDB would fail to compare it with a column of ASCII. No row is called “?”. */
function asciiOrNobody(text: string): string {
  return /^[\x20-\x7e]*$/.test(text) ? text : '?';
}
