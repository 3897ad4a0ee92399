import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import Database from 'better-sqlite3';
import { sql } from 'kysely';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { hashOf } from '@/lib/casefile/canonical';
import { emptyCase } from '@/lib/casefile/defaults';
import { createCase, createExample, deleteCase, listCases, restoreCase, saveCase } from '@/lib/store/cases';
import { loadExamples } from '@/lib/store/examples';
import { listRevisions, readCase, readRevision } from '@/lib/store/revisions';
import { type Store, closeStore, openStore, probeStore } from '@/lib/store/store';

let folder: string;
let store: Store;
let now: number;
let made: number;

const open = (): Promise<Store> =>
  openStore(
    folder,
    () => now,
    () => `case${++made}`,
  );

beforeEach(async () => {
  folder = await mkdtemp(join(tmpdir(), 'retrodict-store-'));
  now = 1_000;
  made = 0;
  store = await open();
});
afterEach(async () => {
  await closeStore(store);
  await rm(folder, { recursive: true, force: true });
});

test('a case is kept as revision 1 under the hash of its canonical form, and read back the same', async () => {
  const casefile = emptyCase('First');
  const written = await createCase(store, casefile);
  expect(written).toEqual({ id: 'case1', revision: 1, sha256: hashOf(casefile) });
  expect(await readCase(store, 'case1')).toEqual({ ...written, created: 1_000, case: casefile });
});

test('the list shows what stands, last changed first', async () => {
  await createCase(store, { ...emptyCase('First'), reference: 'R-1' });
  now = 2_000;
  await createCase(store, emptyCase('Second'));
  now = 3_000;
  await saveCase(store, 'case1', 1, { ...emptyCase('First, renamed'), reference: 'R-2' });
  const line = { example: false, reference: '' };
  expect(await listCases(store)).toEqual([
    { ...line, id: 'case1', title: 'First, renamed', reference: 'R-2', revision: 2, changed: 3_000 },
    { ...line, id: 'case2', title: 'Second', revision: 1, changed: 2_000 },
  ]);
});

test('a save goes over the revision that it names, and over no other', async () => {
  await createCase(store, emptyCase('One'));
  const second = await saveCase(store, 'case1', 1, emptyCase('Two'));
  expect(second).toEqual({ kind: 'saved', id: 'case1', revision: 2, sha256: hashOf(emptyCase('Two')) });
  expect(await saveCase(store, 'case1', 1, emptyCase('Late'))).toEqual({ ...second, kind: 'conflict' });
  expect(await saveCase(store, 'case1', 3, emptyCase('Early'))).toMatchObject({ kind: 'conflict', revision: 2 });
  expect((await readCase(store, 'case1'))?.case.title).toBe('Two');
  expect(await saveCase(store, 'nobody', 1, emptyCase())).toEqual({ kind: 'unknown' });
});

test('of many saves over one revision exactly one wins', async () => {
  await createCase(store, emptyCase('Base'));
  const saves = Array.from({ length: 8 }, (_, i) => saveCase(store, 'case1', 1, emptyCase(`Try ${i}`)));
  const kinds = (await Promise.all(saves)).map(({ kind }) => kind).sort();
  expect(kinds).toEqual([...Array.from({ length: 7 }, () => 'conflict'), 'saved']);
});

test('revisions stay as they were written', async () => {
  await createCase(store, emptyCase('One'));
  now = 2_000;
  await saveCase(store, 'case1', 1, emptyCase('Two'));
  expect(await listRevisions(store, 'case1')).toEqual([
    { revision: 2, sha256: hashOf(emptyCase('Two')), created: 2_000 },
    { revision: 1, sha256: hashOf(emptyCase('One')), created: 1_000 },
  ]);
  expect((await readRevision(store, 'case1', 1))?.case.title).toBe('One');
  expect(await readRevision(store, 'case1', 3)).toBeNull();
});

test('the database itself refuses to change or remove a revision', async () => {
  await createCase(store, emptyCase('One'));
  const change = store.db.updateTable('revisions').set({ body: '{}' }).execute();
  await expect(change).rejects.toThrow('revisions are immutable');
  await expect(store.db.deleteFrom('revisions').execute()).rejects.toThrow('revisions are immutable');
});

test('a deleted case is gone from everywhere until it is restored as it was', async () => {
  const { sha256 } = await createCase(store, emptyCase('One'));
  expect(await deleteCase(store, 'case1')).toBe(true);
  expect(await deleteCase(store, 'case1')).toBe(false);
  expect(await listCases(store)).toEqual([]);
  expect(await readCase(store, 'case1')).toBeNull();
  expect(await listRevisions(store, 'case1')).toBeNull();
  expect(await saveCase(store, 'case1', 1, emptyCase('Two'))).toEqual({ kind: 'deleted' });
  expect(await restoreCase(store, 'case1')).toBe(true);
  expect(await restoreCase(store, 'case1')).toBe(false);
  expect(await readCase(store, 'case1')).toMatchObject({ revision: 1, sha256 });
});

test('everything is there when the store is opened again', async () => {
  await createCase(store, emptyCase('One'));
  await closeStore(store);
  store = await open();
  expect((await readCase(store, 'case1'))?.case.title).toBe('One');
});

test('every commit waits for the disk, with a write-ahead log', async () => {
  const raw = new Database(join(folder, 'cases.db'), { readonly: true });
  expect(raw.pragma('journal_mode', { simple: true })).toBe('wal');
  raw.close();
  const { rows } = await sql`pragma synchronous`.execute(store.db);
  expect(rows).toEqual([{ synchronous: 2 }]);
});

test('an example is kept once: edited or deleted, it does not come back as it was', async () => {
  await createExample(store, 'junction', emptyCase('Example'));
  await saveCase(store, 'junction', 1, emptyCase('Changed'));
  await createExample(store, 'junction', emptyCase('Example'));
  expect(await listCases(store)).toMatchObject([{ id: 'junction', title: 'Changed', revision: 2, example: true }]);
  await deleteCase(store, 'junction');
  await createExample(store, 'junction', emptyCase('Example'));
  expect(await listCases(store)).toEqual([]);
});

test('the examples that come with the program are valid and keep the names of their files', async () => {
  await loadExamples(store, 'public/examples');
  expect((await listCases(store)).map(({ id }) => id).sort()).toEqual(['junction', 'nudge', 'queue', 'rivals']);
});

test('the probe writes', async () => {
  await probeStore(store);
  now = 5_000;
  await probeStore(store);
  expect(await store.db.selectFrom('probe').selectAll().execute()).toEqual([{ id: 1, at: 5_000 }]);
});
