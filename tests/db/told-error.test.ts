import { inspect } from 'node:util';
import { eq } from 'drizzle-orm';
import pino from 'pino';
import { beforeAll, expect, it, vi } from 'vitest';
import { suppliers, users } from '@/db/schema';
import { toldError } from '@/db/told-error';
import { newId } from '@/lib/id';
import { log } from '@/lib/log';
import { db, makeTeam } from '../support/database';

const SECRET = 'heronmere-7316';

async function failureOf(work: Promise<unknown>): Promise<unknown> {
  return work.then(
    () => expect.unreachable('It should have failed.'),
    (error: unknown) => error,
  );
}

let failed: unknown[];

beforeAll(async () => {
  const person = { email: `${SECRET}@house.example`, name: SECRET, passwordHash: SECRET };
  await db.insert(users).values({ ...person, id: newId() });
  const team = await makeTeam();
  failed = [
    await failureOf(db.insert(users).values({ ...person, id: newId() })),
    await failureOf(db.insert(suppliers).values({ teamId: SECRET.padEnd(26, 'x'), id: newId(), name: SECRET })),
    await failureOf(db.insert(suppliers).values({ teamId: team.id, id: newId(), name: SECRET.repeat(60) })),
    await failureOf(
      db.transaction(async (tx) => {
        await tx
          .update(users)
          .set({ id: SECRET.repeat(9) })
          .where(eq(users.name, SECRET));
      }),
    ),
  ];
});

it('tells a log which statement failed and where, without a value of it', () => {
  for (const error of failed) {
    expect(String(error)).toContain(SECRET); // or this test could not fail
    const told = toldError(error);
    expect(told.message).toMatch(/^Failed query: (insert|update)/);
    expect(told.cause?.errno).toBeGreaterThan(1000);
    expect(told.stack.length).toBeGreaterThan(0);
    expect(JSON.stringify(told)).not.toContain(SECRET);
  }
});

it('prints no value either where Next prints the error by itself', () => {
  for (const error of failed) {
    expect(inspect(error)).toContain('Failed query');
    for (const printed of [inspect(error), inspect({ error }), inspect(new Error('A page failed.', { cause: error }))])
      expect(printed).not.toContain(SECRET);
  }
});

it('keeps the words of every other error, and takes what is no error', () => {
  expect(toldError(new RangeError('Too long.', { cause: new Error('why') }))).toMatchObject({
    ...{ type: 'RangeError', message: 'Too long.' },
    cause: { message: 'why' },
  });
  expect(toldError(SECRET)).toEqual({ type: 'string', message: 'Not an error was thrown.', stack: [] });
});

it('writes no value into the log either, in whatever field', async () => {
  const lines: string[] = [];
  const stream = (log as unknown as Record<symbol, { write: (line: string) => void }>)[pino.symbols.streamSym];
  vi.spyOn(stream as { write: (line: string) => void }, 'write').mockImplementation((line) => void lines.push(line));
  for (const error of failed) log.error({ event: 'unexpected_error', err: error });
  expect(lines).toHaveLength(failed.length);
  for (const line of lines) {
    expect(JSON.parse(line).err.message).toContain('Failed query');
    expect(line).not.toContain(SECRET);
  }
});
