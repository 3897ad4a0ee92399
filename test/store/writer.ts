import { emptyCase } from '@/lib/casefile/defaults';
import { createCase, createExample, saveCase } from '@/lib/store/cases';
import { readCase } from '@/lib/store/revisions';
import { openStore } from '@/lib/store/store';

/**
 * Run as a process of its own: writes cases into the folder of its first argument until it is killed, and says each
 * write on a line once the store has answered. Two of these at once quarrel over the case `shared`.
 */
const [folder, name] = process.argv.slice(2);
let made = 0;
const store = await openStore(folder, Date.now, () => `${name}-${++made}`);
await createExample(store, 'shared', emptyCase('Shared'));
const say = (id: string, revision: number, sha256: string): void =>
  void process.stdout.write(`${JSON.stringify({ id, revision, sha256 })}\n`);

for (let n = 0; ; n++) {
  const created = await createCase(store, emptyCase(`${name} ${n}`));
  say(created.id, created.revision, created.sha256);
  const shared = await readCase(store, 'shared');
  if (!shared) throw new Error('the shared case is gone');
  const saved = await saveCase(store, 'shared', shared.revision, { ...shared.case, notes: `${name} ${n}` });
  if (saved.kind === 'saved') say(saved.id, saved.revision, saved.sha256);
}
