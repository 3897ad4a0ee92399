import { type Store, probeStore } from '@/lib/store/store';
import { answer } from './http-answer';

/** GET /api/health: 200 when the store can be written (it is, to find out); what stands against it is answered by the door. */
export async function getHealth(_request: Request, store: Store): Promise<Response> {
  await probeStore(store);
  return answer(200, { ok: true, says: 'The store can be written.' });
}
