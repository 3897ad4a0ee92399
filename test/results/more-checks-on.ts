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

/** Even depths over 1.2 m; force and stiffness of a front, invented. */
export const damage = (depth: number, forceAngle = 0) => ({
  depths: [q(depth), q(depth)],
  width: q(1.2, 0.05),
  forceAngle: q(forceAngle),
  a: q(40_000, 4000),
  b: q(600_000, 60_000),
});
const both = (a: unknown, b: unknown) => [set('damage', { A: a, B: b })];
const agreeing = both(damage(0.03), damage(0.03));

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
  {
    id: 'damageEnergy',
    level: 'caution',
    name: 'queue',
    on: both(damage(0.1), damage(0.1)),
    else: 'pass',
    off: agreeing,
  },
  {
    id: 'damageSpeed',
    level: 'caution',
    name: 'queue',
    on: both(damage(0.2), damage(0.2)),
    else: 'pass',
    off: agreeing,
  },
  { id: 'forceAngle', level: 'caution', name: 'queue', on: both(damage(0.03, 20), null), else: 'pass', off: agreeing },
  { id: 'crushIntercept', level: 'caution', name: 'queue', on: agreeing, else: 'pass', off: both(damage(0.2), null) },
  { id: 'noDamage', level: 'caution', name: 'queue', on: both(damage(0), null), else: 'pass', off: agreeing },
  { id: 'oneVehicle', level: 'caution', name: 'queue', on: both(null, damage(0.03)), else: 'pass', off: agreeing },
  {
    id: 'coasting',
    level: 'caution',
    name: 'queue',
    on: [
      set('departure.B.legs.0.share', q(0.02)),
      set('departure.B.legs.0.distance', q(9)),
      set('departure.A.legs.0.distance', q(0.01)),
    ],
    else: undefined,
  },
  {
    id: 'gradeAgainstDrag',
    level: 'caution',
    name: 'queue',
    on: [set('departure.B.legs.0.grade', q(0.15))],
    else: 'pass',
  },
  {
    id: 'driverControlled',
    level: 'caution',
    name: 'spin-straight',
    on: [set('departure.A.rest.x', q(14)), set('departure.A.rest.heading', q(0))],
    else: 'pass',
  },
  {
    id: 'restitutionRegression',
    level: 'note',
    name: 'queue',
    on: [],
    else: undefined,
    off: [set('impact.restitution', q(0.2))],
  },
  { id: 'knownSpeed', level: 'caution', name: 'queue', on: [set('approach.A.speed', q(12, 0.5))], else: 'pass' },
  {
    id: 'recorded',
    level: 'caution',
    name: 'queue',
    on: [set('recorded.A.forward', q(-6, 0.2))],
    else: 'pass',
    off: [set('recorded.A.forward', q(-2.9, 0.2))],
  },
  {
    id: 'recorderPulse',
    level: 'caution',
    name: 'queue',
    on: [set('recorded.A.forward', q(-2)), set('pulse', q(0.2))],
    else: 'pass',
    off: [set('recorded.A.forward', q(-2))],
  },
  {
    id: 'recorderResolution',
    level: 'note',
    name: 'queue',
    on: [set('recorded.B.forward', q(2.5, 0.05))],
    else: 'pass',
    off: [set('recorded.B.forward', { value: 2.5 })],
  },
  {
    id: 'recorderLateral',
    level: 'note',
    name: 'junction',
    on: [set('recorded.A.left', q(1, 0.2))],
    else: undefined,
    off: [set('recorded.A.forward', q(1, 0.2))],
  },
];
