import { VEHICLE_IDS } from '@/lib/casefile/schema';
import type { CheckRule } from './check';
import { stretchesOf } from './travel-drag';
import { spoken } from './words';

/** m travelled at less than this drag. */
const LIMIT = 3;
const DRAG = 0.05;

export const coasting: CheckRule = {
  id: 'coasting',
  source: 'screening value: more than 3 m at a drag below 0.05; creep and idling push that hard (from memory)',
  find({ casefile }) {
    const slow = stretchesOf(casefile).filter(({ drag }) => drag < DRAG);
    const worst = VEHICLE_IDS.map((id) => {
      const own = slow.filter((stretch) => stretch.id === id);
      return { id, paths: own.map(({ path }) => path), value: own.reduce((sum, { distance }) => sum + distance, 0) };
    }).sort((p, q) => q.value - p.value)[0];
    const { id, value, paths } = worst;
    if (value === 0) return null;
    const bad = value > LIMIT;
    return {
      level: bad ? 'caution' : 'pass',
      value,
      limit: LIMIT,
      says: `Vehicle ${id} rolls ${spoken(casefile, value, 'length', 1)} at a drag below ${DRAG}.`,
      advice: bad
        ? 'Ask whether a gear was engaged, the engine pushed or slowed, or the driver braked at the end: at so little drag each decides the speed.'
        : undefined,
      paths,
    };
  },
};
