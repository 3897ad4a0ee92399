import type { ThingId } from '@/lib/casefile/fields';
import type { CaseFile, VehicleId } from '@/lib/casefile/schema';
import { surfaceCopy, surfaceRemoval } from './surface-edits';
import type { NamedEdit } from './named-edit';

/** How far a copy of a mark stands off, m. */
const BESIDE = 0.5;

/** What Delete takes away; null for what every case has. */
export function deletion(casefile: CaseFile, thing: ThingId): NamedEdit | null {
  const [kind, which = '', k = ''] = thing.split('.');
  if (kind === 'mark')
    return { label: 'delete a mark', edit: { do: 'remove', path: 'scene.marks', index: Number(which) } };
  if (kind === 'surface') return surfaceRemoval(casefile, Number(which));
  if (kind === 'approach' && casefile.approach[which as VehicleId].direction)
    return { label: `delete the approach of ${which}`, edit: { do: 'set', path: `${thing}.direction`, to: null } };
  const departure = casefile.departure[which as VehicleId];
  if (!departure) return null;
  const whole: NamedEdit = {
    label: `delete the travel of ${which}`,
    edit: { do: 'set', path: `departure.${which}`, to: null },
  };
  if (kind === 'departure' || kind === 'rest') return whole;
  if (kind !== 'leg' || departure.kind !== 'legs') return null;
  if (departure.legs.length === 1) return whole;
  return {
    label: `delete leg ${Number(k) + 1} of ${which}`,
    edit: { do: 'remove', path: `departure.${which}.legs`, index: Number(k) },
  };
}

/** Why Delete does nothing, for what every case has. */
export function whyKept(thing: ThingId): string | null {
  if (thing.startsWith('vehicle.')) return 'A case has two vehicles: they can be moved and changed, not deleted';
  if (thing.startsWith('wheel.')) return 'A vehicle has four wheels: they can be set, not deleted';
  return thing.startsWith('contact.') ? 'Every contact has a point and a plane: they can be moved, not deleted' : null;
}

/** What Duplicate copies: a leg, behind itself, or a mark or a surface, beside itself. */
export function duplication(casefile: CaseFile, thing: ThingId): NamedEdit | null {
  const [kind, which = '', k = ''] = thing.split('.');
  if (kind === 'surface') return surfaceCopy(casefile, Number(which));
  if (kind === 'mark') return markCopy(casefile, Number(which));
  const departure = casefile.departure[which as VehicleId];
  if ((kind !== 'leg' && kind !== 'departure') || departure?.kind !== 'legs') return null;
  const index = kind === 'leg' ? Number(k) : departure.legs.length - 1;
  return {
    label: `duplicate leg ${index + 1} of ${which}`,
    edit: { do: 'insert', path: `departure.${which}.legs`, index: index + 1, entry: departure.legs[index] },
  };
}

function markCopy(casefile: CaseFile, index: number): NamedEdit | null {
  const mark = casefile.scene?.marks?.[index];
  if (!mark) return null;
  const points = mark.points.map(([x, y]): [number, number] => [x + BESIDE, y - BESIDE]);
  return {
    label: 'duplicate a mark',
    edit: { do: 'insert', path: 'scene.marks', index: index + 1, entry: { ...mark, points } },
  };
}
