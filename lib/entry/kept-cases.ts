import { type CaseLine, listCases } from '@/lib/store/cases';
import { type Revision, readCase } from '@/lib/store/revisions';
import { theStore } from './the-store';

/** What the pages read from the store while they are drawn on the server. */

export const keptCases = async (): Promise<CaseLine[]> => listCases(await theStore());

/** The newest revision of a case, or null if there is none. */
export const keptCase = async (id: string): Promise<Revision | null> => readCase(await theStore(), id);
