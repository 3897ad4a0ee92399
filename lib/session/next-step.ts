import { DEFAULT_SOURCE } from '@/lib/casefile/defaults';
import { needsOf } from '@/lib/casefile/needs';
import { type CaseFile, VEHICLE_IDS } from '@/lib/casefile/schema';

/** What to draw next, in a line; null when the method has all that it needs. */
export function nextStep(casefile: CaseFile): string | null {
  const lacking = new Set(needsOf(casefile).map(({ path }) => path));
  if (lacking.size === 0) return null;
  const { impact, approach, departure } = casefile;
  const begun = VEHICLE_IDS.some((id) => approach[id].direction || departure[id]);
  const isDefault = ({ source }: { source?: string }): boolean => source === DEFAULT_SOURCE;
  if (!begun && VEHICLE_IDS.every((id) => isDefault(impact[id].x) && isDefault(impact[id].heading)))
    return 'Next: drag A and B to where they met; turn them by the handle ahead of the nose';
  if (!begun && isDefault(impact.plane) && isDefault(impact.point.x))
    return 'Next: draw the line in which the bodies met, with the contact plane tool (P)';
  for (const id of VEHICLE_IDS)
    if (lacking.has(`approach.${id}.direction`)) return `Next: draw where ${id} came from, with the approach tool (A)`;
  for (const id of VEHICLE_IDS)
    if (lacking.has(`departure.${id}`)) return `Next: draw where ${id} came to rest, with the travel tool (T)`;
  return 'Next: the ledger says what the method still needs';
}
