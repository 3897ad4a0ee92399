import type { Issue } from '@/lib/casefile/issue';
import { parseCase } from '@/lib/casefile/parse';
import type { CaseFile } from '@/lib/casefile/schema';
import type { Sent } from '@/lib/session/autosave';

/** What the pages ask of the server. No function here throws for a server that refuses or cannot be reached. */

/** Browsers let a request outlive its page only up to 64 KiB. */
const KEEPALIVE_BYTES = 60_000;

/** After this long a server counts as away, ms. Asking again is harmless: a save names the revision that it goes over. */
const PATIENCE = 15_000;

export type Kept = { ok: true; id: string } | { ok: false; issues: readonly Issue[] };

export const UNREACHABLE: Issue = {
  path: '(server)',
  says: 'cannot be reached; nothing was changed. Is it still running?',
};

const casePath = (id: string): string => `/api/cases/${encodeURIComponent(id)}`;

/** What the routes answer, each some of it. */
interface Body {
  id: string;
  revision: number;
  sha256: string;
  case: CaseFile;
  error: readonly Issue[];
}

async function ask(path: string, init?: RequestInit): Promise<{ status: number; body: Body } | null> {
  try {
    const response = await fetch(path, { cache: 'no-store', signal: AbortSignal.timeout(PATIENCE), ...init });
    return { status: response.status, body: (await response.json()) as Body };
  } catch {
    return null;
  }
}

/** Saves a case over its revision `base`. */
export async function sendCase(id: string, base: number, casefile: CaseFile, leaving: boolean): Promise<Sent> {
  const body = JSON.stringify(casefile);
  const keepalive = leaving && body.length < KEEPALIVE_BYTES;
  const reply = await ask(casePath(id), { method: 'PUT', headers: { 'if-match': `"${base}"` }, body, keepalive });
  if (!reply || reply.status >= 500) return { kind: 'unreachable' };
  if (reply.status === 200) return { kind: 'saved', revision: reply.body.revision };
  if (reply.status === 412) return { kind: 'conflict', revision: reply.body.revision, sha256: reply.body.sha256 };
  if (reply.status === 410 || reply.status === 404) return { kind: 'deleted' };
  return { kind: 'refused', issues: reply.body.error };
}

/** Keeps a case as a new one. */
export async function keepNewCase(casefile: CaseFile): Promise<Kept> {
  const reply = await ask('/api/cases', { method: 'POST', body: JSON.stringify(casefile) });
  if (reply?.status === 201) return { ok: true, id: reply.body.id };
  return { ok: false, issues: reply?.body.error ?? [UNREACHABLE] };
}

/** The newest revision of a case, or null if it cannot be had. */
export async function fetchCase(id: string): Promise<{ revision: number; casefile: CaseFile } | null> {
  const reply = await ask(casePath(id));
  return reply?.status === 200 ? { revision: reply.body.revision, casefile: reply.body.case } : null;
}

/** Empty when it was done, else why not. */
export const deleteCase = (id: string): Promise<readonly Issue[]> => done(casePath(id), 'DELETE');

/** Undoes deleteCase. */
export const restoreCase = (id: string): Promise<readonly Issue[]> => done(`${casePath(id)}/restore`, 'POST');

async function done(path: string, method: string): Promise<readonly Issue[]> {
  const reply = await ask(path, { method });
  return reply?.status === 200 ? [] : (reply?.body.error ?? [UNREACHABLE]);
}

/** Reads a case file that the user chose or dropped and keeps it as a new case. */
export async function keepFile(file: File): Promise<Kept> {
  const parsed = parseCase(new Uint8Array(await file.arrayBuffer()));
  return parsed.ok ? keepNewCase(parsed.casefile) : { ok: false, issues: parsed.issues };
}
