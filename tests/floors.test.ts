import { expect, it } from 'vitest';
import lock from '../package-lock.json';
import { banned, floors } from './floors.json';

const installed = Object.entries(lock.packages as Record<string, { version?: string }>)
  .filter(([place]) => place.startsWith('node_modules/'))
  .map(([place, { version = '0' }]) => ({ name: place.split('node_modules/').at(-1) ?? '', version }));

/** The numbers of a version; a pre-release counts as less than the version it leads to. */
const numbersOf = (version: string) => [
  ...version.split('-')[0]!.split('.').map(Number),
  version.includes('-') ? 0 : 1,
];

function isAtLeast(version: string, floor: string): boolean {
  const [a, b] = [numbersOf(version), numbersOf(floor)];
  const place = a.findIndex((number, index) => number !== b[index]);
  return place === -1 || a[place]! > b[place]!;
}

it('holds no package below its floor, at any depth', () => {
  const low = installed.filter(
    ({ name, version }) => name in floors && !isAtLeast(version, floors[name as keyof typeof floors]),
  );
  expect(low).toEqual([]);
  for (const name of ['next', 'react', 'mysql2']) expect(installed.map((each) => each.name)).toContain(name);
});

it('holds no package that we know to be unsafe or unkept', () => {
  expect(installed.filter(({ name }) => name in banned)).toEqual([]);
});

it('runs the scripts of no package at installation beyond the one that needs none', () => {
  const scripted = Object.entries(lock.packages as Record<string, { hasInstallScript?: boolean; optional?: boolean }>)
    .filter(([, each]) => each.hasInstallScript && !each.optional)
    .map(([place]) => place.split('node_modules/').at(-1));
  expect([...new Set(scripted)]).toEqual(['esbuild']);
});

it.each([
  ['16.4.10', '16.4.6', true],
  ['16.4.6', '16.4.6', true],
  ['16.10.0', '16.4.6', true],
  ['16.4.5', '16.4.6', false],
  ['16.4.6-canary.1', '16.4.6', false],
  ['9.9.9', '16.4.6', false],
])('reads %s against a floor of %s', (version, floor, holds) => {
  expect(isAtLeast(version, floor)).toBe(holds);
});
