import type { CaseFile, LegsDeparture } from '@/lib/casefile/schema';
import type { Result } from '@/lib/results/result';
import { RESULT_NAMES, isDirection } from '@/lib/results/names';
import { contactFrame } from './contact-frame';
import { directionsLines } from './directions';
import type { RoadGiven } from './road';
import { restitutionLines } from './restitution';
import { type Sheet, newSheet } from './sheet';
import { speedChangeLines } from './speed-change';
import { separationVelocity } from './travel';

/**
 * The whole calculation at the central values, every line with its numbers put in: an independent second reckoning in
 * plain arithmetic, so that its ends can be held against the engine's. Null where the method or the travel has no closed
 * form to write out.
 */
export function workedCalculation(casefile: CaseFile, method: Result['method'], road: RoadGiven | null): Sheet | null {
  const { A, B } = casefile.departure;
  if (A?.kind !== 'legs' || B?.kind !== 'legs' || method === 'fit') return null;
  const sheet = newSheet();
  const frame = contactFrame(casefile, sheet);
  const travel = (id: 'A' | 'B') => separationVelocity(casefile.departure[id] as LegsDeparture, id, sheet);
  const after = { A: travel('A'), B: travel('B') };
  const motions =
    method === 'directions'
      ? directionsLines(casefile, frame, after, road, sheet)
      : restitutionLines(casefile, frame, after, sheet);
  speedChangeLines(casefile, frame, motions, sheet);
  return sheet;
}

/** The largest difference between the ends of the worked lines and the engine's central values, relative to max(1, |value|). */
export function largestDifference(sheet: Sheet, central: Result['central']): number {
  const differences = RESULT_NAMES.map((name) => {
    const [end, value] = [sheet.ends[name], central[name]];
    if (end === undefined || value === undefined) return 0;
    const apart = Math.abs(end - value);
    return (isDirection(name) ? Math.min(apart, 360 - apart) : apart) / Math.max(1, Math.abs(value));
  });
  return Math.max(...differences);
}
