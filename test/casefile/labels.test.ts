import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { fieldsOf, labelOf } from '@/lib/casefile/fields';
import { checkCase, parseCase } from '@/lib/casefile/parse';
import { defaultDamage, emptyCase } from '@/lib/casefile/defaults';

const POINTED_AT = [
  'departure.A',
  'departure.B.rest',
  'departure.A.legs.0',
  'approach.A.direction',
  'impact.plane',
  'impact.restitution',
  'vehicles',
  'vehicles.A.seats',
  'analysis.method',
  'analysis.contact',
  'departure',
  'pulse',
  'impact.slide',
  'departure.A.yawRate',
  'damage.A',
  'damage.B.depths',
  'recorded.A.forward',
];

test.each(['junction', 'queue', 'nudge'])('no path that a refusal or a check may carry is shown raw (%s)', (name) => {
  const parsed = parseCase(readFileSync(`public/examples/${name}.case.json`));
  if (!parsed.ok) throw new Error('the example is not valid');
  for (const path of [...POINTED_AT, ...fieldsOf(parsed.casefile).map((field) => field.path)])
    expect(labelOf(parsed.casefile, path), path).not.toContain('.');
});

test('damage and recorded values have rows in words', () => {
  const casefile = { ...emptyCase(), damage: { A: defaultDamage() } };
  const rows = fieldsOf(casefile).filter(({ group }) => group === 'damage.A' || group === 'recorded');
  expect(rows.map(({ path }) => labelOf(casefile, path))).toEqual([
    'A: Damaged width',
    'A: Direction of force off the normal',
    'A: Stiffness: force per width at no depth',
    'A: Stiffness: gain of force with depth',
    ...[1, 2, 3, 4].map((k) => `A: Depth ${k}`),
    ...['A', 'B'].flatMap((id) => [`${id}: delta-V recorded, forward`, `${id}: delta-V recorded, left`]),
  ]);
  expect(checkCase(casefile).ok).toBe(true);
});
