import { VEHICLE_IDS } from '@/lib/casefile/schema';
import { leastAgreeing, verdictOn } from './agreement';
import type { CheckRule } from './check';
import { combined } from './drawn';
import { figure, spoken } from './words';

export const knownSpeed: CheckRule = {
  id: 'knownSpeed',
  source: 'screening value: 2 and 3 combined standard uncertainties (JCGM 100:2008, 5.1.2)',
  find({ casefile, central, bands, solution }) {
    // A fit has weighed it already: to hold it against the answer would count it twice.
    if (solution.fit) return null;
    const found = leastAgreeing(
      VEHICLE_IDS.flatMap((id) => {
        const quantity = casefile.approach[id].speed;
        const answer = central[`${id}.approachSpeed`];
        if (!quantity || answer === undefined) return [];
        const path = `approach.${id}.speed`;
        const sd = bands[`${id}.approachSpeed`]?.sd ?? 0;
        return [{ path, name: id, stated: quantity.value, u: combined(quantity), answer, sd }];
      }),
    );
    if (!found) return null;
    const { path, name, stated, u, answer, sd } = found.worst;
    const speed = (v: number): string => spoken(casefile, v, 'speed', 1);
    return {
      ...verdictOn(found.zeta),
      says: `The approach speed of ${name} is stated as ${speed(stated)} ± ${speed(u)} and answered as ${speed(answer)} ± ${speed(sd)}: ${figure(found.zeta, 1)} combined standard uncertainties.`,
      paths: [path],
    };
  },
};
