import type { Dimension } from '@/lib/units/dimension';

/** The names of the results, their dimensions and their words. Speeds m/s, angles deg, yaw rates deg/s, energy J, impulse N s. */

const VEHICLE_RESULTS = {
  approachSpeed: ['speed', 'approach speed'],
  approachDirection: ['angle', 'direction of approach'],
  approachYawRate: ['yawRate', 'yaw rate before contact'],
  departureSpeed: ['speed', 'separation speed'],
  departureDirection: ['angle', 'direction of separation'],
  departureYawRate: ['yawRate', 'yaw rate after contact'],
  deltaV: ['speed', 'delta-V'],
  deltaVForward: ['speed', 'delta-V forward'],
  deltaVLeft: ['speed', 'delta-V to the left'],
  deltaVDirection: ['angle', 'direction of delta-V in vehicle axes'],
  meanAcceleration: ['acceleration', 'mean acceleration'],
  damageEnergy: ['energy', 'damage energy'],
} as const;

const PAIR_RESULTS = {
  closingSpeed: ['speed', 'closing speed at the contact point'],
  slidingSpeed: ['speed', 'sliding speed at the contact point'],
  restitution: ['ratio', 'restitution'],
  impulseRatio: ['ratio', 'impulse ratio'],
  impulse: ['impulse', 'impulse'],
  energyLost: ['energy', 'energy lost'],
  damageClosingSpeed: ['speed', 'closing speed from damage'],
} as const;

export type VehicleResult = keyof typeof VEHICLE_RESULTS;
export type PairResult = keyof typeof PAIR_RESULTS;
export type ResultName = `A.${VehicleResult}` | `B.${VehicleResult}` | PairResult;

const vehicleKeys = Object.keys(VEHICLE_RESULTS) as VehicleResult[];
const pairKeys = Object.keys(PAIR_RESULTS) as PairResult[];

/** All result names, in the order of the contract: A, B, pair. */
export const RESULT_NAMES: readonly ResultName[] = [
  ...vehicleKeys.map((key) => `A.${key}` as const),
  ...vehicleKeys.map((key) => `B.${key}` as const),
  ...pairKeys,
];

/** The results whose spread is traced back to the inputs, and that the screen and the report lead with. */
export const HEADLINES = [
  'A.approachSpeed',
  'B.approachSpeed',
  'A.deltaV',
  'B.deltaV',
  'closingSpeed',
  'restitution',
  'energyLost',
] as const satisfies readonly ResultName[];

const entry = (name: ResultName): readonly [Dimension, string] => {
  const vehicle = /^[AB]\.(.+)$/.exec(name);
  return vehicle ? VEHICLE_RESULTS[vehicle[1] as VehicleResult] : PAIR_RESULTS[name as PairResult];
};

export const resultDimension = (name: ResultName): Dimension => entry(name)[0];

/** «approach speed of A», «closing speed at the contact point». */
export function resultLabel(name: ResultName): string {
  const words = entry(name)[1];
  return /^[AB]\./.test(name) ? `${words} of ${name.charAt(0)}` : words;
}

/** Whether a result is a direction, which wraps at 180 deg. */
export const isDirection = (name: ResultName): boolean => resultDimension(name) === 'angle';
