import { overStore } from '@/lib/entry/http-door';
import { getHealth } from '@/lib/entry/http-health';

export const dynamic = 'force-dynamic';
export const GET = overStore(getHealth);
