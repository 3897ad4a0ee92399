import { leastAgreeing, verdictOn } from './agreement';
import type { CheckRule } from './check';
import { recordedGiven, uncertaintyOf } from './recorded-given';
import { figure, spoken } from './words';

export const recorded: CheckRule = {
  id: 'recorded',
  source:
    'screening value: 2 and 3 combined standard uncertainties; where none is stated ±0.5 km/h and ±10 % (49 CFR 563.8, table III)',
  find({ casefile, central, bands, solution }) {
    // A fit has weighed it already: to hold it against the answer would count it twice.
    if (solution.fit) return null;
    const found = leastAgreeing(
      recordedGiven(casefile).flatMap(({ id, key, path, quantity, name }) => {
        const result = key === 'forward' ? (`${id}.deltaVForward` as const) : (`${id}.deltaVLeft` as const);
        const answer = central[result];
        if (answer === undefined) return [];
        const { value: stated } = quantity;
        return [{ path, name, stated, u: uncertaintyOf(quantity), answer, sd: bands[result]?.sd ?? 0 }];
      }),
    );
    if (!found) return null;
    const { path, name, stated, u, answer, sd } = found.worst;
    const speed = (v: number): string => spoken(casefile, v, 'speed', 1);
    return {
      ...verdictOn(found.zeta),
      says: `Compared with the answer, ${name} is ${speed(stated)} ± ${speed(u)} against ${speed(answer)} ± ${speed(sd)}: ${figure(found.zeta, 1)} combined standard uncertainties.`,
      paths: [path],
    };
  },
};
