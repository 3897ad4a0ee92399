import { shareBeforeStart } from '@/lib/mechanics/recorder';
import type { CheckRule } from './check';
import { recordedGiven } from './recorded-given';
import { percent } from './words';

/** s */
const LONG = 0.15;

export const recorderPulse: CheckRule = {
  id: 'recorderPulse',
  source:
    'screening value: contacts of 0.15 s and longer; recording from 0.8 km/h within 20 ms on (49 CFR 563.5, from memory), haversine pulse',
  find({ casefile }) {
    const pulse = casefile.pulse?.value;
    const forward = recordedGiven(casefile).filter(({ key }) => key === 'forward');
    if (pulse === undefined || forward.length === 0) return null;
    const { id, path, quantity } = forward.toSorted(
      (p, q) => Math.abs(p.quantity.value) - Math.abs(q.quantity.value),
    )[0];
    const share = shareBeforeStart(Math.abs(quantity.value), pulse);
    const long = pulse >= LONG;
    const lost =
      share === null
        ? `a recorder would never start on what was recorded for ${id}`
        : `a recorder misses ${percent(share)} of what was recorded for ${id} before it starts`;
    return {
      level: long ? 'caution' : 'pass',
      value: pulse,
      limit: LONG,
      says: `Over a contact of ${pulse.toFixed(2)} s, shaped as a haversine, ${lost}.`,
      advice: long
        ? 'Take the recorded delta-V as a lower limit, and widen its spread upwards by what is missed.'
        : undefined,
      paths: [path, 'pulse'],
    };
  },
};
