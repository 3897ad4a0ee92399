import type { CaseFile, VehicleId } from '@/lib/casefile/schema';
import { NOTHING, printedBand, reachesZero, unitText } from '@/lib/report/numbers';
import { type ResultName, resultDimension } from '@/lib/results/names';
import type { Result } from '@/lib/results/result';
import type { UnitSystem } from '@/lib/units/dimension';

/** Results as the answer speaks of them: rounded as in the report, in display units. */

export const vehicleOf = (name: ResultName): VehicleId | null =>
  (/^([AB])\./.exec(name)?.[1] as VehicleId | null) ?? null;

export const unitsShown = (casefile: CaseFile): UnitSystem => casefile.display?.units ?? 'metric';

export interface Said {
  /** Where the interval reaches down to 0 the figure is its upper end, and the interval says the median. */
  bound?: 'at most';
  /** «26.6». */
  figure: string;
  unit: string;
  /** «23.9 to 29.4». */
  interval: string;
}

/** Median and interval of a result; null where it has none. */
export function said(result: Result, name: ResultName, units: UnitSystem): Said | null {
  const band = result.bands[name];
  if (!band) return null;
  const dimension = resultDimension(name);
  const { median, low, high, shortest } = printedBand(band, undefined, dimension, units);
  const unit = unitText(dimension, units);
  if (band.low === band.high) return { figure: median, unit, interval: 'no spread' };
  if (dimension === 'speed' && reachesZero(band))
    return { bound: 'at most', figure: shortest[1], unit, interval: `median ${median}` };
  return { figure: median, unit, interval: `${low} to ${high}` };
}

/** «26.6 km/h, 23.9 to 29.4», for reading out; a dash where there is none. */
export function spokenResult(result: Result, name: ResultName, units: UnitSystem): string {
  const found = said(result, name, units);
  return found ? `${found.bound ?? ''} ${found.figure} ${found.unit}, ${found.interval}`.trim() : NOTHING;
}
