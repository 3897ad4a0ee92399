import { type CheckRule, levelAbove } from './check';
import { recordedGiven } from './recorded-given';
import { figure, spoken } from './words';

const DEGREES_PER_RADIAN = 180 / Math.PI;
/** Change of the yaw rate, deg/s, and a distance of the sensor from the mass centre to speak of, m. */
const TURNING = 5;
const SENSOR = 0.5;

export const recorderLateral: CheckRule = {
  id: 'recorderLateral',
  source: 'screening value: 5 deg/s; a sensor away from the mass centre records the turn too (from memory)',
  find({ casefile, solution }) {
    const worst = recordedGiven(casefile)
      .filter(({ key }) => key === 'left')
      .map(({ id, path }) => ({ id, path, change: solution.central.figures[`${id}.yawRateChange`] }))
      .filter(({ change }) => Number.isFinite(change))
      .sort((p, q) => Math.abs(q.change) - Math.abs(p.change))[0];
    if (!worst) return null;
    const { id, path, change } = worst;
    const value = Math.abs(change) * DEGREES_PER_RADIAN;
    const level = levelAbove(value, { note: TURNING });
    return {
      level,
      value,
      limit: TURNING,
      says: `The yaw rate of ${id} changes by ${figure(change * DEGREES_PER_RADIAN, 0)}°/s in the contact: a sensor ${spoken(casefile, SENSOR, 'length', 1)} ahead of the mass centre records ${spoken(casefile, change * SENSOR, 'speed', 1)} more to the left.`,
      advice:
        level === 'pass'
          ? undefined
          : 'Find where the sensor sits, and enter the lateral value taken back to the mass centre.',
      paths: [path],
    };
  },
};
