import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils.js';

/**
 * The canonical form of a JSON document (RFC 8785) and its SHA-256. The hash of a case is that of its canonical form,
 * so that key order and white space do not matter.
 */

/** RFC 8785 text. Throws for what JSON cannot hold: our mistake, never a user's. */
export function canonical(value: unknown): string {
  if (value === null || typeof value === 'boolean') return JSON.stringify(value);
  if (typeof value === 'number') {
    if (!Number.isFinite(value)) throw new TypeError('canonical: a number is not finite');
    return JSON.stringify(value);
  }
  if (typeof value === 'string') return JSON.stringify(value);
  if (Array.isArray(value)) return `[${value.map(canonical).join(',')}]`;
  if (typeof value !== 'object') throw new TypeError(`canonical: ${typeof value} is not JSON`);
  const entries = Object.entries(value).filter(([, child]) => child !== undefined);
  entries.sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0));
  return `{${entries.map(([key, child]) => `${JSON.stringify(key)}:${canonical(child)}`).join(',')}}`;
}

/** Lower-case hexadecimal SHA-256 of the canonical form. */
export const hashOf = (value: unknown): string => bytesToHex(sha256(utf8ToBytes(canonical(value))));
