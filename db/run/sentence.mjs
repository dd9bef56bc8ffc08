/** A reason why we cannot go on, told as one sentence to the person at the terminal. Anything else is a fault of ours. */
export class CannotGoOn extends Error {
  name = 'CannotGoOn';
}

/** Ends a command: a sentence for what the person can mend, the whole stack for what only we can. */
export function endWith(error) {
  process.stderr.write(`\n${error instanceof CannotGoOn ? error.message : (error?.stack ?? error)}\n`);
  process.exit(1);
}
