import * as z from 'zod';
import { caseSchema } from './schema';

/** The published JSON Schema (draft 2020-12) of the case file, generated from the one zod schema. */
export const caseJsonSchema = (): object => z.toJSONSchema(caseSchema);
