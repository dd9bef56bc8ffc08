import { existsSync } from 'node:fs';
import fc from 'fast-check';
import { expect, it } from 'vitest';
import { LEAKED_PASSWORDS, longLeakedPasswords } from '@/lib/auth/build-common-passwords';
import { isCommonPassword } from '@/lib/auth/common-passwords';
import { hashPassword, MIN_PASSWORD, passwordFault, verifyPassword } from '@/lib/auth/password';

it('refuses every leaked password that is long enough', () => {
  expect(existsSync(LEAKED_PASSWORDS)).toBe(true);
  const leaked = longLeakedPasswords();
  // 9,747 entries of the list have at least 15 characters (counted in the list itself).
  expect(leaked).toHaveLength(9747);
  expect(leaked.filter((password) => passwordFault(password, []) === null)).toEqual([]);
});

it('takes any characters from 15 on, as typed', () => {
  const phrase = fc.string({ unit: 'grapheme', minLength: 0, maxLength: 140 });
  fc.assert(
    fc.property(phrase, (password) => {
      const length = [...password].length;
      const fault = passwordFault(password, []);
      if (length < MIN_PASSWORD) expect(fault).toContain('at least 15');
      else if (length > 128) expect(fault).toContain('at most 128');
      else if (!isCommonPassword(password) && !password.toLowerCase().includes('stillroom')) expect(fault).toBeNull();
    }),
    { seed: 20_261_201 },
  );
});

it('refuses little more than the names anyone would guess', () => {
  expect(passwordFault('StillroomHouseOfMoss1', ['House of Moss', 'mara'])).toBeNull();
  expect(passwordFault('Stillroom-Stillroom-1', [])).toContain('little more');
  expect(passwordFault('thornfield-mara-mara-12', ['Thornfield', 'mara'])).toContain('little more');
});

it('stores Argon2id with 19 MiB, two passes and one lane, and knows the password again', async () => {
  const encoded = await hashPassword('four plain words here');
  expect(encoded).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
  expect(await verifyPassword(encoded, 'four plain words here')).toBe(true);
  expect(await verifyPassword(encoded, 'four plain words here ')).toBe(false);
  expect(await verifyPassword(null, 'not anyone’s password')).toBe(false);
});
