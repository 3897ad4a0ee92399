import { DOCUMENT } from '@/lib/casefile/issue';
import { type Parsed, MAX_BYTES, parseCase } from '@/lib/casefile/parse';

/** How much of a body that is too long is read on and thrown away, so that its sender gets to hear the answer. */
const DRAIN = 64 * 1024 * 1024;

/** Reads a case from a request. What is too long is cut off while it arrives and never held whole. */
export async function readCaseBody(request: Request): Promise<Parsed> {
  const bytes = await readBytes(request);
  if (bytes) return parseCase(bytes);
  return {
    ok: false,
    issues: [{ path: DOCUMENT, says: `is longer than ${MAX_BYTES} bytes (8 MiB); no more are read` }],
  };
}

/** The bytes of a body, or null if there are more than MAX_BYTES. */
async function readBytes(request: Request): Promise<Uint8Array | null> {
  if (!request.body) return new Uint8Array();
  const chunks: Uint8Array[] = [];
  let length = 0;
  const reader = request.body.getReader();
  for (let next = await reader.read(); !next.done; next = await reader.read()) {
    length += next.value.byteLength;
    if (length > DRAIN) {
      await reader.cancel();
      break;
    }
    if (length <= MAX_BYTES) chunks.push(next.value);
    else chunks.length = 0;
  }
  return length > MAX_BYTES ? null : joined(chunks, length);
}

function joined(chunks: readonly Uint8Array[], length: number): Uint8Array {
  const bytes = new Uint8Array(length);
  let at = 0;
  for (const chunk of chunks) {
    bytes.set(chunk, at);
    at += chunk.byteLength;
  }
  return bytes;
}
