/** A priority queue: the least `bound` comes first, among equals the one put in first. */
export class Heap<T extends { bound: number; serial: number }> {
  private readonly items: T[] = [];

  get least(): T | undefined {
    return this.items[0];
  }

  push(item: T): void {
    const { items } = this;
    let place = items.push(item) - 1;
    while (place > 0) {
      const parent = (place - 1) >> 1;
      if (!before(item, items[parent]!)) break;
      items[place] = items[parent]!;
      place = parent;
    }
    items[place] = item;
  }

  pop(): T | undefined {
    const { items } = this;
    const first = items[0];
    const last = items.pop();
    if (!last || items.length === 0) return first;
    let place = 0;
    for (;;) {
      let child = 2 * place + 1;
      if (child >= items.length) break;
      if (child + 1 < items.length && before(items[child + 1]!, items[child]!)) child++;
      if (!before(items[child]!, last)) break;
      items[place] = items[child]!;
      place = child;
    }
    items[place] = last;
    return first;
  }
}

function before(a: { bound: number; serial: number }, b: { bound: number; serial: number }): boolean {
  return a.bound < b.bound || (a.bound === b.bound && a.serial < b.serial);
}
