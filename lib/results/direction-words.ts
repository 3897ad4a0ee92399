const SECTORS = [
  'front',
  'left front',
  'left side',
  'left rear',
  'rear',
  'right rear',
  'right side',
  'right front',
] as const;
const SECTOR = 360 / SECTORS.length;

/** Into (-180, 180]. */
const wrapped = (degrees: number): number => {
  const turned = degrees - 360 * Math.round(degrees / 360);
  return turned === -180 ? 180 : turned;
};

/**
 * Where the push on a vehicle comes from, in words: opposite to its delta-V. `direction` is that of delta-V in vehicle axes,
 * deg, counter-clockwise from straight ahead (ISO 8855: left positive). «from the right front, 31° right of straight ahead».
 */
export function pushWords(direction: number): string {
  const from = wrapped(direction + 180);
  const sector = SECTORS[(Math.round(from / SECTOR) + SECTORS.length) % SECTORS.length];
  return `from the ${sector}, ${offWords(from)}`;
}

/** How far off straight ahead or straight behind, whichever is nearer; whole degrees. */
function offWords(degrees: number): string {
  const behind = Math.abs(degrees) > 90;
  const off = Math.round(behind ? 180 - Math.abs(degrees) : Math.abs(degrees));
  const line = behind ? 'straight behind' : 'straight ahead';
  return off === 0 ? line : `${off}° ${degrees > 0 ? 'left' : 'right'} of ${line}`;
}
