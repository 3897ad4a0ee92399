import { MOST_PARTICLES } from './defaults';
import type { Issue } from './issue';
import type { CaseFile, Departure, Method, Quantity, VehicleId } from './schema';
import { VEHICLE_IDS } from './schema';

/** What the chosen method lacks, as problems of the case. Empty when it can be tried. */
export function needsOf(casefile: CaseFile, method: Method = casefile.analysis.method): Issue[] {
  const lacking = [...BY_METHOD[method](casefile)];
  if (casefile.analysis.contact === 'lasting') {
    if (method === 'restitution')
      lacking.push({
        path: 'analysis.contact',
        says: 'the method restitution has no lasting contact: choose instant, or another method',
      });
    if (!casefile.pulse) lacking.push({ path: 'pulse', says: 'needed by the contact lasting' });
  }
  return lacking;
}

const needed = (path: string, method: Method, why = ''): Issue => ({
  path,
  says: `needed by the method ${method}${why}`,
});

function restIssues(id: VehicleId, departure: Departure | null | undefined, method: Method): Issue[] {
  if (departure?.kind !== 'spin') return [];
  return (['x', 'y', 'heading'] as const)
    .filter((key) => !departure.rest[key])
    .map((key) => needed(`departure.${id}.rest.${key}`, method));
}

const BY_METHOD: Record<Method, (casefile: CaseFile) => Issue[]> = {
  directions: (casefile) =>
    VEHICLE_IDS.flatMap((id) => [
      ...(casefile.approach[id].direction ? [] : [needed(`approach.${id}.direction`, 'directions')]),
      ...(casefile.departure[id] ? [] : [needed(`departure.${id}`, 'directions')]),
      ...restIssues(id, casefile.departure[id], 'directions'),
    ]),

  restitution: (casefile) => [
    ...(casefile.impact.restitution ? [] : [needed('impact.restitution', 'restitution')]),
    ...(casefile.impact.impulseRatio ? [] : [needed('impact.impulseRatio', 'restitution')]),
    ...VEHICLE_IDS.flatMap((id) => {
      const departure = casefile.departure[id];
      if (!departure) return [needed(`departure.${id}`, 'restitution')];
      if (departure.kind === 'legs' && !departure.yawRate) return [needed(`departure.${id}.yawRate`, 'restitution')];
      return restIssues(id, departure, 'restitution');
    }),
  ],

  fit: (casefile) => {
    const { draws } = casefile.analysis;
    if (typeof draws === 'number' && draws > MOST_PARTICLES)
      return [
        { path: 'analysis.draws', says: `must be at most ${MOST_PARTICLES} with the method fit, found ${draws}` },
      ];
    const observations = observationsOf(casefile);
    if (observations.length === 0)
      return [{ path: 'departure', says: 'the method fit needs at least one observation' }];
    return observations
      .filter(({ quantities }) => quantities.every((q) => !q.spread || q.spread.shape === 'fixed'))
      .map(({ path }) => ({ path, says: 'needs a spread: an observation without one would weigh infinitely' }));
  },
};

interface Observation {
  path: string;
  /** The observation has a spread if any of these has one. */
  quantities: Quantity[];
}

function departureObservations(id: VehicleId, departure: Departure | null | undefined): Observation[] {
  if (!departure) return [];
  const at = `departure.${id}`;
  const single = (path: string, q: Quantity | null | undefined): Observation[] =>
    q ? [{ path, quantities: [q] }] : [];
  if (departure.kind === 'spin')
    return (['x', 'y', 'heading'] as const).flatMap((key) => single(`${at}.rest.${key}`, departure.rest[key]));
  const travel = departure.legs.flatMap((leg) => [leg.distance, leg.friction, leg.share, leg.grade]);
  return [
    ...single(`${at}.direction`, departure.direction),
    ...single(`${at}.yawRate`, departure.yawRate),
    { path: `${at}.legs`, quantities: [...travel, departure.endSpeed] },
  ];
}

/** What the method fit weighs: each observation once, with the path that its problem is reported at. */
function observationsOf(casefile: CaseFile): Observation[] {
  const { departure, recorded, restOffset, impact, damage } = casefile;
  const found = VEHICLE_IDS.flatMap((id) => departureObservations(id, departure[id]));
  const add = (path: string, q: Quantity | null | undefined): void => {
    if (q) found.push({ path, quantities: [q] });
  };
  for (const id of VEHICLE_IDS) {
    add(`recorded.${id}.forward`, recorded?.[id]?.forward);
    add(`recorded.${id}.left`, recorded?.[id]?.left);
  }
  for (const key of ['x', 'y', 'heading'] as const) add(`restOffset.${key}`, restOffset?.[key]);
  if (casefile.analysis.contact === 'lasting') add('impact.slide', impact.slide);
  const [damageA, damageB] = [damage?.A, damage?.B];
  if (damageA && damageB)
    found.push({
      path: 'damage',
      quantities: [damageA, damageB].flatMap((d) => [...d.depths, d.width, d.forceAngle, d.a, d.b]),
    });
  return found;
}
