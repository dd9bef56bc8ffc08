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

/** The last lines of a long text: where the reason usually stands. */
export const lastLines = (text, count = 12) => text.trimEnd().split('\n').slice(-count).join('\n');
