/**
 * The order in which things stand on a circle so that alike ones stand side by side: the tour with the greatest sum of
 * likeness between neighbours, by dynamic programming over subsets (Held and Karp 1962), which is exact. It starts with
 * the first thing and runs so that its second is listed before its last; ties go to the earlier in the list.
 *
 * The work doubles with every thing: `MOST_ON_A_CIRCLE` still takes a blink.
 */
export const MOST_ON_A_CIRCLE = 15;

export function circleOrder(likeness: readonly (readonly number[])[]): number[] {
  const count = likeness.length;
  if (count < 4) return likeness.map((_, index) => index);
  const { best, before } = longestPaths(likeness);
  const everyone = 2 ** (count - 1) - 1;
  let last = 0;
  let most = Number.NEGATIVE_INFINITY;
  for (let end = 0; end < count - 1; end++) {
    const sum = best[everyone * (count - 1) + end]! + likeness[end + 1]![0]!;
    if (sum > most) [last, most] = [end, sum];
  }
  const order = pathTo(last, before, count - 1);
  return order[1]! < order.at(-1)! ? order : [0, ...order.slice(1).reverse()];
}

/** For each set of things but the first, and each one of it as the end: the likest path there from the first thing. */
function longestPaths(likeness: readonly (readonly number[])[]): { best: Float64Array; before: Int8Array } {
  const others = likeness.length - 1;
  const best = new Float64Array(2 ** others * others).fill(Number.NEGATIVE_INFINITY);
  const before = new Int8Array(best.length).fill(-1);
  for (let end = 0; end < others; end++) best[2 ** end * others + end] = likeness[0]![end + 1]!;
  for (let set = 1; set < 2 ** others; set++) {
    for (let end = 0; end < others; end++) {
      const sum = best[set * others + end]!;
      if (sum === Number.NEGATIVE_INFINITY) continue;
      for (let next = 0; next < others; next++) {
        if (set & (1 << next)) continue;
        const place = (set | (1 << next)) * others + next;
        const longer = sum + likeness[end + 1]![next + 1]!;
        if (longer > best[place]!) {
          best[place] = longer;
          before[place] = end;
        }
      }
    }
  }
  return { best, before };
}

function pathTo(last: number, before: Int8Array, others: number): number[] {
  const order: number[] = [];
  let set = 2 ** others - 1;
  for (let end = last; end >= 0; ) {
    order.unshift(end + 1);
    const previous = before[set * others + end]!;
    set &= ~(1 << end);
    end = previous;
  }
  return [0, ...order];
}
