import { expect, test } from 'vitest';
import { millimetresPerMetre, roomForPlan, scaleFor } from '@/lib/report/paper';

test('the largest standard scale that fits is taken', () => {
  const room = roomForPlan('A4');
  expect(room.width).toBe(178);
  const ratio = (width: number, height: number) => scaleFor(width, height, room)?.ratio;
  expect(ratio(3.5, 3)).toBe(20);
  expect(ratio(8.9, 5)).toBe(50);
  expect(ratio(8.91, 5)).toBe(100);
  expect(ratio(17, 21)).toBe(100);
  expect(ratio(17, 22)).toBe(200);
  expect(ratio(89, 60)).toBe(500);
  expect(scaleFor(90, 60, room)).toBeNull();
});

test('a metre at 1 : 200 is 5 mm of paper', () => {
  const scale = scaleFor(30, 30, roomForPlan('Letter'));
  expect(scale?.ratio).toBe(200);
  expect(scale && millimetresPerMetre(scale)).toBe(5);
});
