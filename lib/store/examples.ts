import { readFile, readdir } from 'node:fs/promises';
import { join } from 'node:path';
import { parseCase } from '@/lib/casefile/parse';
import { createExample } from './cases';
import type { Store } from './store';

const ENDING = '.case.json';

/** Keeps the example cases of a folder, each under the name of its file. One that was deleted by hand does not come back. */
export async function loadExamples(store: Store, folder: string): Promise<void> {
  const files = (await readdir(folder)).filter((name) => name.endsWith(ENDING)).sort();
  for (const file of files) {
    const parsed = parseCase(await readFile(join(folder, file)));
    if (!parsed.ok)
      throw new Error(`The example ${file} is not a valid case: ${parsed.issues[0]?.path} ${parsed.issues[0]?.says}`);
    await createExample(store, file.slice(0, -ENDING.length), parsed.casefile);
  }
}
