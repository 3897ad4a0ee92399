import { type Kysely, type Migration, type MigrationProvider, Migrator, sql } from 'kysely';
import type { Tables } from './tables';

/** The steps from an empty file to today's tables, in the order of their names. A step that was published is never changed. */
const MIGRATIONS: Record<string, Migration> = {
  '0001-cases-and-revisions': { up: casesAndRevisions },
};

async function casesAndRevisions(db: Kysely<unknown>): Promise<void> {
  await db.schema
    .createTable('cases')
    .addColumn('id', 'text', (c) => c.primaryKey())
    .addColumn('title', 'text', (c) => c.notNull())
    .addColumn('reference', 'text', (c) => c.notNull())
    .addColumn('revision', 'integer', (c) => c.notNull())
    .addColumn('created', 'integer', (c) => c.notNull())
    .addColumn('changed', 'integer', (c) => c.notNull())
    .addColumn('deleted', 'integer')
    .addColumn('example', 'integer', (c) => c.notNull())
    .execute();
  await db.schema
    .createTable('revisions')
    .addColumn('case_id', 'text', (c) => c.notNull().references('cases.id'))
    .addColumn('revision', 'integer', (c) => c.notNull())
    .addColumn('sha256', 'text', (c) => c.notNull())
    .addColumn('body', 'text', (c) => c.notNull())
    .addColumn('created', 'integer', (c) => c.notNull())
    .addPrimaryKeyConstraint('revisions_key', ['case_id', 'revision'])
    .execute();
  for (const change of ['update', 'delete'])
    await sql`create trigger ${sql.raw(`revisions_no_${change}`)} before ${sql.raw(change)} on revisions
      begin select raise(abort, 'revisions are immutable'); end`.execute(db);
  await db.schema
    .createTable('probe')
    .addColumn('id', 'integer', (c) => c.primaryKey())
    .addColumn('at', 'integer', (c) => c.notNull())
    .execute();
}

const provider: MigrationProvider = { getMigrations: async () => MIGRATIONS };

/** Brings the tables up to date. Safe when several servers start on one folder at once. */
export async function migrate(db: Kysely<Tables>): Promise<void> {
  const { error } = await new Migrator({ db, provider }).migrateToLatest();
  if (error) throw error;
}
