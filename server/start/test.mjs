// `npm test`: from a fresh clone to the result of every check and test. The checks of the text (format,
// lint, types) run beside the quick tests; tests that measure time or drive a browser run alone.
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { spawn } from 'node:child_process';
import { findProgram } from './find-program.mjs';
import { installDebianPackage } from './debian-packages.mjs';
import { prepare } from './prepare.mjs';
import { say } from './progress.mjs';
import { runProgram } from './run-program.mjs';
import { explainSystemError } from './start-failure.mjs';

/**
 * @typedef {{ name: string, seconds: number, ok: boolean, passed: number, failed: number }} Result
 * @typedef {{ status: string, assertionResults: { status: string }[] }} FileResult
 * @typedef {{ testResults: FileResult[] }} Report
 */

const root = join(import.meta.dirname ?? '.', '../..');
process.chdir(root);
const reports = mkdtempSync(join(tmpdir(), 'spyhole-reports-'));

/** @param {number} startedAt */
const secondsSince = (startedAt) => (performance.now() - startedAt) / 1000;

/**
 * A check that either holds or does not; what it says is shown when it does not.
 * @param {string} name
 * @param {string} script the npm script
 * @returns {Promise<Result>}
 */
async function check(name, script) {
  const startedAt = performance.now();
  const { code, output } = await runProgram('npm', ['run', '--silent', script], { cwd: root });
  const seconds = secondsSince(startedAt);
  say(`\n${code === 0 ? 'ok' : 'FAILED'}: ${name} (${seconds.toFixed(1)} s)`);
  if (code !== 0) say(output.trimEnd());
  // A broken check is one failure in the closing line; a good one is not a test.
  return { name, seconds, ok: code === 0, passed: 0, failed: code === 0 ? 0 : 1 };
}

/**
 * One group of tests, shown as it runs.
 * @param {string} project
 * @returns {Promise<Result>}
 */
async function tests(project) {
  const startedAt = performance.now();
  const report = join(reports, `${project}.json`);
  const vitest = join(root, 'node_modules/vitest/vitest.mjs');
  const args = ['run', '--project', project, '--reporter=default', '--reporter=json'];
  const code = await new Promise((resolve) => {
    const child = spawn(process.execPath, [vitest, ...args, `--outputFile.json=${report}`], {
      cwd: root,
      stdio: ['ignore', 'inherit', 'inherit'],
      env: { ...process.env, NODE_ENV: 'test' },
    });
    child.once('error', () => resolve(1));
    child.once('exit', (exitCode) => resolve(exitCode ?? 1));
  });
  const { passed, failed } = countTests(report);
  return {
    name: `${project} tests`,
    seconds: secondsSince(startedAt),
    ok: code === 0,
    passed,
    // A run that broke without a failed test (a set-up that failed, say) counts as one failure.
    failed: code !== 0 && failed === 0 ? 1 : failed,
  };
}

/**
 * @param {string} path a report of Vitest's JSON reporter
 * @returns {{ passed: number, failed: number }}
 */
function countTests(path) {
  /** @type {Report} */
  let report;
  try {
    report = JSON.parse(readFileSync(path, 'utf8'));
  } catch {
    return { passed: 0, failed: 0 };
  }
  let passed = 0;
  let failed = 0;
  for (const file of report.testResults) {
    const before = failed;
    for (const { status } of file.assertionResults) {
      if (status === 'passed') passed += 1;
      if (status === 'failed') failed += 1;
    }
    // A file that could not even be loaded has no tests to count.
    if (file.status === 'failed' && failed === before) failed += 1;
  }
  return { passed, failed };
}

/**
 * @param {(() => Promise<Result>)[]} work
 * @returns {Promise<Result[]>}
 */
async function oneByOne(work) {
  const results = [];
  for (const run of work) results.push(await run());
  return results;
}

/** @param {Result[]} results */
function summarise(results) {
  say('\n');
  const width = Math.max(...results.map((result) => result.name.length));
  for (const { name, seconds, ok, passed, failed } of results) {
    const counts = passed + failed > 0 ? `  ${passed} passed, ${failed} failed` : '';
    say(
      `${ok ? 'ok    ' : 'FAILED'}  ${name.padEnd(width)}  ${seconds.toFixed(1).padStart(6)} s${counts}`,
    );
  }
  const passed = results.reduce((sum, result) => sum + result.passed, 0);
  const failed = results.reduce((sum, result) => sum + result.failed, 0);
  say(`\n${passed} passed, ${failed} failed`);
}

try {
  await prepare(root, { needsMariadb: true });
  if (findProgram('chromium') === null) {
    await installDebianPackage('chromium', 'shows the pages to the browser tests', '');
  }
  const [checks, quick] = await Promise.all([
    oneByOne([
      () => check('format', 'format:check'),
      () => check('lint', 'lint'),
      () => check('types', 'typecheck'),
    ]),
    oneByOne([() => tests('unit'), () => tests('pages')]),
  ]);
  const slow = await oneByOne([() => tests('api'), () => tests('browser')]);
  const results = [...checks, ...quick, ...slow];
  summarise(results);
  process.exitCode = results.every((result) => result.ok) ? 0 : 1;
} catch (error) {
  const reason = explainSystemError(error);
  console.error(reason instanceof Error && 'exitCode' in reason ? `\n${reason.message}` : reason);
  process.exitCode = 1;
} finally {
  rmSync(reports, { recursive: true, force: true });
}
