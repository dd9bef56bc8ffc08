/**
 * How well a query fits a name, or null where it does not: letters in order, whole words and beginnings of words
 * first. Case and accents do not count. The highest score is the best; an empty query fits everything alike.
 */
export function fuzzyScore(query: string, text: string): number | null {
  const wanted = plain(query).trim();
  const name = plain(text);
  if (wanted === '') return 0;
  const at = name.indexOf(wanted);
  if (at >= 0)
    return 1000 - at - name.length * 0.1 + (startsWord(name, at) ? 500 : 0) + (name.length === wanted.length ? 500 : 0);
  return scattered(wanted.replaceAll(' ', ''), name);
}

/** The items that fit, best first; ties keep their order. */
export function fuzzyFilter<T>(query: string, items: readonly T[], textOf: (item: T) => string): T[] {
  if (query.trim() === '') return [...items];
  return items
    .map((item) => ({ item, score: fuzzyScore(query, textOf(item)) }))
    .filter((hit): hit is { item: T; score: number } => hit.score !== null)
    .sort((a, b) => b.score - a.score)
    .map(({ item }) => item);
}

/**
 * Letters in order but apart. A jump to the beginning of a word costs little; a jump into a word is let pass once, as a
 * letter left out in haste, because with more of them nearly every name would fit.
 */
function scattered(wanted: string, name: string): number | null {
  let score = 400;
  let from = 0;
  let jumps = 0;
  for (const letter of wanted) {
    const next = nextPlace(name, letter, from);
    if (next < 0) return null;
    const intoWord = next > from && !startsWord(name, next);
    if (intoWord && ++jumps > 1) return null;
    if (next > from) score -= intoWord ? 12 + (next - from) : 2;
    from = next + 1;
  }
  return score;
}

/** The next place of a letter, at the beginning of a word if there is one. */
function nextPlace(name: string, letter: string, from: number): number {
  if (name[from] === letter) return from;
  const word = name.indexOf(` ${letter}`, from);
  return word >= 0 ? word + 1 : name.indexOf(letter, from);
}

const startsWord = (name: string, at: number): boolean => at === 0 || !/[a-z0-9]/.test(name[at - 1] ?? ' ');

const plain = (text: string): string => text.normalize('NFD').replace(/\p{M}/gu, '').toLowerCase();
