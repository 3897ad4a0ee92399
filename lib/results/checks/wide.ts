import { resultLabel } from '../names';
import { type CheckRule, levelAbove } from './check';

const CAUTION = 1;
const CONSIDERED = ['A.approachSpeed', 'B.approachSpeed', 'A.deltaV', 'B.deltaV', 'closingSpeed'] as const;

export const wide: CheckRule = {
  id: 'wide',
  source: 'contract of the model: a coverage interval wider than the answer itself',
  find({ bands, coverage }) {
    const ratios = CONSIDERED.flatMap((name) => {
      const band = bands[name];
      return band && Math.abs(band.median) > 0 ? [{ name, value: (band.high - band.low) / Math.abs(band.median) }] : [];
    });
    if (ratios.length === 0) return null;
    const { name, value } = ratios.sort((p, q) => q.value - p.value)[0];
    const level = levelAbove(value, { caution: CAUTION });
    const which = `The ${(100 * coverage).toFixed(0)} % interval of the ${resultLabel(name)}`;
    return {
      level,
      value,
      limit: CAUTION,
      says:
        level === 'pass'
          ? `${which}, the widest, is ${value.toFixed(2)} times the answer.`
          : `${which} is wider than the answer itself (${value.toFixed(1)} times).`,
      advice:
        level === 'pass'
          ? undefined
          : 'Look in the ledger which input carries most of the spread, and measure that one better.',
    };
  },
};
