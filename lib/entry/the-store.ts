import { join, resolve } from 'node:path';
import { loadExamples } from '@/lib/store/examples';
import { type Store, openStore } from '@/lib/store/store';

/** Kept on globalThis, since the development server loads modules anew and the file must be opened once. */
const shared = globalThis as typeof globalThis & { retrodictStore?: Promise<Store> };

/** Letters and digits that are not mistaken for one another: 32 of them, so that five bits choose one. */
const LETTERS = 'abcdefghjkmnpqrstuvwxyz023456789';
const ID_LENGTH = 12;

/** A name that nobody has used: 60 random bits. */
function newId(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(ID_LENGTH));
  return Array.from(bytes, (byte) => LETTERS[byte % LETTERS.length]).join('');
}

/** The store in DATA_DIR (left out: ./data), opened when it is first asked for; the example cases are in it. */
export function theStore(): Promise<Store> {
  shared.retrodictStore ??= open().catch((error: unknown) => {
    delete shared.retrodictStore;
    throw error;
  });
  return shared.retrodictStore;
}

async function open(): Promise<Store> {
  const store = await openStore(resolve(process.env.DATA_DIR || 'data'), Date.now, newId);
  await loadExamples(store, join(process.cwd(), 'public', 'examples'));
  return store;
}
