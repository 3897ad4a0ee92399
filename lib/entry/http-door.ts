import { isStoreTrouble } from '@/lib/store/database';
import type { Store } from '@/lib/store/store';
import { problem } from './http-answer';
import type { Place } from './http-cases';
import { refused } from './http-guard';
import { theStore } from './the-store';

type Handler = (request: Request, store: Store, place: Place) => Promise<Response>;
type Context = { params: Promise<Partial<Place>> };

/** A route over the store: who may ask, where the store is, and what is said when something breaks. */
export const overStore =
  (handle: Handler, open: () => Promise<Store> = theStore) =>
  (request: Request, context?: Context): Promise<Response> =>
    guarded(request, async () => {
      const { id = '', revision = '' } = (await context?.params) ?? {};
      return handle(request, await open(), { id, revision });
    });

/** A route that keeps nothing. */
export const plain =
  (handle: (request: Request) => Promise<Response>) =>
  (request: Request): Promise<Response> =>
    guarded(request, () => handle(request));

async function guarded(request: Request, handle: () => Promise<Response>): Promise<Response> {
  try {
    return refused(request) ?? (await handle());
  } catch (error) {
    if (request.signal.aborted) return problem(408, 'The request was given up before it was answered.');
    console.error(error);
    return isStoreTrouble(error)
      ? problem(
          503,
          'The cases on disk cannot be reached or written; nothing was saved. Is the disk full, or the folder read-only?',
          '(store)',
        )
      : problem(500, 'The server made a mistake; nothing was saved. Its log says more.', '(server)');
  }
}
