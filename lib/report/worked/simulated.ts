import type { CaseFile, Departure } from '@/lib/casefile/schema';
import type { Result } from '@/lib/results/result';

/**
 * The case as the worked lines take it: where the travel of a vehicle is simulated, its separation is given, as a travel
 * without legs that begins with what the simulation found. The steps of a simulation cannot be written out by hand.
 */
export function withSimulatedGiven(casefile: CaseFile, central: Result['central']): CaseFile {
  const given = (id: 'A' | 'B'): Departure | null | undefined =>
    casefile.departure[id]?.kind === 'spin' ? separationOf(id, central) : casefile.departure[id];
  return { ...casefile, departure: { A: given('A'), B: given('B') } };
}

const separationOf = (id: 'A' | 'B', central: Result['central']): Departure => ({
  kind: 'legs',
  direction: { value: central[`${id}.departureDirection`] ?? 0 },
  yawRate: { value: central[`${id}.departureYawRate`] },
  endSpeed: { value: central[`${id}.departureSpeed`] },
  legs: [],
});
