/** Plane vectors as [x, y]; metres in the world, pixels on a screen. */
export type Vec = readonly [x: number, y: number];

export const add = (a: Vec, b: Vec): Vec => [a[0] + b[0], a[1] + b[1]];
export const subtract = (a: Vec, b: Vec): Vec => [a[0] - b[0], a[1] - b[1]];
export const scale = (a: Vec, by: number): Vec => [a[0] * by, a[1] * by];
export const length = (a: Vec): number => Math.sqrt(a[0] * a[0] + a[1] * a[1]);
export const distance = (a: Vec, b: Vec): number => length(subtract(a, b));
/** Unit vector at an angle, rad counter-clockwise from +x. */
export const unit = (angle: number): Vec => [Math.cos(angle), Math.sin(angle)];
/** Angle of a vector, rad counter-clockwise from +x, in (-pi, pi]. */
export const angleOf = (a: Vec): number => Math.atan2(a[1], a[0]);
/** A point given in the axes of a body at a pose (rad), in the world. */
export function fromBody(p: Vec, pose: { x: number; y: number; heading: number }): Vec {
  const [c, s] = unit(pose.heading);
  return [pose.x + c * p[0] - s * p[1], pose.y + s * p[0] + c * p[1]];
}

export const RADIANS_PER_DEGREE = Math.PI / 180;
export const toRadians = (degrees: number): number => degrees * RADIANS_PER_DEGREE;
export const toDegrees = (radians: number): number => radians / RADIANS_PER_DEGREE;
