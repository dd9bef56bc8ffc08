/** So that outcomes stand under each other. */
const WIDTH = 22;

/**
 * Says what is being done and, on the same line when it is done, how it ended and how long it took. The work gets
 * `say` for a word on what it is at; text that it answers is told as the outcome.
 */
export async function step(name, work) {
  const start = Date.now();
  process.stdout.write(`  ${`${name} `.padEnd(WIDTH, '.')} `);
  const outcome = await work((word) => process.stdout.write(`${word}; `));
  const told = typeof outcome === 'string' ? outcome : 'ready';
  process.stdout.write(`${told} (${((Date.now() - start) / 1000).toFixed(1)} s)\n`);
  return outcome;
}
