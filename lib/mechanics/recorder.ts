import { haversineShare } from './pulse';

/** What an event data recorder in the sense of 49 CFR 563 can tell of a speed change. SI. */

const KMH = 1 / 3.6;

/** Steps of a recorded speed change, m/s, and its accuracy as a share (49 CFR 563.8, table III). */
export const RESOLUTION = KMH;
const ACCURACY = 0.1;

/** Standard uncertainty of a recorded speed change, m/s: half a step and the accuracy as limits, both rectangular (JCGM 100:2008, 4.3.7). */
export const recorderUncertainty = (deltaV: number): number =>
  Math.sqrt(((RESOLUTION / 2) ** 2 + (ACCURACY * deltaV) ** 2) / 3);

/** Time zero: the first time from which on the speed changes by more than this, m/s, within this time, s (49 CFR 563.5, from memory). */
const START = 0.8 * KMH;
const WINDOW = 0.02;
const HALVINGS = 60;

/**
 * Share of the speed change (m/s) of a haversine pulse (s) that is over before time zero; null where the recorder never
 * starts. The gain within the window grows until the window lies in the middle of the pulse.
 */
export function shareBeforeStart(deltaV: number, duration: number): number | null {
  const gain = (t: number): number => deltaV * (haversineShare((t + WINDOW) / duration) - haversineShare(t / duration));
  let [early, late] = [0, Math.max(0, (duration - WINDOW) / 2)];
  if (!(gain(late) > START)) return null;
  if (gain(0) > START) return 0;
  for (let i = 0; i < HALVINGS; i++) {
    const middle = (early + late) / 2;
    if (gain(middle) > START) late = middle;
    else early = middle;
  }
  return haversineShare(late / duration);
}
