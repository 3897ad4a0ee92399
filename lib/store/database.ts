import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import Database from 'better-sqlite3';
import {
  CompiledQuery,
  type DatabaseConnection,
  type Driver,
  Kysely,
  SqliteAdapter,
  SqliteDialect,
  type SqliteDialectConfig,
  SqliteDriver,
} from 'kysely';
import { migrate } from './migrations';
import type { Tables } from './tables';

/** How long a writer waits for another process on the same file, ms. */
const BUSY_TIMEOUT = 10_000;

/**
 * Transactions that take the write lock at once. With SQLite's plain BEGIN, two processes that read and then write fail
 * with SQLITE_BUSY however long the timeout, since it is not consulted when a lock is raised.
 */
class ImmediateDriver extends SqliteDriver {
  override async beginTransaction(connection: DatabaseConnection): Promise<void> {
    await connection.executeQuery(CompiledQuery.raw('begin immediate'));
  }
}

/** SQLite can undo a half-done CREATE TABLE, so a migration is one transaction. */
class TransactionalAdapter extends SqliteAdapter {
  override get supportsTransactionalDdl(): boolean {
    return true;
  }
}

class ImmediateDialect extends SqliteDialect {
  readonly #config: SqliteDialectConfig;
  constructor(config: SqliteDialectConfig) {
    super(config);
    this.#config = config;
  }
  override createDriver(): Driver {
    return new ImmediateDriver(this.#config);
  }
  override createAdapter(): SqliteAdapter {
    return new TransactionalAdapter();
  }
}

/** Between two tries to open a file that another process is opening, ms. */
const PAUSE = 25;

/**
 * Does what SQLite refuses as busy without waiting: two processes that open one file at once quarrel over its journal
 * mode, and the timeout is not consulted there.
 */
function patiently(work: () => void): void {
  for (let waited = 0; ; waited += PAUSE)
    try {
      work();
      return;
    } catch (error) {
      if (!isBusy(error) || waited >= BUSY_TIMEOUT) throw error;
      Atomics.wait(new Int32Array(new SharedArrayBuffer(4)), 0, 0, PAUSE);
    }
}

const isBusy = (error: unknown): boolean =>
  error instanceof Error && 'code' in error && String(error.code).startsWith('SQLITE_BUSY');

/**
 * Opens (and if need be makes) the database in a folder. Every commit is on disk before it is answered: write-ahead log
 * with a full sync. The only home of the database driver.
 */
export async function openDatabase(folder: string): Promise<Kysely<Tables>> {
  mkdirSync(folder, { recursive: true });
  const raw = new Database(join(folder, 'cases.db'), { timeout: BUSY_TIMEOUT });
  for (const setting of ['journal_mode = WAL', 'synchronous = FULL', 'foreign_keys = ON'])
    patiently(() => raw.pragma(setting));
  const db = new Kysely<Tables>({ dialect: new ImmediateDialect({ database: raw }) });
  await migrate(db);
  return db;
}

/** Whether an error says that the disk or the database refused, rather than that the program is wrong. */
export const isStoreTrouble = (error: unknown): boolean =>
  error instanceof Error &&
  'code' in error &&
  /^(SQLITE_(FULL|BUSY|READONLY|IOERR|CANTOPEN|LOCKED)|EACCES|EROFS|ENOSPC)/.test(String(error.code));
