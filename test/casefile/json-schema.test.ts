import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { caseJsonSchema } from '@/lib/casefile/json-schema';
import { resultJsonSchema } from '@/lib/results/json-schema';

const published = (name: string): unknown => JSON.parse(readFileSync(`public/${name}.schema.json`, 'utf8'));

test('the published JSON Schemas are those of the code (npm run schema writes them)', () => {
  expect(published('case')).toEqual(JSON.parse(JSON.stringify(caseJsonSchema())));
  expect(published('result')).toEqual(JSON.parse(JSON.stringify(resultJsonSchema())));
});
