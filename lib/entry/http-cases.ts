import type { Saved } from '@/lib/store/cases';
import { createCase, deleteCase, listCases, restoreCase, saveCase } from '@/lib/store/cases';
import { listRevisions, readCase, readRevision } from '@/lib/store/revisions';
import type { Revision } from '@/lib/store/revisions';
import type { Store } from '@/lib/store/store';
import { answer, problem, problems } from './http-answer';
import { readCaseBody } from './http-body';

/** What a route reads from its address. */
export interface Place {
  id: string;
  /** As it stands in the address. */
  revision: string;
}

const iso = (time: number): string => new Date(time).toISOString();
const tag = (revision: number): Record<string, string> => ({ etag: `"${revision}"` });

/** GET /api/cases */
export async function getCases(_request: Request, store: Store): Promise<Response> {
  const lines = await listCases(store);
  return answer(
    200,
    lines.map((line) => ({ ...line, changed: iso(line.changed) })),
  );
}

/** POST /api/cases: 201 { id, revision, sha256 } */
export async function postCase(request: Request, store: Store): Promise<Response> {
  const parsed = await readCaseBody(request);
  if (!parsed.ok) return problems(422, parsed.issues);
  const written = await createCase(store, parsed.casefile);
  return answer(201, written, { location: `/api/cases/${written.id}`, ...tag(written.revision) });
}

/** GET /api/cases/<id>: { id, revision, sha256, case } */
export const getCase = async (_request: Request, store: Store, { id }: Place): Promise<Response> =>
  revisionAnswer(await readCase(store, id), id);

/** PUT /api/cases/<id> with If-Match: "<revision>": 200 { revision, sha256 }, or 412 with the current ones. */
export async function putCase(request: Request, store: Store, { id }: Place): Promise<Response> {
  const match = request.headers.get('if-match');
  if (match === null)
    return problem(428, 'If-Match is missing: send the revision that you changed, for example If-Match: "3"');
  const parsed = await readCaseBody(request);
  if (!parsed.ok) return problems(422, parsed.issues);
  return savedAnswer(await saveCase(store, id, matchedRevision(match), parsed.casefile), id);
}

/** DELETE /api/cases/<id>; it can be undone. */
export const removeCase = async (_request: Request, store: Store, { id }: Place): Promise<Response> =>
  (await deleteCase(store, id)) ? answer(200, { id }) : noSuchCase(id);

/** POST /api/cases/<id>/restore: undoes a delete. */
export const undeleteCase = async (_request: Request, store: Store, { id }: Place): Promise<Response> =>
  (await restoreCase(store, id)) ? answer(200, { id }) : problem(404, `No deleted case ${id} is kept here.`);

/** GET /api/cases/<id>/revisions: [{ revision, sha256, created }], newest first */
export async function getRevisions(_request: Request, store: Store, { id }: Place): Promise<Response> {
  const revisions = await listRevisions(store, id);
  return revisions
    ? answer(
        200,
        revisions.map((r) => ({ ...r, created: iso(r.created) })),
      )
    : noSuchCase(id);
}

/** GET /api/cases/<id>/revisions/<n>: { id, revision, sha256, case } */
export async function getRevision(_request: Request, store: Store, { id, revision }: Place): Promise<Response> {
  const number = /^\d{1,9}$/.test(revision) ? Number(revision) : 0;
  return revisionAnswer(await readRevision(store, id, number), `${id}, revision ${revision}`);
}

/** The revision that an If-Match names; -1, which never matches, for anything but one strong tag. */
function matchedRevision(match: string): number {
  const found = /^"?(\d{1,9})"?$/.exec(match.trim());
  return found ? Number(found[1]) : -1;
}

function revisionAnswer(found: Revision | null, what: string): Response {
  if (!found) return noSuchCase(what);
  const { id, revision, sha256 } = found;
  return answer(200, { id, revision, sha256, case: found.case }, tag(revision));
}

function savedAnswer(saved: Saved, id: string): Response {
  if (saved.kind === 'unknown') return noSuchCase(id);
  if (saved.kind === 'deleted')
    return problem(410, 'The case was deleted; nothing was written. Restore it, or keep this as a new case.');
  const { revision, sha256 } = saved;
  if (saved.kind === 'saved') return answer(200, { revision, sha256 }, tag(revision));
  const says = `The case was changed meanwhile: its revision is now ${revision}. Nothing was written.`;
  return problems(412, [{ path: 'If-Match', says }], { revision, sha256 });
}

const noSuchCase = (what: string): Response => problem(404, `No case ${what} is kept here.`);
