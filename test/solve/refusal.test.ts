import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { parseCase } from '@/lib/casefile/parse';
import { readEvidence } from '@/lib/evidence/read-evidence';
import { solveCentral } from '@/lib/solve/central';
import { refusalOf } from '@/lib/solve/refusal';

test('a rest pose that no search met is refused with its path and the nearest miss', () => {
  const parsed = parseCase(readFileSync('test/cases/spin-straight.case.json'));
  if (!parsed.ok) throw new Error('the case is not valid');
  const central = solveCentral(readEvidence(parsed.casefile, 'restitution', 1));
  expect(refusalOf(central)).toBeNull();
  const found = central.spins.B;
  const nearest = found?.separations[0];
  if (!found || !nearest) throw new Error('nothing was found');
  const missed = { ...found, separations: [], otherTurns: [], nearest: { ...nearest, met: false, miss: 0.42 } };
  const refusal = refusalOf({ ...central, spins: { ...central.spins, B: missed } });
  expect(refusal?.path).toBe('departure.B.rest');
  expect(refusal?.says).toMatch(/nearest that was found misses it by 0\.42/);
});
