import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { YAW_DYNAMIC_INDEX, YAW_INERTIA_RELATIVE_SD, estimatedYawInertia } from '@/lib/mechanics/inertia';

/**
 * The 73 passenger cars of the NHTSA Light Vehicle Inertial Parameter Database (Heydinger et al., SAE 1999-01-1336), makes left
 * out. The product a b is back-computed from the published yaw index, so its last digits carry that rounding.
 */
const [header, ...lines] = readFileSync(new URL('./vehicle-inertia.csv', import.meta.url), 'utf8')
  .split('\n')
  .filter((line) => line !== '' && !line.startsWith('#'));
const columns = header.split(',');
const cars = lines.map((line) => {
  const cells = line.split(',');
  const at = (name: string): number => Number(cells[columns.indexOf(name)]);
  return { mass: at('mass_kg'), ab: at('ab_m2'), inertia: at('izz_kgm2') };
});

const mean = (values: number[]): number => values.reduce((sum, x) => sum + x, 0) / values.length;
const sd = (values: number[]): number =>
  Math.sqrt(values.reduce((sum, x) => sum + (x - mean(values)) ** 2, 0) / (values.length - 1));
const errors = cars.map(
  ({ mass, ab, inertia }) => estimatedYawInertia(mass, Math.sqrt(ab), Math.sqrt(ab)) / inertia - 1,
);

test('73 cars, and their published regression on mass: 3.176 m - 1754', () => {
  expect(cars).toHaveLength(73);
  const [m, i] = [mean(cars.map((c) => c.mass)), mean(cars.map((c) => c.inertia))];
  const slope = mean(cars.map((c) => (c.mass - m) * (c.inertia - i))) / mean(cars.map((c) => (c.mass - m) ** 2));
  expect(Math.abs(slope - 3.176)).toBeLessThan(1e-3);
  expect(Math.abs(i - slope * m + 1754.164)).toBeLessThan(1.5);
});

test('the rule: mean error within 3 %, standard deviation within 11 %', () => {
  expect(Math.abs(mean(errors))).toBeLessThan(0.03);
  expect(sd(errors)).toBeLessThan(0.11);
});

test('as regression: mean error 0.5 %, standard deviation 7.3 % (the spread that the engine gives it), mean index 1.091', () => {
  expect(mean(errors)).toBeCloseTo(0.005, 3);
  expect(Math.abs(sd(errors) - YAW_INERTIA_RELATIVE_SD)).toBeLessThan(6e-4);
  expect(Math.abs(mean(cars.map(({ mass, ab, inertia }) => inertia / (mass * ab))) - YAW_DYNAMIC_INDEX)).toBeLessThan(
    6e-4,
  );
});
