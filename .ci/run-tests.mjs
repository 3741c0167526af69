import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { run } from './run-command.mjs';

/** Counts over all runs of Vitest. */
export const totals = { passed: 0, failed: 0, skipped: 0 };

/** Runs the tests of one Vitest configuration and adds up their counts; a file that could not be read counts as failed. */
export async function runTests(config, env, folder) {
  const report = join(folder, `${config.replaceAll('/', '-')}.json`);
  const args = ['run', '--config', config, '--reporter=default', '--reporter=json'];
  const failure = await run(
    'node',
    ['node_modules/vitest/vitest.mjs', ...args, `--outputFile.json=${report}`],
    {
      env,
    },
  ).then(
    () => undefined,
    (error) => error,
  );
  if (existsSync(report)) count(JSON.parse(readFileSync(report, 'utf8')));
  else totals.failed += 1;
  if (failure) throw new Error(`tests of ${config} failed`);
}

function count(read) {
  const unread = read.testResults.filter((f) => f.status === 'failed' && f.assertionResults.length === 0);
  totals.passed += read.numPassedTests;
  totals.failed += read.numFailedTests + unread.length;
  totals.skipped += read.numPendingTests + read.numTodoTests;
}
