import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { parseCase } from '@/lib/casefile/parse';
import { readEvidence } from '@/lib/evidence/read-evidence';
import { type TimedPath, evenly, poseAt } from '@/lib/geometry/timed-path';
import { G } from '@/lib/mechanics/legs';
import { type Ground, TyreMotion, fourWheels } from '@/lib/mechanics/spin';
import { solveCentral } from '@/lib/solve/central';
import { restMisses } from '@/lib/solve/rest-miss';
import { travelsOf } from '@/lib/solve/spin-central';
import { type TravelStart, travelPath } from '@/lib/solve/travel-path';

const LEVEL: Ground = { friction: 0.7, frictionAt: null, grade: 0, uphill: 0 };
const ERROR = 1e-7;

function motionOf(braking: number[], ground = LEVEL, onset = 0): TyreMotion {
  const body = { m: 1400, wheelbase: 2.66, track: 1.54, frontAxleToMassCentre: 1.18 };
  const wheels = fourWheels(
    body,
    braking.map((share) => ({ braking: share, steer: 0 })),
  );
  return new TyreMotion({ m: body.m, I: 2300, wheels }, ground, onset);
}

const START: TravelStart = {
  time: 0.15,
  from: { x: 2, y: -1, heading: 0.4 },
  separation: { vx: 4, vy: 1.5, w: 1.2 },
};

/** The nudge example, solved at its central values. */
function nudge() {
  const parsed = parseCase(readFileSync('public/examples/nudge.case.json'));
  if (!parsed.ok) throw new Error('the example is not valid');
  return solveCentral(readEvidence(parsed.casefile, 'directions', 1)).spins;
}

const timesOf = ({ poses }: TimedPath): number[] => poses.map(({ time }) => time);

