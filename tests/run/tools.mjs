import { existsSync, readFileSync } from 'node:fs';
import { run, show } from '../../db/run/command.mjs';
import { inData, inRoot, ROOT } from '../../db/run/root.mjs';

const TOOL_LIMIT_MS = 5 * 60_000;
const TESTS_LIMIT_MS = 30 * 60_000;

/** What one part of the run came to: how many checks held, how many did not, and what there is to read about it. */
const outcome = (passed, failed, words = '') => ({ passed, failed, words });

/** A tool that either finds nothing, or fails and says what. */
export async function runTool(script, args) {
  const { code, output, errors } = await run(process.execPath, [inRoot(script), ...args], {
    cwd: ROOT,
    timeout: TOOL_LIMIT_MS,
  });
  return code === 0 ? outcome(1, 0) : outcome(0, 1, `${output}${errors}`);
}

/** One of Vitest's projects. Its report goes to the terminal as it comes; the counts are read from its own file. */
export async function runVitest(project, paths, variables = {}) {
  const report = inData('test', 'results', `${project}.json`);
  const code = await show(
    process.execPath,
    [
      inRoot('node_modules/vitest/vitest.mjs'),
      'run',
      '--config=tests/vitest.config.ts',
      `--project=${project}`,
      '--reporter=default',
      '--reporter=json',
      `--outputFile.json=${report}`,
      ...paths,
    ],
    { cwd: ROOT, env: { ...process.env, ...variables }, timeout: TESTS_LIMIT_MS },
  );
  if (!existsSync(report)) return outcome(0, 1, `Vitest ended with ${code} and without a report.`);
  return count(JSON.parse(readFileSync(report, 'utf8')), code);
}

/** A file that could not be loaded holds no test that failed, and neither does an error outside of any test. */
function count(report, code) {
  const broken = report.testResults.filter((file) => file.status === 'failed' && !file.assertionResults.some(isFailed));
  const failed = report.numFailedTests + broken.length;
  const skipped = report.numPendingTests + report.numTodoTests;
  if (skipped > 0)
    return outcome(report.numPassedTests, failed + skipped, `${skipped} skipped: no test is skipped here.`);
  if (report.numTotalTests === 0 && failed === 0) return outcome(0, 1, 'No test was found.');
  if (code !== 0 && failed === 0)
    return outcome(report.numPassedTests, 1, `Vitest ended with ${code}; its reason stands above.`);
  return outcome(report.numPassedTests, failed);
}

const isFailed = (test) => test.status === 'failed';
