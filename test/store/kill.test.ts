import { type ChildProcess, spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createInterface } from 'node:readline';
import { setTimeout as pause } from 'node:timers/promises';
import { sql } from 'kysely';
import { expect, test } from 'vitest';
import { hashOf } from '@/lib/casefile/canonical';
import { listCases } from '@/lib/store/cases';
import { readRevision } from '@/lib/store/revisions';
import { closeStore, openStore } from '@/lib/store/store';

interface Answered {
  id: string;
  revision: number;
  sha256: string;
}

const ROUNDS = 10;

/** A writer, killed without warning `after` ms after its first answer; what it was answered until then. */
async function writeUntilKilled(folder: string, name: string, after: number): Promise<Answered[]> {
  const child = spawn(process.execPath, ['--import', 'tsx', 'test/store/writer.ts', folder, name], {
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  const errors: string[] = [];
  child.stderr.on('data', (text: Buffer) => errors.push(text.toString()));
  const answered: Answered[] = [];
  createInterface(child.stdout).on('line', (line) => answered.push(readAnswer(line)));
  await Promise.race([once(child.stdout, 'data'), once(child, 'exit')]);
  await pause(after);
  expect(await killed(child), errors.join('')).toBe('SIGKILL');
  return answered;
}

const readAnswer = (line: string): Answered => JSON.parse(line) as Answered;

/** Kills a child at once; how it ended. A writer that ended by itself had failed. */
async function killed(child: ChildProcess): Promise<string | null> {
  if (child.exitCode === null) {
    const end = once(child, 'close');
    child.kill('SIGKILL');
    await end;
  }
  return child.signalCode;
}

test('kill -9 in the middle of writing, twenty times, two servers on one folder: every answered write is there', async () => {
  const folder = await mkdtemp(join(tmpdir(), 'retrodict-kill-'));
  const answered: Answered[] = [];
  for (let round = 0; round < ROUNDS; round++) {
    const pair = [0, 1].map((side) => writeUntilKilled(folder, `w${round}${side}`, ((round * 2 + side) * 37) % 120));
    answered.push(...(await Promise.all(pair)).flat());
  }
  expect(answered.length).toBeGreaterThan(2 * ROUNDS);

  const store = await openStore(folder, Date.now, () => 'new');
  for (const { id, revision, sha256 } of answered) {
    const kept = await readRevision(store, id, revision);
    expect(kept?.sha256, `${id} revision ${revision}`).toBe(sha256);
    expect(hashOf(kept?.case)).toBe(sha256);
  }
  const { rows } = await sql<{ integrity_check: string }>`pragma integrity_check`.execute(store.db);
  expect(rows).toEqual([{ integrity_check: 'ok' }]);
  for (const { id, revision } of await listCases(store)) expect(await readRevision(store, id, revision)).not.toBeNull();
  const { count } = await store.db
    .selectFrom('revisions')
    .select((eb) => eb.fn.countAll<number>().as('count'))
    .where('case_id', '=', 'shared')
    .executeTakeFirstOrThrow();
  expect((await listCases(store)).find(({ id }) => id === 'shared')?.revision).toBe(count);
  await closeStore(store);
  await rm(folder, { recursive: true, force: true });
});