describe('a simulated travel as samples', () => {
  test('begins at the pose of contact and ends within 1 mm of the measured rest, for both vehicles of the example', () => {
    const travels = travelsOf(nudge());
    const [a, b] = [travels.A?.poses, travels.B?.poses];
    if (!a || !b) throw new Error('a travel is missing');
    expect(a[0]).toMatchObject({ time: 0, x: -1.94, y: 0.1, heading: 0 });
    expect(b[0]).toMatchObject({ time: 0, x: 0.9, y: 1.25 });
    const radian = Math.PI / 180;
    for (const [poses, x, y, heading] of [
      [a, -1.27, 0.12, 0.6 * radian],
      [b, 1.52, 2.03, 128 * radian],
    ] as const) {
      const end = poses[poses.length - 1];
      expect(Math.hypot(end.x - x, end.y - y)).toBeLessThan(1e-3);
      expect(Math.abs(end.heading - heading)).toBeLessThan(1e-3);
      expect(end.speed).toBeLessThan(0.02);
    }
  });

  test('begins where and when it is told to, not at contact', () => {
    const path = travelPath(motionOf([0.5, 0.5, 0.2, 0.2]), START, ERROR);
    expect(path.poses[0]).toEqual({ time: 0.15, x: 2, y: -1, heading: 0.4, speed: Math.hypot(4, 1.5) });
  });

  test('has 60 to 200 samples, evenly in time, with a place for every wheel', () => {
    const path = travelPath(motionOf([0.5, 0.5, 0.2, 0.2]), START, ERROR);
    const times = timesOf(path);
    expect(times.length).toBeGreaterThanOrEqual(60);
    expect(times.length).toBeLessThanOrEqual(200);
    const steps = times.slice(1).map((t, k) => t - times[k]);
    expect(Math.min(...steps)).toBeGreaterThan(0);
    expect(Math.max(...steps) - Math.min(...steps)).toBeLessThan(1e-12);
    expect(path.wheels).toHaveLength(4);
    for (const { points, sliding } of path.wheels) {
      expect(points).toHaveLength(times.length);
      expect(sliding).toHaveLength(times.length - 1);
    }
  });

  test('a locked straight slide loses speed by f g, also between the steps of the simulation', () => {
    const start = { ...START, time: 0, separation: { vx: 6, vy: 0, w: 0 } };
    const { poses } = travelPath(motionOf([1, 1, 1, 1]), { ...start, from: { x: 0, y: 0, heading: 0 } }, ERROR);
    // Below 0.05 m/s the force fades.
    for (const { time, x, speed } of poses.filter((pose) => pose.speed > 0.06)) {
      expect(speed).toBeCloseTo(6 - 0.7 * G * time, 5);
      expect(x).toBeCloseTo(6 * time - (0.7 * G * time * time) / 2, 5);
    }
  });

  test('turning the scene turns the path', () => {
    const by = 0.9;
    const turn = (x: number, y: number): [number, number] => [
      x * Math.cos(by) - y * Math.sin(by),
      x * Math.sin(by) + y * Math.cos(by),
    ];
    const { from, separation } = START;
    const [[x, y], [vx, vy]] = [turn(from.x, from.y), turn(separation.vx, separation.vy)];
    const turned = { ...START, from: { x, y, heading: from.heading + by }, separation: { ...separation, vx, vy } };
    const motion = motionOf([0.9, 0.1, 0.4, 0]);
    const [plain, other] = [travelPath(motion, START, ERROR), travelPath(motion, turned, ERROR)];
    // The step control looks along the axes, so the steps differ: to a twentieth of a millimetre.
    plain.poses.forEach((pose, k) => {
      const [px, py] = turn(pose.x, pose.y);
      expect(other.poses[k].x).toBeCloseTo(px, 4);
      expect(other.poses[k].y).toBeCloseTo(py, 4);
      expect(other.poses[k].heading).toBeCloseTo(pose.heading + by, 4);
    });
  });

  test('a locked wheel slides until it rests, a rolling one does not on a straight course, and none before braking sets in', () => {
    const straight = { ...START, from: { x: 0, y: 0, heading: 0 }, separation: { vx: 5, vy: 0, w: 0 } };
    const mixed = travelPath(motionOf([1, 1, 0.2, 0.2]), straight, ERROR).wheels.map(({ sliding }) => sliding);
    expect(new Set(mixed[0])).toEqual(new Set([true]));
    expect(new Set(mixed[2])).toEqual(new Set([false]));
    const late = travelPath(motionOf([1, 1, 1, 1], LEVEL, 0.3), straight, ERROR);
    late.wheels[0].sliding.forEach((slides, k) => {
      const middle = (late.poses[k].time + late.poses[k + 1].time) / 2 - straight.time;
      expect(slides).toBe(middle >= 0.3);
    });
  });

  test('a tyre pushed sideways slides whatever its brake does', () => {
    const sideways = { ...START, from: { x: 0, y: 0, heading: 0 }, separation: { vx: 0.5, vy: 3, w: 0 } };
    const path = travelPath(motionOf([0, 0, 0, 0]), sideways, ERROR);
    expect(path.wheels.map(({ sliding }) => sliding[0])).toEqual([true, true, true, true]);
  });

  test('a vehicle that already stands has one pose', () => {
    const path = travelPath(motionOf([1, 1, 1, 1]), { ...START, separation: { vx: 0, vy: 0, w: 0 } }, ERROR);
    expect(path.poses).toEqual([{ time: 0.15, ...START.from, speed: 0 }]);
    expect(evenly(path, 10)).toHaveLength(1);
  });
});

describe('a pose between the samples', () => {
  const path = travelPath(motionOf([0.5, 0.5, 0.2, 0.2]), START, ERROR);
  const [first, last] = [path.poses[0], path.poses[path.poses.length - 1]];

  test('stays at the ends outside them, and lies between its neighbours within', () => {
    expect(poseAt(path, -1)).toEqual(first);
    expect(poseAt(path, last.time + 1)).toEqual(last);
    const [a, b] = path.poses.slice(20, 22);
    expect(poseAt(path, (a.time + b.time) / 2).x).toBeCloseTo((a.x + b.x) / 2, 12);
  });

  test('ten stretches have the first, the last and nine between', () => {
    const poses = evenly(path, 10);
    expect(poses).toHaveLength(11);
    expect(poses[0]).toEqual(first);
    expect(poses[10].x).toBeCloseTo(last.x, 9);
  });
});

test('a rest pose that no search met is answered with the rest that came nearest; one that was met is not', () => {
  const spins = nudge();
  const found = spins.B;
  if (!found) throw new Error('B has no travel');
  expect(restMisses(spins)).toEqual([]);
  const [best] = found.separations;
  const missed = { ...found, separations: [], nearest: { ...best, met: false, rest: { ...best.rest, x: 1.2 } } };
  const [miss, ...more] = restMisses({ ...spins, B: missed });
  expect(more).toEqual([]);
  expect(miss).toMatchObject({ vehicle: 'B', measured: { x: 1.52, y: 2.03 }, nearest: { x: 1.2 } });
  expect(travelsOf({ ...spins, B: missed }).B).toBeUndefined();
});
