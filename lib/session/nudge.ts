import type { Edit } from '@/lib/casefile/edit';
import type { ThingId } from '@/lib/casefile/fields';
import type { CaseFile, Quantity, VehicleId } from '@/lib/casefile/schema';
import type { WheelId } from '@/lib/casefile/wheels';
import type { Vec } from '@/lib/geometry/vector';
import { asLine, markEdit } from './drag';
import { surfaceMove } from './surface-edits';
import { wrapped } from './turn';
import { wheelNudge } from './wheel-edits';

/** A step in the world (m) and a turn (deg, counter-clockwise). */
interface Nudge {
  step: Vec;
  turn: number;
}

/** Sums of steps are kept to a tenth of a millimetre and a thousandth of a degree, so that 0.1 + 0.2 stays 0.3. */
const tidy = (x: number, digits: number): number => Number(x.toFixed(digits));

const shift = (path: string, { value }: Quantity, by: number): Edit[] =>
  by === 0 ? [] : [{ do: 'value', path, value: tidy(value + by, 4) }];

const turned = (path: string, { value }: Quantity, by: number): Edit[] =>
  by === 0 ? [] : [{ do: 'value', path, value: wrapped(tidy(value + by, 3)) }];

const placed = (path: string, at: { x: Quantity; y: Quantity }, [dx, dy]: Vec): Edit[] => [
  ...shift(`${path}.x`, at.x, dx),
  ...shift(`${path}.y`, at.y, dy),
];

/** The edit that nudges a thing; null where it cannot be moved or turned that way. */
export function nudgeEdit(casefile: CaseFile, thing: ThingId, step: Vec, turn: number): Edit | null {
  const edits = nudges(casefile, thing, { step, turn });
  return edits.length === 0 ? null : { do: 'all', edits };
}

function nudges(casefile: CaseFile, thing: ThingId, by: Nudge): Edit[] {
  const [kind, which, k] = thing.split('.') as [string, VehicleId, string?];
  switch (kind) {
    case 'vehicle':
      return vehicleNudge(casefile, which, by);
    case 'contact':
      return contactNudge(casefile, by);
    case 'approach': {
      const { direction } = casefile.approach[which];
      return direction ? turned(`approach.${which}.direction`, direction, by.turn) : [];
    }
    case 'rest':
      return restNudge(casefile, which, by);
    case 'wheel':
      return wheelNudge(casefile, which, k as WheelId, by.step, by.turn);
    case 'surface':
      return by.step[0] === 0 && by.step[1] === 0 && by.turn === 0
        ? []
        : [surfaceMove(casefile, Number(which), by.step, by.turn)];
    case 'mark':
      return by.step[0] === 0 && by.step[1] === 0 ? [] : [markEdit(casefile, Number(which), by.step)];
    default:
      return travelNudge(casefile, which, kind === 'leg' ? Number(k) : null, by);
  }
}

function vehicleNudge({ impact }: CaseFile, which: VehicleId, { step, turn }: Nudge): Edit[] {
  const pose = impact[which];
  return [...placed(`impact.${which}`, pose, step), ...turned(`impact.${which}.heading`, pose.heading, turn)];
}

function contactNudge({ impact }: CaseFile, { step, turn }: Nudge): Edit[] {
  const { point, plane } = impact;
  const line: Edit = { do: 'value', path: 'impact.plane', value: asLine(tidy(plane.value + turn, 3)) };
  return [...placed('impact.point', point, step), ...(turn === 0 ? [] : [line])];
}

function restNudge({ departure }: CaseFile, which: VehicleId, { step, turn }: Nudge): Edit[] {
  const travel = departure[which];
  if (travel?.kind !== 'spin') return [];
  const { x, y, heading } = travel.rest;
  const at = `departure.${which}.rest`;
  const turns: Edit[] =
    heading && turn !== 0 ? [{ do: 'value', path: `${at}.heading`, value: tidy(heading.value + turn, 3) }] : [];
  return [...(x && y ? placed(at, { x, y }, step) : []), ...turns];
}

/** Right and up lengthen a leg (the last one where the whole travel is meant), left and down shorten it; turns turn the whole travel. */
function travelNudge({ departure }: CaseFile, which: VehicleId, leg: number | null, { step, turn }: Nudge): Edit[] {
  const travel = departure[which];
  if (travel?.kind !== 'legs') return [];
  const index = leg ?? travel.legs.length - 1;
  const distance = travel.legs[index]?.distance;
  if (!distance) return [];
  const by = Math.max(step[0] + step[1], -distance.value);
  return [
    ...shift(`departure.${which}.legs.${index}.distance`, distance, by),
    ...turned(`departure.${which}.direction`, travel.direction, turn),
  ];
}
