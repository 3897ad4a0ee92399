import { getCase, putCase, removeCase } from '@/lib/entry/http-cases';
import { overStore } from '@/lib/entry/http-door';

export const dynamic = 'force-dynamic';
export const GET = overStore(getCase);
export const PUT = overStore(putCase);
export const DELETE = overStore(removeCase);
