import canonicalize from 'canonicalize';
import fc from 'fast-check';
import { expect, test } from 'vitest';
import { canonical, hashOf } from '@/lib/casefile/canonical';

const seeded = { seed: 20261201, numRuns: 1000 };

test('the canonical form is that of a general RFC 8785 library (canonicalize)', () => {
  fc.assert(
    fc.property(fc.jsonValue({ maxDepth: 4 }), (value) => canonical(value) === canonicalize(value)),
    seeded,
  );
});

test('the order of keys does not matter to the hash', () => {
  fc.assert(
    fc.property(fc.dictionary(fc.string(), fc.jsonValue()), (object) => {
      const turned = Object.fromEntries(Object.entries(object).reverse());
      return hashOf(turned) === hashOf(object);
    }),
    seeded,
  );
});

test('SHA-256 of the canonical form of a known document', () => {
  // sha256 of the two bytes {} (computed with OpenSSL 3).
  expect(hashOf({})).toBe('44136fa355b3678a1146ad16f7e8649e94fb4fc21fe77e8310c060f61caaff8a');
});

test('what JSON cannot hold is our mistake', () => {
  expect(() => canonical(NaN)).toThrow('not finite');
  expect(() => canonical(() => 1)).toThrow('not JSON');
});
