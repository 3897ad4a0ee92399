import { describe, expect, test } from 'vitest';
import { travelToRest } from '@/lib/mechanics/spin';
import { KINDS, apart, randomTravels } from '../support/random-travels';
import { cashKarpToRest, odexToRest } from '../support/travel-peers';

/** The project's integration to rest against integrators from outside it, on the same equations of motion. */

const CENTRAL = 1e-6;
/** Short steps, so that the moment of rest is found on a cubic through both ends of the last one. */
const LONGEST_STEP = 0.02;
const DEGREE = Math.PI / 180;

describe.each(KINDS)('%s, ten random travels', (kind) => {
  const travels = randomTravels(kind, 10, 20261207);

  test("Hairer's extrapolation code comes to rest at the same place: 1 mm and 0.05 degrees", () => {
    for (const { motion, start } of travels) {
      const [ours, theirs] = [travelToRest(motion, start, CENTRAL), odexToRest(motion, start, 1e-9, LONGEST_STEP)];
      expect([ours.outcome, theirs.outcome]).toEqual(['rest', 'rest']);
      const { place, turn } = apart(ours, theirs);
      expect(place).toBeLessThan(1e-3);
      expect(turn).toBeLessThan(0.05 * DEGREE);
      expect(Math.abs(ours.time - theirs.time)).toBeLessThan(5e-3);
    }
  });

  test('so does the pair of Cash & Karp', () => {
    for (const { motion, start } of travels) {
      const { place, turn } = apart(travelToRest(motion, start, CENTRAL), cashKarpToRest(motion, start, 1e-8));
      expect(place).toBeLessThan(1e-3);
      expect(turn).toBeLessThan(0.05 * DEGREE);
    }
  });
});
