import type { Random } from './arbitraries/random';

/** Values that no honest caller sends. */
const HOSTILE: readonly unknown[] = [
  undefined,
  null,
  Number.NaN,
  Number.POSITIVE_INFINITY,
  Number.NEGATIVE_INFINITY,
  -1,
  -0,
  0,
  1e308,
  -1e308,
  5e-324,
  1e-300,
  0.5,
  2 ** 53,
  '',
  'NaN',
  '1',
  '__proto__',
  'constructor',
  true,
  false,
  [],
  [null],
  [[]],
  [Number.NaN],
  ['a'],
  {},
  { length: 3 },
  { length: -1 },
  { length: 2 ** 31, 0: 1 },
  { id: '__proto__' },
  new Float64Array(0),
  new Float64Array([Number.NaN]),
  new Float64Array(3),
  new Date(0),
  new Map(),
  () => 1,
  Symbol.iterator,
  12n,
];

/** The arguments with one to three places spoilt: a value replaced, a field removed or added, a list cut or lengthened. */
export function spoilt(random: Random, sound: readonly unknown[]): unknown[] {
  const copy = cloned(sound) as unknown[];
  for (let times = random.whole(1, 3); times > 0; times--) spoilOnePlace(random, copy);
  return copy;
}

function spoilOnePlace(random: Random, args: unknown[]): void {
  let holder: Record<string, unknown> = args as unknown as Record<string, unknown>;
  for (;;) {
    const key = random.pick(Object.keys(holder));
    if (key === undefined) return;
    const inside = holder[key];
    if (isPlain(inside) && Object.keys(inside).length > 0 && random.chance(0.8)) {
      holder = inside;
      continue;
    }
    spoil(random, holder, key);
    return;
  }
}

function spoil(random: Random, holder: Record<string, unknown>, key: string): void {
  const way = random.whole(1, 8);
  if (way === 1 && !Array.isArray(holder)) delete holder[key];
  else if (way === 2 && Array.isArray(holder)) holder.pop();
  else if (way === 3 && Array.isArray(holder)) holder.push(random.pick(HOSTILE));
  else holder[key] = random.pick(HOSTILE);
}

/** Lists and plain objects may be spoilt inside; what a class made (a Matrix, a typed array) is replaced as a whole. */
function isPlain(value: unknown): value is Record<string, unknown> {
  if (typeof value !== 'object' || value === null) return false;
  return Array.isArray(value) || Object.getPrototypeOf(value) === Object.prototype;
}

function cloned(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(cloned);
  if (!isPlain(value)) return value;
  return Object.fromEntries(Object.entries(value).map(([key, inside]) => [key, cloned(inside)]));
}
