import type { Transaction } from 'kysely';
import { canonical, hashOf } from '@/lib/casefile/canonical';
import type { CaseFile } from '@/lib/casefile/schema';
import type { Store } from './store';
import type { Tables } from './tables';

/** A line of the list of cases. `changed` is ms since 1970-01-01 UTC. */
export interface CaseLine {
  id: string;
  title: string;
  reference: string;
  revision: number;
  changed: number;
  example: boolean;
}

/** What a write answers, once it is on disk. */
export interface Written {
  id: string;
  revision: number;
  /** SHA-256 of the canonical case. */
  sha256: string;
}

export type Saved =
  | ({ kind: 'saved' } & Written)
  /** The case moved on since `base`; nothing was written. */
  | ({ kind: 'conflict' } & Written)
  | { kind: 'deleted' }
  | { kind: 'unknown' };

/** The cases that stand, last changed first. */
export async function listCases({ db }: Store): Promise<CaseLine[]> {
  const rows = await db
    .selectFrom('cases')
    .select(['id', 'title', 'reference', 'revision', 'changed', 'example'])
    .where('deleted', 'is', null)
    .orderBy('changed', 'desc')
    .orderBy('id')
    .execute();
  return rows.map((row) => ({ ...row, example: row.example === 1 }));
}

/** Keeps a new case as revision 1, under a name of its own. */
export async function createCase(store: Store, casefile: CaseFile): Promise<Written> {
  const id = store.newId();
  return store.db.transaction().execute((trx) => insertCase(trx, store.clock(), id, casefile, false));
}

/** Keeps a case that comes with the program, unless it was ever kept before (also if it was deleted since). */
export async function createExample(store: Store, id: string, casefile: CaseFile): Promise<void> {
  await store.db.transaction().execute(async (trx) => {
    const there = await trx.selectFrom('cases').select('id').where('id', '=', id).executeTakeFirst();
    if (!there) await insertCase(trx, store.clock(), id, casefile, true);
  });
}

/** Keeps the next revision of a case, if the newest is still `base`. */
export async function saveCase(store: Store, id: string, base: number, casefile: CaseFile): Promise<Saved> {
  return store.db.transaction().execute(async (trx): Promise<Saved> => {
    const row = await trx.selectFrom('cases').select(['revision', 'deleted']).where('id', '=', id).executeTakeFirst();
    if (!row) return { kind: 'unknown' };
    if (row.deleted !== null) return { kind: 'deleted' };
    if (row.revision !== base) return { kind: 'conflict', ...(await newest(trx, id)) };
    const now = store.clock();
    const revision = base + 1;
    await trx
      .updateTable('cases')
      .set({ title: casefile.title, reference: casefile.reference ?? '', revision, changed: now })
      .where('id', '=', id)
      .execute();
    return { kind: 'saved', ...(await insertRevision(trx, now, id, revision, casefile)) };
  });
}

/** Deletes a case so that it can be restored; its revisions stay. False if there is none. */
export const deleteCase = (store: Store, id: string): Promise<boolean> => mark(store, id, store.clock());

/** Undoes deleteCase. False if the case never was, or was not deleted. */
export const restoreCase = (store: Store, id: string): Promise<boolean> => mark(store, id, null);

async function mark({ db }: Store, id: string, deleted: number | null): Promise<boolean> {
  const { numUpdatedRows } = await db
    .updateTable('cases')
    .set({ deleted })
    .where('id', '=', id)
    .where('deleted', deleted === null ? 'is not' : 'is', null)
    .executeTakeFirst();
  return numUpdatedRows === 1n;
}

async function insertCase(
  trx: Transaction<Tables>,
  now: number,
  id: string,
  casefile: CaseFile,
  example: boolean,
): Promise<Written> {
  await trx
    .insertInto('cases')
    .values({
      id,
      title: casefile.title,
      reference: casefile.reference ?? '',
      revision: 1,
      created: now,
      changed: now,
      deleted: null,
      example: example ? 1 : 0,
    })
    .execute();
  return insertRevision(trx, now, id, 1, casefile);
}

async function insertRevision(
  trx: Transaction<Tables>,
  created: number,
  id: string,
  revision: number,
  casefile: CaseFile,
): Promise<Written> {
  const sha256 = hashOf(casefile);
  await trx
    .insertInto('revisions')
    .values({ case_id: id, revision, sha256, body: canonical(casefile), created })
    .execute();
  return { id, revision, sha256 };
}

const newest = (trx: Transaction<Tables>, id: string): Promise<Written> =>
  trx
    .selectFrom('revisions')
    .select(['case_id as id', 'revision', 'sha256'])
    .where('case_id', '=', id)
    .orderBy('revision', 'desc')
    .limit(1)
    .executeTakeFirstOrThrow();
