import * as z from 'zod';
import { resultSchema } from './result';

/** The published JSON Schema (draft 2020-12) of the result file. */
export const resultJsonSchema = (): object => z.toJSONSchema(resultSchema);
