import { spawnSync } from 'node:child_process';
import { chmod, cp, mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';

/** The programs that the checks run, each standing in for itself. */
const PROGRAMS = ['oxfmt', 'oxlint', 'next', 'tsc', 'knip', 'vitest', 'playwright'];
const UNIT = { numPassedTests: 40, numFailedTests: 0, numPendingTests: 0, numTodoTests: 0 };
const BROWSER = { stats: { expected: 7, unexpected: 0, flaky: 0, skipped: 0 } };

let root: string;
beforeEach(async () => {
  root = await mkdtemp(join(tmpdir(), 'retrodict-run-'));
  for (const folder of ['test', 'app', 'node_modules/.bin']) await mkdir(join(root, folder), { recursive: true });
  await cp('test/run.mjs', join(root, 'test/run.mjs'));
  await writeFile(join(root, 'app/start.mjs'), '');
  for (const program of PROGRAMS) await standIn(program, 'exit 0');
  await unit(UNIT);
  await browser(BROWSER);
});
afterEach(() => rm(root, { recursive: true, force: true }));

async function standIn(program: string, script: string): Promise<void> {
  const file = join(root, 'node_modules/.bin', program);
  await writeFile(file, `#!/bin/sh\n${script}\n`);
  await chmod(file, 0o755);
}

/** A runner that leaves a report where it was told to, and ends with a code. */
const unit = (report: object, code = 0): Promise<void> =>
  standIn(
    'vitest',
    `for word; do case "$word" in --outputFile.json=*) echo '${JSON.stringify(report)}' > "\${word#*=}";; esac; done; exit ${code}`,
  );
const browser = (report: object, code = 0): Promise<void> =>
  standIn('playwright', `echo '${JSON.stringify(report)}' > "$PLAYWRIGHT_JSON_OUTPUT_FILE"; exit ${code}`);

function run(...words: string[]): { code: number | null; lines: string[]; last: string } {
  const env = { ...process.env, CHROMIUM_PATH: process.execPath };
  const { status, stdout } = spawnSync(process.execPath, [join(root, 'test/run.mjs'), ...words], {
    env,
    encoding: 'utf8',
  });
  const lines = stdout.trimEnd().split('\n');
  return { code: status, lines, last: lines.at(-1) ?? '' };
}

test('the last line is the sum of what both runners counted', () => {
  expect(run()).toMatchObject({ code: 0, last: '47 passed, 0 failed' });
});

test('without the browser only the other tests count', () => {
  expect(run('--no-browser')).toMatchObject({ code: 0, last: '40 passed, 0 failed' });
});

test('failed tests of either runner are counted', async () => {
  await unit({ ...UNIT, numPassedTests: 38, numFailedTests: 2 }, 1);
  await browser({ stats: { expected: 5, unexpected: 1, flaky: 1, skipped: 0 } }, 1);
  expect(run()).toMatchObject({ code: 1, last: '43 passed, 4 failed' });
});

test('skipped tests are said', async () => {
  await browser({ stats: { expected: 6, unexpected: 0, flaky: 0, skipped: 1 } });
  const { lines, last } = run();
  expect(lines.at(-2)).toBe('1 skipped');
  expect(last).toBe('46 passed, 0 failed');
});

test.each(['oxfmt', 'oxlint', 'next', 'tsc', 'knip'])(
  'a failing %s is one failure, and the rest still runs',
  async (program) => {
    await standIn(program, 'exit 1');
    expect(run()).toMatchObject({ code: 1, last: '47 passed, 1 failed' });
  },
);

test('a runner that breaks before it counts is a failure', async () => {
  await standIn('vitest', 'exit 1');
  expect(run()).toMatchObject({ code: 1, last: '7 passed, 1 failed' });
  await standIn('vitest', 'exit 0');
  expect(run()).toMatchObject({ code: 1, last: '7 passed, 1 failed' });
});

test('a runner that fails though every test passed is a failure', async () => {
  await unit(UNIT, 1);
  expect(run()).toMatchObject({ code: 1, last: '47 passed, 1 failed' });
});

test('a build that fails is a failure, and the browser is not started', async () => {
  await writeFile(join(root, 'app/start.mjs'), 'process.exit(1)');
  expect(run()).toMatchObject({ code: 1, last: '40 passed, 1 failed' });
});
