import { plain } from '@/lib/entry/http-door';
import { postSolve } from '@/lib/entry/http-solve';

export const POST = plain(postSolve);
