/** What a number measures. Every quantity of a case and every result has exactly one; it decides the units shown. */
export const DIMENSIONS = [
  'length', // m
  'angle', // deg in files and on screens
  'mass', // kg
  'yawInertia', // kg m^2
  'speed', // m/s
  'yawRate', // deg/s in files and on screens
  'ratio', // 1
  'time', // s
  'acceleration', // m/s^2
  'energy', // J
  'impulse', // N s
  'forcePerWidth', // N/m
  'stiffnessPerWidth', // N/m^2
] as const;

export type Dimension = (typeof DIMENSIONS)[number];

/** The two display systems of a case file. */
export type UnitSystem = 'metric' | 'us';
