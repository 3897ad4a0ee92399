/** Drawn directions are kept to the tenth of a degree: finer than anyone draws. */
export const tenths = (degrees: number): number => Math.round(degrees * 10) / 10;

/** Into (-180, 180]. */
export const wrapped = (degrees: number): number => {
  const turned = degrees - 360 * Math.round(degrees / 360);
  return turned === -180 ? 180 : turned;
};
