import { defaultDeparture, drawnQuantity } from '@/lib/casefile/defaults';
import type { Edit } from '@/lib/casefile/edit';
import type { ThingId } from '@/lib/casefile/fields';
import type { CaseFile, Leg, Quantity } from '@/lib/casefile/schema';
import { sceneOf } from '@/lib/casefile/scene-of';
import { WHEELS } from '@/lib/casefile/wheels';
import { type Vec, angleOf, distance, subtract, toDegrees, unit } from '@/lib/geometry/vector';
import type { Grip } from '@/lib/scene/grip';
import { type Scene, type Which, centreOf, pathOf } from '@/lib/scene/scene';
import { cornerMove, surfaceMove } from './surface-edits';
import { tenths, wrapped } from './turn';
import { steerDrag } from './wheel-edits';

/** Drawn figures are kept to the centimetre: finer than anyone draws. */
const centimetres = (x: number): number => Math.round(x * 100) / 100;
/** Degrees that a turn clings to while Shift is held. */
const COARSE_TURN = 5;

const degreesOf = (v: Vec, coarse: boolean): number => {
  const exact = toDegrees(angleOf(v));
  return tenths(wrapped(coarse ? Math.round(exact / COARSE_TURN) * COARSE_TURN : exact));
};

const value = (path: string, to: number): Edit => ({ do: 'value', path, value: to });

/** A line has no sense: its direction lies in [0, 180). Kept to the thousandth, where sums of decimals are still clean. */
export const asLine = (degrees: number): number => Number((((degrees % 180) + 180) % 180).toFixed(3)) % 180;

/** Standard uncertainty that a drawn direction gets, deg. */
const DRAWN_DIRECTION = 3;
/** Standard uncertainty that a drawn leg gets, m. */
const DRAWN_LENGTH = 0.15;
/** Shortest leg that can be drawn, m. */
const SHORTEST = 0.05;

/**
 * The edit of the case as it was when the grip was taken, for a pointer that went from one place to another (world, m).
 * `coarse` lets directions cling to whole steps.
 */
export function dragEdit(casefile: CaseFile, grip: Grip, from: Vec, to: Vec, coarse: boolean): Edit {
  const by = subtract(to, from);
  const { impact } = casefile;
  const turn = (about: Vec): number => degreesOf(subtract(to, about), coarse);
  switch (grip.part) {
    case 'vehicle':
    case 'wheel':
      return moveEdit(`impact.${grip.which}`, impact[grip.which], by);
    case 'turn':
      return value(`impact.${grip.which}.heading`, turn(centre(casefile, grip.which)));
    case 'point':
      return moveEdit('impact.point', impact.point, by);
    case 'plane':
      return value('impact.plane', asLine(turn([impact.point.x.value, impact.point.y.value])));
    case 'approach':
      return approachEdit(casefile, grip.which, to, coarse);
    case 'end':
      return travelEdit(casefile, grip.which, to, coarse);
    case 'joint':
      return jointEdit(casefile, grip.which, grip.leg, to);
    case 'leg':
      return value(`departure.${grip.which}.direction`, turn(centre(casefile, grip.which)));
    case 'mark':
      return markEdit(casefile, grip.index, by);
    case 'steer':
      return steerDrag(casefile, sceneOf(casefile), grip.which, grip.wheel, to, coarse);
    case 'surface':
      return surfaceMove(casefile, grip.index, [centimetres(by[0]), centimetres(by[1])]);
    case 'corner':
      return cornerMove(casefile, grip.index, grip.corner, [centimetres(to[0]), centimetres(to[1])]);
    case 'rest':
    case 'restTurn':
      return restEdit(casefile, grip, by, to, coarse);
  }
}

const moveEdit = (path: string, { x, y }: { x: Quantity; y: Quantity }, by: Vec): Edit => ({
  do: 'all',
  edits: [value(`${path}.x`, centimetres(x.value + by[0])), value(`${path}.y`, centimetres(y.value + by[1]))],
});

/** Moves or turns a known rest pose. Turning goes on from the heading as written: past 360° it is a full turn and more. */
function restEdit(
  casefile: CaseFile,
  grip: Extract<Grip, { part: 'rest' | 'restTurn' }>,
  by: Vec,
  to: Vec,
  coarse: boolean,
): Edit {
  const departure = casefile.departure[grip.which];
  const at = `departure.${grip.which}.rest`;
  if (departure?.kind !== 'spin') return { do: 'all', edits: [] };
  const { x, y, heading } = departure.rest;
  if (!x || !y || !heading) return { do: 'all', edits: [] };
  if (grip.part === 'rest') return moveEdit(at, { x, y }, by);
  const pointed = degreesOf(subtract(to, [x.value, y.value]), coarse);
  return value(`${at}.heading`, tenths(heading.value + wrapped(pointed - heading.value)));
}

const centre = (casefile: CaseFile, which: Which): Vec => centreOf(sceneOf(casefile).vehicles[which]);

/** The vehicle came from `from` to where it stands. */
export function approachEdit(casefile: CaseFile, which: Which, from: Vec, coarse: boolean): Edit {
  const path = `approach.${which}.direction`;
  const direction = degreesOf(subtract(centre(casefile, which), from), coarse);
  return casefile.approach[which].direction
    ? value(path, direction)
    : { do: 'set', path, to: drawnQuantity(direction, DRAWN_DIRECTION) };
}

