/** Plane vectors as the worked lines write them out. */
export interface Vector {
  x: number;
  y: number;
}

const RADIANS = Math.PI / 180;

export const radians = (deg: number): number => deg * RADIANS;
export const asDegrees = (rad: number): number => rad / RADIANS;
/** Unit vector of a direction in degrees. */
export const unit = (deg: number): Vector => ({ x: Math.cos(radians(deg)), y: Math.sin(radians(deg)) });
export const dot = (a: Vector, b: Vector): number => a.x * b.x + a.y * b.y;
export const cross = (a: Vector, b: Vector): number => a.x * b.y - a.y * b.x;
export const perp = (a: Vector): Vector => ({ x: -a.y, y: a.x });
export const scaled = (a: Vector, k: number): Vector => ({ x: a.x * k, y: a.y * k });
export const sum = (a: Vector, b: Vector): Vector => ({ x: a.x + b.x, y: a.y + b.y });
export const less = (a: Vector, b: Vector): Vector => ({ x: a.x - b.x, y: a.y - b.y });
export const size = (a: Vector): number => Math.hypot(a.x, a.y);
/** Direction in degrees, in (-180, 180]. */
export const directionOf = (a: Vector): number => asDegrees(Math.atan2(a.y, a.x));
