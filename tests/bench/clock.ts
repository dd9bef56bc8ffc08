/** Runs each task in turn, round after round, and gives the least milliseconds of each: what the machine can do, not its mood. */
export function leastTimes(tasks: readonly (() => unknown)[], rounds = 5): number[] {
  const least = tasks.map(() => Number.POSITIVE_INFINITY);
  for (let round = 0; round < rounds; round++) {
    for (const [index, task] of tasks.entries()) {
      const start = performance.now();
      task();
      least[index] = Math.min(least[index]!, performance.now() - start);
    }
  }
  return least;
}

/** All times of one task, sorted, for a share of them to be read off. */
export function sortedTimes(task: (round: number) => unknown, rounds: number): number[] {
  const times = Array.from({ length: rounds }, (_, round) => {
    const start = performance.now();
    task(round);
    return performance.now() - start;
  });
  return times.sort((a, b) => a - b);
}

export function geometricMean(values: readonly number[]): number {
  return Math.exp(values.reduce((sum, value) => sum + Math.log(value), 0) / values.length);
}

/** One line of the report: what was measured, and whether the goal is met. */
export function line(what: string, value: string, goal: string, met: boolean): void {
  console.log(`${met ? 'met   ' : 'missed'}  ${what.padEnd(58)} ${value.padStart(26)}   goal ${goal}`);
}
