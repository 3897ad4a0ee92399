import { recorderUncertainty } from '@/lib/mechanics/recorder';
import type { CheckRule } from './check';
import { recordedGiven, uncertaintyOf } from './recorded-given';
import { spoken } from './words';

export const recorderResolution: CheckRule = {
  id: 'recorderResolution',
  source: 'steps of 1 km/h and ±10 % (49 CFR 563.8, table III), taken as rectangular',
  find({ casefile }) {
    const worst = recordedGiven(casefile)
      .map(({ path, name, quantity }) => ({
        path,
        name,
        value: uncertaintyOf(quantity),
        limit: recorderUncertainty(quantity.value),
      }))
      .sort((p, q) => p.value / p.limit - q.value / q.limit)[0];
    if (!worst) return null;
    const { path, name, value, limit } = worst;
    const narrow = value < limit;
    const speed = (v: number): string => spoken(casefile, v, 'speed', 2);
    return {
      level: narrow ? 'note' : 'pass',
      value,
      limit,
      says: `The standard uncertainty of ${name} is ${speed(value)}; resolution and accuracy of a recorder allow ${speed(limit)}${narrow ? ' and no less.' : '.'}`,
      advice: narrow ? 'Widen the spread, or say what makes this recorder better than the regulation asks.' : undefined,
      paths: [path],
    };
  },
};
