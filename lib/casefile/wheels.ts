import { DEFAULT_SOURCE } from './defaults';
import type { FourWheels, Quantity, SpinDeparture } from './schema';

export type WheelId = keyof FourWheels;

/** The wheels in the order in which they are listed and drawn. */
export const WHEELS = [
  { id: 'frontLeft', words: 'front left' },
  { id: 'frontRight', words: 'front right' },
  { id: 'rearLeft', words: 'rear left' },
  { id: 'rearRight', words: 'rear right' },
] as const satisfies { id: WheelId; words: string }[];

export const wheelWords = (wheel: string): string => WHEELS.find(({ id }) => id === wheel)?.words ?? wheel;

type Wheels = SpinDeparture['wheels'];

/** The one braking of all wheels, stated for each, straight ahead. */
export function wheelsApart(wheels: Wheels): FourWheels {
  if (!('all' in wheels)) return wheels;
  const steer: Quantity = { value: 0, spread: { shape: 'fixed' }, source: DEFAULT_SOURCE };
  const wheel = { braking: wheels.all.braking, steer };
  return { frontLeft: wheel, frontRight: wheel, rearLeft: wheel, rearRight: wheel };
}

/** One braking for all, where that says as much: all four brake alike and none is steered. Else null. */
export function wheelsTogether(wheels: Wheels): Wheels | null {
  if ('all' in wheels) return wheels;
  const { frontLeft, ...others } = wheels;
  const alike = Object.values(others).every(({ braking }) => isSame(braking, frontLeft.braking));
  const straight = Object.values(wheels).every(({ steer }) => steer.value === 0 && isFixed(steer));
  return alike && straight ? { all: { braking: frontLeft.braking } } : null;
}

const isFixed = ({ spread }: Quantity): boolean => !spread || spread.shape === 'fixed';

const isSame = (a: Quantity, b: Quantity): boolean =>
  a.value === b.value && ((isFixed(a) && isFixed(b)) || spreadText(a) === spreadText(b));

/** Its figures in a fixed order. */
const spreadText = ({ spread }: Quantity): string =>
  JSON.stringify(Object.entries(spread ?? {}).toSorted(([a], [b]) => (a < b ? -1 : 1)));
