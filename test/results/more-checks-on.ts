import type { Edit } from '@/lib/casefile/edit';
import { q } from '../support/build-case';
import { type CaseName, set } from '../support/check-context';

/** What turns each of the further checks on, and off again: a whole case with some things changed. */
export interface Switch {
  id: string;
  level: string;
  name: CaseName;
  on: Edit[];
  /** What it says in the case with `off` instead: a level, or undefined where it is not there. */
  else: string | undefined;
  off?: Edit[];
  /** Whether the spread is traced back to the inputs. */
  traced?: true;
}

const nothingMeasured = [set('departure.B.yawRate', null)];
const lorry = [set('vehicles.A.mass', q(6000)), set('departure.A.direction', q(4, 2))];
const slidOn = [set('impact.plane', q(70)), set('impact.slide', q(0.8))];
/** Travel known exactly, restitution not: both speeds then hang on the one impulse. */
const loose = [
  ...(['A', 'B'] as const).map((id) =>
    set(`departure.${id}.legs`, [{ distance: q(id === 'A' ? 4 : 9), friction: q(0.7), share: q(0.6), grade: q(0) }]),
  ),
  set('impact.restitution', q(0.3, 0.04)),
];

export const MORE_ON: Switch[] = [
  { id: 'energyShare', level: 'caution', name: 'junction', on: [set('departure.A.yawRate', q(-40))], else: 'pass' },
  { id: 'restitutionTests', level: 'note', name: 'queue', on: [set('impact.restitution', q(0.7))], else: 'pass' },
  { id: 'sideswipe', level: 'fail', name: 'queue', on: slidOn, else: 'pass' },
  { id: 'engagement', level: 'note', name: 'queue', on: [set('impact.A.y', q(1.3))], else: 'pass' },
  {
    id: 'leverArm',
    level: 'caution',
    name: 'queue',
    on: [set('impact.point.y', q(0.12))],
    else: 'pass',
    off: [set('impact.point.y', q(0.5))],
  },
  {
    id: 'planeShare',
    level: 'caution',
    name: 'queue',
    on: [set('impact.plane', q(90, 30))],
    else: 'pass',
    traced: true,
  },
  { id: 'heavyHeading', level: 'caution', name: 'junction', on: lorry, else: 'pass' },
  { id: 'correlated', level: 'caution', name: 'queue', on: loose, else: 'pass' },
  { id: 'rotation', level: 'caution', name: 'junction', on: nothingMeasured, else: undefined },
  { id: 'seatDeltaV', level: 'note', name: 'junction', on: [], else: undefined, off: [set('vehicles.A.seats', [])] },
];
