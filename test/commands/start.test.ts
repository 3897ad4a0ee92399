import { type ChildProcess, spawn } from 'node:child_process';
import { once } from 'node:events';
import { cp, mkdir, mkdtemp, rm, symlink, utimes, writeFile } from 'node:fs/promises';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';

/** Stands in for the framework: `build` leaves a build, `start` serves; each as its surroundings ask. */
const STAND_IN = `
import { mkdirSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:http';
const [what] = process.argv.slice(2);
if (process.env.NEXT_TELEMETRY_DISABLED !== '1') process.exit(9);
if (what === 'build') {
  if (process.env.BREAK === 'build') { console.log('Type error: something is wrong'); process.exit(1); }
  mkdirSync('.next', { recursive: true });
  writeFileSync('.next/BUILD_ID', 'x');
}
if (what === 'start') {
  const status = process.env.BREAK === 'store' ? 503 : 200;
  createServer((_, answer) => { answer.statusCode = status; answer.end('the disk is full'); })
    .listen(Number(process.argv.at(-1)), process.argv[4]);
}
`;

let root: string;
const running: ChildProcess[] = [];

beforeEach(async () => {
  root = await mkdtemp(join(tmpdir(), 'retrodict-start-'));
  const bin = join(root, 'node_modules/next/dist/bin');
  await mkdir(join(root, 'app'));
  await mkdir(bin, { recursive: true });
  await cp('app/start.mjs', join(root, 'app/start.mjs'));
  await writeFile(join(root, 'package.json'), '{"type":"module"}');
  await writeFile(join(root, 'node_modules/next/package.json'), '{"type":"module"}');
  await writeFile(join(bin, 'next'), STAND_IN);
  await symlink(resolve('node_modules/better-sqlite3'), join(root, 'node_modules/better-sqlite3'));
});
afterEach(async () => {
  for (const child of running.splice(0))
    if (child.exitCode === null) {
      child.kill('SIGTERM');
      await once(child, 'exit');
    }
  await rm(root, { recursive: true, force: true });
});

interface Started {
  said: () => string;
  /** What it ended with. */
  end: Promise<number | null>;
  child: ChildProcess;
}

function start(surroundings: Record<string, string> = {}, ...words: string[]): Started {
  const { HOST: _host, PORT: _port, DATABASE_URL: _url, ...env } = process.env;
  const child = spawn(process.execPath, [join(root, 'app/start.mjs'), ...words], {
    cwd: root,
    env: { ...env, ...surroundings },
  });
  running.push(child);
  let said = '';
  for (const stream of [child.stdout, child.stderr]) stream.on('data', (text: Buffer) => (said += text.toString()));
  return { said: () => said, child, end: once(child, 'close').then(([code]) => code as number | null) };
}

async function until(started: Started, words: string): Promise<void> {
  await expect.poll(started.said, { timeout: 20_000 }).toContain(words);
}

async function freePort(): Promise<string> {
  const server = createServer().listen(0, '127.0.0.1');
  await once(server, 'listening');
  const { port } = server.address() as AddressInfo;
  server.close();
  await once(server, 'close');
  return String(port);
}

test('it builds once, serves, says where, and stops when told', async () => {
  const PORT = await freePort();
  const first = start({ PORT });
  await until(first, `Retrodict is ready: open http://127.0.0.1:${PORT}`);
  expect(first.said()).toContain('There is no build yet: building');
  expect(first.said()).toContain(`Cases are kept in ${join(root, 'data')}`);
  first.child.kill('SIGTERM');
  expect(await first.end).toBe(0);
  expect(first.said()).toContain('Retrodict has stopped.');
  const second = start({}, '--build-only');
  expect(await second.end).toBe(0);
  expect(second.said()).toContain('The build is up to date.');
});

test('it builds again when a source is newer than the build', async () => {
  await start({}, '--build-only').end;
  const later = new Date(Date.now() + 60_000);
  await utimes(join(root, 'app/start.mjs'), later, later);
  const again = start({}, '--build-only');
  await again.end;
  expect(again.said()).toContain('The sources are newer than the build');
});

test('a build that fails says what it said, and nothing is served', async () => {
  const started = start({ BREAK: 'build', PORT: await freePort() });
  expect(await started.end).toBe(1);
  expect(started.said()).toContain('Type error: something is wrong');
  expect(started.said()).toContain('The build failed');
});

test('a port that is taken is said before anything is built', async () => {
  const server = createServer().listen(0, '127.0.0.1');
  await once(server, 'listening');
  const { port } = server.address() as AddressInfo;
  const started = start({ PORT: String(port) });
  expect(await started.end).toBe(1);
  expect(started.said()).toMatch(/^Port \d+ on 127\.0\.0\.1 is taken/);
  server.close();
});

test('packages that are not installed are named with the command that installs them', async () => {
  await rm(join(root, 'node_modules/next'), { recursive: true });
  const started = start();
  expect(await started.end).toBe(1);
  expect(started.said()).toContain('Run: npm ci');
});

test('a driver that does not load is said in words', async () => {
  await rm(join(root, 'node_modules/better-sqlite3'));
  const started = start();
  expect(await started.end).toBe(1);
  expect(started.said()).toContain('npm rebuild better-sqlite3');
  expect(started.said()).not.toMatch(/\n\s+at /);
});

test('a store that cannot be written is said', async () => {
  const started = start({ BREAK: 'store', PORT: await freePort() });
  expect(await started.end).toBe(1);
  expect(started.said()).toContain('cannot keep cases');
  expect(started.said()).toContain('the disk is full');
});

test.each([
  [{ PORT: 'many' }, 'PORT must be a number'],
  [{ DATABASE_URL: 'postgres://there' }, 'DATABASE_URL is set'],
])('settings that cannot be followed are said: %o', async (surroundings, words) => {
  const started = start(surroundings);
  expect(await started.end).toBe(1);
  expect(started.said()).toContain(words);
});
