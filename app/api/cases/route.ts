import { getCases, postCase } from '@/lib/entry/http-cases';
import { overStore } from '@/lib/entry/http-door';

export const dynamic = 'force-dynamic';
export const GET = overStore(getCases);
export const POST = overStore(postCase);
