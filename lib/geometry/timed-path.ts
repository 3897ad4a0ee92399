import type { Vec } from './vector';

/** Where a body is at a time, and how fast its mass centre: s, m, rad (not wrapped), m/s. */
export interface TimedPose {
  time: number;
  x: number;
  y: number;
  heading: number;
  speed: number;
}

/** Where one wheel stands at the time of every pose. */
export interface WheelTrace {
  points: Vec[];
  /** For every stretch between two points: whether the tyre slides on it, locked or sideways. */
  sliding: boolean[];
}

/** A motion as samples whose times rise. */
export interface TimedPath {
  poses: TimedPose[];
  /** Front left, front right, rear left, rear right. */
  wheels: WheelTrace[];
}

/** The simulated motion of whichever vehicle has one. */
export type Travels = Partial<Record<'A' | 'B', TimedPath>>;

/** The pose at a time, between the samples on a straight line; before the first it is the first, after the last the last. */
export function poseAt({ poses }: TimedPath, time: number): TimedPose {
  const after = poses.findIndex((pose) => pose.time >= time);
  if (after === 0) return poses[0];
  if (after < 0) return poses[poses.length - 1];
  const [from, to] = [poses[after - 1], poses[after]];
  const share = (time - from.time) / (to.time - from.time);
  const between = (a: number, b: number): number => a + share * (b - a);
  return {
    time,
    x: between(from.x, to.x),
    y: between(from.y, to.y),
    heading: between(from.heading, to.heading),
    speed: between(from.speed, to.speed),
  };
}

/** Poses at times that are spread evenly over the motion, its first and last among them. */
export function evenly(path: TimedPath, stretches: number): TimedPose[] {
  const [first, last] = [path.poses[0].time, path.poses[path.poses.length - 1].time];
  if (first === last) return [path.poses[0]];
  return Array.from({ length: stretches + 1 }, (_, k) => poseAt(path, first + ((last - first) * k) / stretches));
}

/** When the last of some motions ends, s; 0 without any. */
export const endOf = ({ A, B }: Travels): number =>
  Math.max(0, ...[A, B].map((path) => path?.poses[path.poses.length - 1].time ?? 0));
