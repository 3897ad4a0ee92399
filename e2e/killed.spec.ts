import { type ChildProcess, spawn } from 'node:child_process';
import { mkdtemp, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';
import { expect, test } from '@playwright/test';

/** The real server, killed with SIGKILL in the middle of writing, again and again: every answered write is there afterwards. */

const KILLS = 5;
const port = 4900 + (process.pid % 90);
const base = `http://127.0.0.1:${port}`;

async function start(folder: string): Promise<ChildProcess> {
  const server = spawn('node_modules/.bin/next', ['start', '--hostname', '127.0.0.1', '--port', String(port)], {
    env: { ...process.env, DATA_DIR: folder, NEXT_TELEMETRY_DISABLED: '1' },
    stdio: 'ignore',
    detached: true,
  });
  for (let tries = 0; tries < 150; tries++) {
    const ok = await fetch(`${base}/api/health`).then(
      (response) => response.ok,
      () => false,
    );
    if (ok) return server;
    await pause(200);
  }
  throw new Error('the server did not start');
}

/** The whole group: next start keeps the server in a process of its own. */
const kill = (server: ChildProcess): boolean => process.kill(-(server.pid as number), 'SIGKILL');

test('kill -9 of the server while it writes loses no answered write', async () => {
  test.setTimeout(180_000);
  const folder = await mkdtemp(join(tmpdir(), 'retrodict-killed-'));
  const casefile = JSON.parse(await readFile('public/examples/junction.case.json', 'utf8')) as { notes: string };
  const answered = new Map<number, string>();
  let server = await start(folder);
  const created = await fetch(`${base}/api/cases`, { method: 'POST', body: JSON.stringify(casefile) });
  const { id, revision, sha256 } = (await created.json()) as { id: string; revision: number; sha256: string };
  answered.set(revision, sha256);
  let last = revision;

  for (let round = 0; round < KILLS; round++) {
    const doomed = server;
    const timer = setTimeout(() => kill(doomed), 150 + 170 * round);
    for (let alive = true; alive;) {
      const body = JSON.stringify({ ...casefile, notes: `round ${round}, after revision ${last}` });
      try {
        const response = await fetch(`${base}/api/cases/${id}`, {
          method: 'PUT',
          body,
          headers: { 'If-Match': `"${last}"` },
        });
        const kept = (await response.json()) as { revision: number; sha256: string };
        if (response.status === 200) answered.set(kept.revision, kept.sha256);
        last = kept.revision;
      } catch {
        alive = false;
      }
    }
    clearTimeout(timer);
    server = await start(folder);
    for (const [number, hash] of answered) {
      const found = await fetch(`${base}/api/cases/${id}/revisions/${number}`);
      expect(found.status, `revision ${number} after kill ${round + 1}`).toBe(200);
      expect(((await found.json()) as { sha256: string }).sha256).toBe(hash);
    }
    const newest = (await (await fetch(`${base}/api/cases/${id}`)).json()) as { revision: number };
    last = newest.revision;
  }
  kill(server);
  await rm(folder, { recursive: true, force: true });
  expect(answered.size).toBeGreaterThan(KILLS);
});
