import type { Issue } from '@/lib/casefile/issue';

/** The path of a problem that lies in the request, not in a case. */
export const REQUEST = '(request)';

/** A JSON answer that nobody keeps a copy of. */
export const answer = (status: number, body: unknown, headers: Record<string, string> = {}): Response =>
  new Response(JSON.stringify(body), {
    status,
    headers: { 'content-type': 'application/json', 'cache-control': 'no-store', ...headers },
  });

/** Problems in the one shape that every route answers: `{ error: [{ path, says }] }`. */
export const problems = (status: number, error: readonly Issue[], more: Record<string, unknown> = {}): Response =>
  answer(status, { error, ...more });

export const problem = (status: number, says: string, path = REQUEST): Response => problems(status, [{ path, says }]);
