/**
 * npm test: every check there is, one after another, also when one fails; npm run check leaves the browser out. Says what
 * it does, how long it took and what is missing. The last line counts the tests, as the runners' own reports have them,
 * and every other step that failed as one failure.
 */
import { spawnSync } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { fileURLToPath } from 'node:url';

const root = dirname(dirname(fileURLToPath(import.meta.url)));
const reports = mkdtempSync(join(tmpdir(), 'retrodict-reports-'));
const unitReport = join(reports, 'unit.json');
const browserReport = join(reports, 'browser.json');
const environment = { ...process.env, NEXT_TELEMETRY_DISABLED: '1', PLAYWRIGHT_JSON_OUTPUT_FILE: browserReport };
const chromium = process.env.CHROMIUM_PATH || '/usr/bin/chromium';
const withBrowser = !process.argv.includes('--no-browser');

const total = { passed: 0, failed: 0, skipped: 0 };
const failures = [];
const say = (text) => process.stdout.write(`${text}\n`);

function fail(what) {
  total.failed += 1;
  failures.push(what);
}

/** Runs programs of node_modules/.bin, each a list of words, until one fails. Whether all went well. */
function run(title, ...commands) {
  say(`\n── ${title}`);
  const began = performance.now();
  const ok = commands.every(([program, ...words]) => {
    const file = program === 'node' ? process.execPath : join(root, 'node_modules', '.bin', program);
    return spawnSync(file, words, { cwd: root, env: environment, stdio: 'inherit' }).status === 0;
  });
  say(`${ok ? 'ok' : 'FAILED'}: ${title} (${((performance.now() - began) / 1000).toFixed(1)} s)`);
  return ok;
}

function step(title, ...commands) {
  if (!run(title, ...commands)) fail(title);
}

/** A step that counts its tests in a report; a runner that fails without a failed test counts as one. */
function tests(title, report, count, ...commands) {
  const ok = run(title, ...commands);
  const counted = existsSync(report)
    ? count(JSON.parse(readFileSync(report, 'utf8')))
    : { passed: 0, failed: 0, skipped: 0 };
  for (const key of Object.keys(total)) total[key] += counted[key];
  if (counted.failed > 0) failures.push(`${title}: ${counted.failed} failed`);
  else if (!ok) fail(title);
  else if (counted.passed === 0) fail(`${title}: no test was run`);
}

const countUnit = (report) => ({
  passed: report.numPassedTests,
  failed: report.numFailedTests,
  skipped: report.numPendingTests + report.numTodoTests,
});
const countBrowser = ({ stats }) => ({
  passed: stats.expected,
  failed: stats.unexpected + stats.flaky,
  skipped: stats.skipped,
});

function checkReady() {
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major < 20 || (major === 20 && minor < 19)) {
    say(`The tests need Node 20.19 or newer (running Retrodict: 20.9); this is Node ${process.versions.node}.`);
    process.exit(1);
  }
  if (existsSync(join(root, 'node_modules', '.bin', 'vitest'))) return;
  say('The packages that Retrodict is built from are not installed yet. Run: npm ci');
  process.exit(1);
}

function browserTests() {
  if (!existsSync(chromium)) {
    say(`\nThe browser tests need Chromium, and there is none at ${chromium}.`);
    say('Debian and Ubuntu: apt-get install -y chromium. Elsewhere: set CHROMIUM_PATH to the program.');
    say('Without a browser: npm run check');
    return fail('the browser tests: no Chromium found');
  }
  if (!run('build', ['node', 'app/start.mjs', '--build-only'])) return fail('build');
  tests('browser tests', browserReport, countBrowser, ['playwright', 'test', '--reporter=list,json']);
}

checkReady();
step('format', ['oxfmt', '--check', '.']);
step('lint', ['oxlint', '--type-aware']);
step('types', ['next', 'typegen'], ['tsc', '--noEmit']);
step('unused files, exports and dependencies', ['knip']);
tests(
  'unit tests: laws, published values, whole cases, doors, store, architecture, schemas current',
  unitReport,
  countUnit,
  ['vitest', 'run', '--reporter=default', '--reporter=json', `--outputFile.json=${unitReport}`],
);
if (withBrowser) browserTests();
rmSync(reports, { recursive: true, force: true });

say('');
for (const failure of failures) say(`failed: ${failure}`);
if (total.skipped > 0) say(`${total.skipped} skipped`);
say(`${total.passed} passed, ${total.failed} failed`);
process.exit(total.failed === 0 ? 0 : 1);
