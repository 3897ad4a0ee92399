import type { Kysely } from 'kysely';
import { openDatabase } from './database';
import type { Tables } from './tables';

/** An open store. The clock and the maker of names are passed in, so that a test decides both. */
export interface Store {
  db: Kysely<Tables>;
  /** Milliseconds since 1970-01-01 UTC. */
  clock: () => number;
  newId: () => string;
}

export const openStore = async (folder: string, clock: () => number, newId: () => string): Promise<Store> => ({
  db: await openDatabase(folder),
  clock,
  newId,
});

export const closeStore = (store: Store): Promise<void> => store.db.destroy();

/** Writes one row and waits for the disk: rejects when the store cannot be written. */
export async function probeStore({ db, clock }: Store): Promise<void> {
  const at = clock();
  await db
    .insertInto('probe')
    .values({ id: 1, at })
    .onConflict((conflict) => conflict.column('id').doUpdateSet({ at }))
    .execute();
}
