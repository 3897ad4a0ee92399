import { parseCaseText } from '@/lib/casefile/parse';
import type { CaseFile } from '@/lib/casefile/schema';
import type { Written } from './cases';
import type { Store } from './store';

/** A revision as it was kept. `created` is ms since 1970-01-01 UTC. */
export interface Revision extends Written {
  created: number;
  case: CaseFile;
}

/** The newest revision of a case, or null if there is no such case or it was deleted. */
export const readCase = (store: Store, id: string): Promise<Revision | null> => read(store, id, null);

/** One revision of a case that stands, or null. */
export const readRevision = (store: Store, id: string, revision: number): Promise<Revision | null> =>
  read(store, id, revision);

/** All revisions of a case that stands, newest first, without their bodies; null if there is no such case. */
export async function listRevisions({ db }: Store, id: string): Promise<Omit<Revision, 'case' | 'id'>[] | null> {
  const rows = await db
    .selectFrom('revisions')
    .innerJoin('cases', 'cases.id', 'revisions.case_id')
    .select(['revisions.revision', 'revisions.sha256', 'revisions.created'])
    .where('case_id', '=', id)
    .where('cases.deleted', 'is', null)
    .orderBy('revisions.revision', 'desc')
    .execute();
  return rows.length > 0 ? rows : null;
}

async function read({ db }: Store, id: string, revision: number | null): Promise<Revision | null> {
  const row = await db
    .selectFrom('revisions')
    .innerJoin('cases', 'cases.id', 'revisions.case_id')
    .select(['revisions.revision', 'revisions.sha256', 'revisions.created', 'revisions.body'])
    .where('case_id', '=', id)
    .where('cases.deleted', 'is', null)
    .where('revisions.revision', '=', (eb) => (revision === null ? eb.ref('cases.revision') : eb.val(revision)))
    .executeTakeFirst();
  if (!row) return null;
  const { body, ...rest } = row;
  return { id, ...rest, case: parsed(body) };
}

/** What was kept was valid when it was kept: anything else is a damaged file, and said as such. */
function parsed(body: string): CaseFile {
  const checked = parseCaseText(body);
  if (!checked.ok)
    throw new Error(`A kept revision is not a valid case: ${checked.issues[0]?.path} ${checked.issues[0]?.says}`);
  return checked.casefile;
}
