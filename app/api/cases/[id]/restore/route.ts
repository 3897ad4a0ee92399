import { undeleteCase } from '@/lib/entry/http-cases';
import { overStore } from '@/lib/entry/http-door';

export const POST = overStore(undeleteCase);
