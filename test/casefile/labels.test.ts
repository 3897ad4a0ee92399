import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { fieldsOf, labelOf } from '@/lib/casefile/fields';
import { parseCase } from '@/lib/casefile/parse';

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
];

test.each(['junction', 'queue', 'nudge'])('no path that a refusal or a check may carry is shown raw (%s)', (name) => {
  const parsed = parseCase(readFileSync(`public/examples/${name}.case.json`));
  if (!parsed.ok) throw new Error('the example is not valid');
  for (const path of [...POINTED_AT, ...fieldsOf(parsed.casefile).map((field) => field.path)])
    expect(labelOf(parsed.casefile, path), path).not.toContain('.');
});
