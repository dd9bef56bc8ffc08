import { spawn } from 'node:child_process';

/**
 * Runs a program to its end and collects what it said. It never throws for an exit code: the caller knows what the
 * code means. A program that is not there answers 127, as a shell would.
 */
export function run(program, args, { input, ...options } = {}) {
  return new Promise((resolve) => {
    const child = spawn(program, args, {
      stdio: [input === undefined ? 'ignore' : 'pipe', 'pipe', 'pipe'],
      ...options,
    });
    let output = '';
    let errors = '';
    child.stdout?.on('data', (chunk) => {
      output += chunk;
    });
    child.stderr?.on('data', (chunk) => {
      errors += chunk;
    });
    child.stdin?.on('error', () => {}); // a program that ended early says why on its standard error
    child.stdin?.end(input);
    child.on('error', (error) => resolve({ code: 127, output, errors: error.message }));
    child.on('close', (code, signal) => resolve({ code: code ?? 1, signal, output, errors }));
  });
}

/** Runs a program to its end while its words go to the terminal as they come. @returns its exit code, or its signal. */
export function show(program, args, options = {}) {
  const child = begin(program, args, { ...options, stdio: ['ignore', 'inherit', 'inherit'] });
  return new Promise((resolve) => {
    child.once('error', () => resolve(127));
    child.once('exit', (code, signal) => resolve(code ?? signal));
  });
}

const underWay = new Set();
process.on('exit', () => {
  for (const child of underWay) child.kill();
});

/** What is still under way when we end, ends with us. */
function begin(program, args, options) {
  const child = spawn(program, args, options);
  underWay.add(child);
  child.once('exit', () => underWay.delete(child));
  return child;
}

/** The last lines of a long text: where the reason usually stands. */
export const lastLines = (text, count = 12) => text.trimEnd().split('\n').slice(-count).join('\n');
