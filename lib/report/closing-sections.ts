import type { CaseFile } from '@/lib/casefile/schema';
import type { Result } from '@/lib/results/result';
import { percent } from './numbers';
import type { Section } from './report';

const IMPOSSIBLE_WORDS: Record<string, string> = {
  notClosing: 'the contact point would not close',
  notParting: 'the contact points would not part',
  backwards: 'an approach speed would be negative',
  pulling: 'the contact would have to pull',
  restitution: 'the restitution would lie outside its range',
  energyGain: 'the contact would give energy',
  leg: 'a leg of the travel cannot be run through',
  noRest: 'a vehicle would not come to rest',
  neverParts: 'the vehicles would never part',
  notFinite: 'no finite answer',
};

/** What is needed to get the same digits again. */
export function reproduceSection(casefile: CaseFile, result: Result): Section {
  return {
    id: 'reproduce',
    title: 'To get the same figures again',
    blocks: [
      {
        kind: 'paragraph',
        text: 'The same case file, engine, seed and number of draws give the same digits, on any machine, from the screen, the command line or over HTTP.',
      },
      {
        kind: 'definitions',
        rows: [
          ['Case hash', `${result.case} (SHA-256 of the case file’s canonical form, RFC 8785)`],
          ['Engine', result.engine],
          [
            'Method and contact',
            `${result.method}, ${casefile.analysis.contact === 'lasting' ? 'lasting' : 'instantaneous'}`,
          ],
          ['Seed', String(result.seed)],
          ['Draws', result.draws.toLocaleString('en')],
          ['Coverage probability', percent(result.coverage)],
          ['Impossible draws', impossibleText(result)],
        ],
      },
    ],
  };
}

/** How many draws were impossible, and why, in words. */
export function impossibleText({ impossible, draws }: Result): string {
  const counted = Object.entries(impossible).filter(([, count]) => count > 0);
  if (counted.length === 0) return 'none';
  const total = counted.reduce((sum, [, count]) => sum + count, 0);
  const reasons = counted.map(
    ([reason, count]) => `${count.toLocaleString('en')} because ${IMPOSSIBLE_WORDS[reason] ?? reason}`,
  );
  return `${total.toLocaleString('en')} of ${draws.toLocaleString('en')} (${percent(total / draws)}), counted and left out of the intervals: ${reasons.join('; ')}`;
}

/** What only a person can supply. */
export const authorSection = (): Section => ({
  id: 'author',
  title: 'Author, instructions and declaration',
  blocks: [
    { kind: 'paragraph', text: 'Author, instructions and declaration: to be supplied by the author.' },
    {
      kind: 'signature',
      lines: ['Name and qualifications', 'Licence or registration, place and number', 'Date', 'Signature'],
    },
  ],
});
