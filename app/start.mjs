/**
 * npm start: makes sure that everything is there, builds if the sources are newer than the build, and serves.
 * Plain JavaScript without dependencies, so that it can say what is missing. With --build-only it stops after building.
 */
import { spawn, spawnSync } from 'node:child_process';
import { existsSync, readdirSync, statSync } from 'node:fs';
import { createRequire } from 'node:module';
import { createServer } from 'node:net';
import { dirname, join, resolve } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { fileURLToPath } from 'node:url';

const root = dirname(dirname(fileURLToPath(import.meta.url)));
const next = join(root, 'node_modules', 'next', 'dist', 'bin', 'next');
const host = process.env.HOST || '127.0.0.1';
const port = Number(process.env.PORT || 4310);
const data = resolve(root, process.env.DATA_DIR || 'data');
const environment = { ...process.env, NEXT_TELEMETRY_DISABLED: '1', DATA_DIR: data, NODE_ENV: 'production' };

/** What the build is made of. */
const SOURCES = [
  'app',
  'components',
  'lib',
  'proxy.ts',
  'instrumentation-client.ts',
  'next.config.js',
  'package-lock.json',
];
const LOOPBACK = ['127.0.0.1', 'localhost', '::1'];

const say = (text) => process.stdout.write(`${text}\n`);

function stop(text) {
  process.stderr.write(`${text}\n`);
  process.exit(1);
}

function checkNode() {
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major < 20 || (major === 20 && minor < 9))
    stop(`Retrodict needs Node 20.9 or newer; this is Node ${process.versions.node}. See https://nodejs.org`);
}

function checkDependencies() {
  if (!existsSync(next)) stop('The packages that Retrodict is built from are not installed yet. Run: npm ci');
  try {
    const Database = createRequire(import.meta.url)('better-sqlite3');
    new Database(':memory:').close();
  } catch (error) {
    stop(
      `The database driver does not load with Node ${process.versions.node}: ${error.message.split('\n')[0]}\n` +
        'It is compiled for one version of Node: run npm rebuild better-sqlite3 (needs python3, make and a C++ compiler).',
    );
  }
}

function checkSettings() {
  if (!Number.isInteger(port) || port < 1 || port > 65535)
    stop(`PORT must be a number from 1 to 65535; it is ${process.env.PORT}`);
  if (process.env.DATABASE_URL)
    stop(
      'DATABASE_URL is set, but this version keeps its cases only in the folder DATA_DIR. Unset DATABASE_URL to start.',
    );
}

/** Whether the port can be had, and if not, why. */
function portTrouble() {
  return new Promise((done) => {
    const probe = createServer();
    probe.once('error', (error) => done(error));
    probe.listen(port, host, () => probe.close(() => done(null)));
  });
}

async function checkPort() {
  const trouble = await portTrouble();
  if (trouble?.code === 'EADDRINUSE')
    stop(
      `Port ${port} on ${host} is taken: is Retrodict running already? Stop that, or choose another port: PORT=4311 npm start`,
    );
  if (trouble) stop(`Cannot listen on ${host}, port ${port}: ${trouble.message}`);
}

/** The time of the newest change below a path, ms. */
function newest(path) {
  if (!existsSync(path)) return 0;
  const found = statSync(path);
  if (!found.isDirectory()) return found.mtimeMs;
  return Math.max(found.mtimeMs, ...readdirSync(path).map((name) => newest(join(path, name))));
}

function whyBuild() {
  const built = newest(join(root, '.next', 'BUILD_ID'));
  if (built === 0) return 'There is no build yet';
  const changed = Math.max(...SOURCES.map((source) => newest(join(root, source))));
  return changed > built ? 'The sources are newer than the build' : null;
}

function build() {
  const why = whyBuild();
  if (!why) return say('The build is up to date.');
  say(`${why}: building, which takes up to a minute …`);
  const began = performance.now();
  const { status, stdout, stderr } = spawnSync(process.execPath, [next, 'build'], {
    cwd: root,
    env: environment,
    encoding: 'utf8',
  });
  if (status !== 0) stop(`${stdout}${stderr}\nThe build failed; what it said stands above.`);
  say(`Built in ${((performance.now() - began) / 1000).toFixed(0)} s.`);
}

async function isReady(address) {
  for (let tries = 0; tries < 120; tries++) {
    const answer = await fetch(`${address}/api/health`).catch(() => null);
    if (answer?.ok) return true;
    if (answer) stop(`The server started, but cannot keep cases in ${data}: ${await answer.text()}`);
    await pause(250);
  }
  return false;
}

async function serve() {
  const server = spawn(process.execPath, [next, 'start', '--hostname', host, '--port', String(port)], {
    cwd: root,
    env: environment,
    stdio: ['ignore', 'ignore', 'inherit'],
  });
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => server.kill('SIGTERM'));
  process.on('exit', () => server.kill('SIGTERM'));
  server.on('exit', (code, signal) => {
    say(signal || code === 0 || code === 143 ? 'Retrodict has stopped.' : `The server ended by itself (code ${code}).`);
    process.exit(signal ? 0 : code === 143 ? 0 : code);
  });
  const shown = ['0.0.0.0', '::'].includes(host) ? 'localhost' : host.includes(':') ? `[${host}]` : host;
  const address = `http://${shown}:${port}`;
  if (!(await isReady(address))) stop('The server did not answer within half a minute.');
  say(`Cases are kept in ${data}`);
  if (!LOOPBACK.includes(host)) say('HOST is set: whoever can reach this machine can read and change the cases.');
  say(`Retrodict is ready: open ${address}\nStop it with Ctrl+C.`);
}

checkNode();
checkDependencies();
if (process.argv.includes('--build-only')) build();
else {
  checkSettings();
  await checkPort();
  build();
  await serve();
}
