import { describe, expect, test } from 'vitest';
import { parseCaseText } from '@/lib/casefile/parse';
import type { CaseFile } from '@/lib/casefile/schema';
import type { Result } from '@/lib/results/result';
import { solveCase } from '@/lib/solve-case';
import { buildCase, leaves, slides } from '../support/build-case';

/** Worked examples from textbooks, through the whole chain: case file as text, parsed, solved, result. */

const KMH = 1 / 3.6;

async function solved(casefile: CaseFile): Promise<Result> {
  const parsed = parseCaseText(JSON.stringify(casefile));
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.issues));
  const outcome = await solveCase(parsed.casefile);
  if (outcome.kind !== 'solved') throw new Error(JSON.stringify(outcome));
  return outcome.result;
}

describe('OpenStax University Physics volume 1, module m58321, «Analyzing a Car Crash»', () => {
  // A car of 1200 kg stops dead; a truck of 3000 kg that stood slides 10 m with friction 0.62 (g 9.81).
  // Printed: truck 11.0 m/s after contact, car 27.5 m/s before (exact with g 9.81: 11.0292 and 27.573), loss 2.7e5 J.
  test('rest positions to approach speeds', async () => {
    const result = await solved(
      buildCase({
        masses: [1200, 3000],
        approach: [null, null],
        departure: [leaves(0, 0, 0), slides(10, 0.62, 0, 0)],
        method: 'restitution',
        restitution: 0.4, // 11.0292 / 27.573: the restitution that the example's own figures have
        impulseRatio: 0,
      }),
    );
    expect(Math.abs(result.central['B.departureSpeed'] - 11.0)).toBeLessThan(0.06);
    expect(Math.abs(result.central['A.approachSpeed'] - 27.5)).toBeLessThan(0.11);
    expect(Math.abs(result.central['B.approachSpeed'])).toBeLessThan(1e-9);
    expect(Math.abs(result.central.energyLost - 2.7e5)).toBeLessThan(0.05e5);
  });
});

describe('OpenStax University Physics volume 1, module m58322: locked collision at right angles', () => {
  // 1200 kg east at 60 km/h, 3000 kg north at 40 km/h; together 9.25 m/s (33.3 km/h) at 59° from east. Exact 9.2555, 59.036.
  test('backwards from 9.2555 m/s at 59.036°', async () => {
    const together = leaves(9.2555, 59.036, 0);
    const result = await solved(
      buildCase({
        masses: [1200, 3000],
        at: [
          [-2, 0],
          [1, -2],
        ],
        approach: [0, 90],
        departure: [together, together],
        plane: 60,
      }),
    );
    expect(result.central['A.approachSpeed']).toBeCloseTo(60 * KMH, 3);
    expect(result.central['B.approachSpeed']).toBeCloseTo(40 * KMH, 3);
    expect(Math.abs(result.central.restitution)).toBeLessThan(1e-9);
  });
});

describe('Two departures, two unknown approach speeds (enotes.com, homework question 453518)', () => {
  // P 1200 kg travelling south, G 1800 kg travelling east; after contact G 50 km/h at 40° south of east, P 30 km/h at
  // 30° south of east. Printed 63.2 and 55.62 km/h; exact 63.2091 and 55.6227.
  test('63.2 and 55.62 km/h', async () => {
    const result = await solved(
      buildCase({
        masses: [1200, 1800],
        at: [
          [0, 2],
          [-2, 0],
        ],
        approach: [-90, 0],
        departure: [leaves(30 * KMH, -30), leaves(50 * KMH, -40)],
        plane: 45,
      }),
    );
    expect(Math.abs(result.central['A.approachSpeed'] / KMH - 63.2091)).toBeLessThan(5e-4);
    expect(Math.abs(result.central['B.approachSpeed'] / KMH - 55.6227)).toBeLessThan(5e-4);
  });
});

describe('OpenStax College Physics, module m42165: the unseen body', () => {
  // 0.250 kg at 2.00 m/s leaves at 1.50 m/s and 45.0°; the target of 0.400 kg stood and leaves at 0.886 m/s and 311.5°.
  test('backwards: 2.00 m/s into a standing body', async () => {
    const vx = (0.25 * (2 - 1.5 * Math.SQRT1_2)) / 0.4;
    const vy = (-0.25 * 1.5 * Math.SQRT1_2) / 0.4;
    const speed = Math.hypot(vx, vy);
    const direction = (Math.atan2(vy, vx) * 180) / Math.PI;
    expect(Math.abs(speed - 0.886)).toBeLessThan(5e-4);
    expect(Math.abs(direction + 360 - 311.5)).toBeLessThan(0.05);
    const result = await solved(
      buildCase({
        masses: [0.25, 0.4],
        approach: [0, 90],
        departure: [leaves(1.5, 45), leaves(speed, direction)],
        plane: 40,
      }),
    );
    expect(result.central['A.approachSpeed']).toBeCloseTo(2, 9);
    expect(Math.abs(result.central['B.approachSpeed'] ?? 0)).toBeLessThan(1e-9);
  });
});