/** The vehicle went from where it stands to `to`: direction and, of the last leg, distance; a first leg where there was none. */
export function travelEdit(casefile: CaseFile, which: Which, to: Vec, coarse: boolean): Edit {
  const way = subtract(to, centre(casefile, which));
  const direction = degreesOf(way, coarse);
  const departure = casefile.departure[which];
  const reach = distance(way, [0, 0]);
  if (departure?.kind === 'spin') return restPlaceEdit(which, to);
  if (departure?.kind !== 'legs')
    return {
      do: 'set',
      path: `departure.${which}`,
      to: defaultDeparture(direction, centimetres(Math.max(SHORTEST, reach))),
    };
  const before = departure.legs.slice(0, -1).reduce((sum, leg) => sum + leg.distance.value, 0);
  const last = departure.legs.length - 1;
  return {
    do: 'all',
    edits: [
      value(`departure.${which}.direction`, direction),
      value(`departure.${which}.legs.${last}.distance`, centimetres(Math.max(SHORTEST, reach - before))),
    ],
  };
}

/** Where the travel is simulated, drawing it moves the rest pose. */
const restPlaceEdit = (which: Which, [x, y]: Vec): Edit => ({
  do: 'all',
  edits: [value(`departure.${which}.rest.x`, centimetres(x)), value(`departure.${which}.rest.y`, centimetres(y))],
});

/** A leg like the last one, from its end to where the pointer lies along the path; null where there is no travel yet. */
export function addLegEdit(casefile: CaseFile, which: Which, to: Vec): Edit | null {
  const departure = casefile.departure[which];
  if (departure?.kind !== 'legs') return null;
  const scene = sceneOf(casefile);
  const along = unit(scene.travel[which]?.direction.angle ?? 0);
  const way = subtract(to, pathOf(scene, which).at(-1) ?? to);
  const reach = centimetres(Math.max(SHORTEST, way[0] * along[0] + way[1] * along[1]));
  const last = departure.legs[departure.legs.length - 1];
  const entry: Leg = { ...last, distance: drawnQuantity(reach, DRAWN_LENGTH) };
  return { do: 'insert', path: `departure.${which}.legs`, index: departure.legs.length, entry };
}

/** The end of a leg moves along the path; the next leg takes up the difference. */
function jointEdit(casefile: CaseFile, which: Which, leg: number, to: Vec): Edit {
  const departure = casefile.departure[which];
  if (departure?.kind !== 'legs') return { do: 'all', edits: [] };
  const scene = sceneOf(casefile);
  const path = pathOf(scene, which);
  const along = unit(scene.travel[which]?.direction.angle ?? 0);
  const [start, end] = [path[leg], path[leg + 2]];
  const whole = distance(start, end);
  const wanted = (to[0] - start[0]) * along[0] + (to[1] - start[1]) * along[1];
  const first = centimetres(Math.min(whole - SHORTEST, Math.max(SHORTEST, wanted)));
  const at = `departure.${which}.legs`;
  return {
    do: 'all',
    edits: [value(`${at}.${leg}.distance`, first), value(`${at}.${leg + 1}.distance`, centimetres(whole - first))],
  };
}

/** A mark moves as a whole. */
export function markEdit(casefile: CaseFile, index: number, by: Vec): Edit {
  const points = casefile.scene?.marks?.[index]?.points ?? [];
  const to = points.map(([x, y]): [number, number] => [centimetres(x + by[0]), centimetres(y + by[1])]);
  return { do: 'set', path: `scene.marks.${index}.points`, to };
}

/** The contact plane drawn as a line from one place to another: through the first, along both. */
export function planeEdit(from: Vec, to: Vec, coarse: boolean): Edit {
  const turned = distance(from, to) > 0.1 ? [value('impact.plane', asLine(degreesOf(subtract(to, from), coarse)))] : [];
  const placed = [value('impact.point.x', centimetres(from[0])), value('impact.point.y', centimetres(from[1]))];
  return { do: 'all', edits: [...placed, ...turned] };
}

/** What is selected when a grip is taken: a travel of one leg as a whole. */
export function thingOf(grip: Grip, scene: Scene): ThingId {
  switch (grip.part) {
    case 'vehicle':
    case 'turn':
      return `vehicle.${grip.which}`;
    case 'point':
      return 'contact.point';
    case 'plane':
      return 'contact.plane';
    case 'approach':
      return `approach.${grip.which}`;
    case 'joint':
    case 'leg':
      return scene.travel[grip.which]?.legs.length === 1 ? `departure.${grip.which}` : `leg.${grip.which}.${grip.leg}`;
    case 'rest':
    case 'restTurn':
      return `rest.${grip.which}`;
    case 'wheel':
    case 'steer':
      return `wheel.${grip.which}.${WHEELS[grip.wheel].id}`;
    case 'mark':
      return `mark.${grip.index}`;
    case 'surface':
    case 'corner':
      return `surface.${grip.index}`;
    case 'end':
      return `departure.${grip.which}`;
  }
}

/** What a gesture with a grip is called, for undo. */
export function labelOfGrip(grip: Grip): string {
  switch (grip.part) {
    case 'vehicle':
    case 'wheel':
      return `move ${grip.which}`;
    case 'turn':
      return `turn ${grip.which}`;
    case 'point':
      return 'move the contact point';
    case 'plane':
      return 'turn the contact plane';
    case 'approach':
      return `direction of approach of ${grip.which}`;
    case 'joint':
      return `legs of ${grip.which}`;
    case 'leg':
      return `direction of travel of ${grip.which}`;
    case 'rest':
      return `move ${grip.which} at rest`;
    case 'restTurn':
      return `turn ${grip.which} at rest`;
    case 'steer':
      return `steer the ${WHEELS[grip.wheel].words} wheel of ${grip.which}`;
    case 'mark':
      return 'move a mark';
    case 'surface':
      return `move surface ${grip.index + 1}`;
    case 'corner':
      return `shape surface ${grip.index + 1}`;
    case 'end':
      return `travel of ${grip.which}`;
  }
}
