import { writeFileSync } from 'node:fs';
import { caseJsonSchema } from '@/lib/casefile/json-schema';
import { resultJsonSchema } from '@/lib/results/json-schema';

/** npm run schema: writes the published JSON Schemas. A test holds the files against the schemas they come from. */
const write = (file: string, schema: object): void => writeFileSync(file, `${JSON.stringify(schema, null, 2)}\n`);

write('public/case.schema.json', caseJsonSchema());
write('public/result.schema.json', resultJsonSchema());
