import type { CaseFile } from '@/lib/casefile/schema';
import type { Result } from '@/lib/results/result';
import { METHOD_WORDS } from './method-section';
import type { Header, Paper } from './report';

/** Where the case stands in its store; a case file alone has none. */
export interface Issue {
  revision?: number;
  /** When the revision was saved: milliseconds since 1970. */
  saved?: number;
  paper?: Paper;
}

const HASH_PREFIX = 12;
const EDGE_LETTERS = 60;

export function headerOf(casefile: CaseFile, result: Result, issue: Issue): Header {
  const { title, reference, vehicles } = casefile;
  const rows: Header['rows'] = [
    ['Vehicle A', vehicles.A.name],
    ['Vehicle B', vehicles.B.name],
    ['Method', METHOD_WORDS[result.method]],
    ['Case', standing(issue)],
    ['Engine', result.engine],
    ['Case hash', `${result.case} (SHA-256)`],
  ];
  const name = [shortened(title), reference].filter(Boolean).join(' · ');
  const revision = issue.revision === undefined ? '' : ` · revision ${issue.revision}`;
  return {
    title,
    subject: 'Report on the speeds before contact and the delta-V of two vehicles',
    reference: reference ?? '',
    rows,
    paper: issue.paper ?? casefile.display?.paper ?? 'A4',
    edges: { case: name + revision, hash: `case\u00a0${result.case.slice(0, HASH_PREFIX)}`, engine: result.engine },
  };
}

/** A title at the edge of a page keeps to one line. */
const shortened = (title: string): string =>
  title.length > EDGE_LETTERS ? `${title.slice(0, EDGE_LETTERS).trimEnd()} …` : title;

/** «revision 3, saved 2026-12-01 09:40 UTC». */
function standing({ revision, saved }: Issue): string {
  const when = saved === undefined ? '' : `saved ${new Date(saved).toISOString().slice(0, 16).replace('T', ' ')} UTC`;
  const which = revision === undefined ? '' : `revision ${revision}`;
  return [which, when].filter(Boolean).join(', ') || 'the case file with the hash below';
}
