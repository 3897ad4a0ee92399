import type * as z from 'zod';

/**
 * One problem of a case, in the words that form, command and HTTP all print.
 * `path` is dotted (`departure.A.legs.0.distance.value`); a problem of the document as a whole has DOCUMENT.
 */
export interface Issue {
  path: string;
  says: string;
}

export const DOCUMENT = '(document)';

export const issueLine = (issue: Issue): string => `${issue.path}: ${issue.says}`;

export const joinPath = (path: readonly PropertyKey[]): string => path.map(String).join('.') || DOCUMENT;

const WANTED: Record<string, string> = {
  number: 'a number',
  int: 'a whole number',
  string: 'a text',
  object: 'an object',
  array: 'a list',
  null: 'null',
  record: 'an object',
};

const described = (input: unknown): string => {
  if (input === undefined) return 'nothing';
  if (input === null) return 'null';
  if (typeof input === 'number') return Number.isFinite(input) ? String(input) : 'a number too large to hold';
  if (Array.isArray(input)) return 'a list';
  if (typeof input === 'object') return 'an object';
  if (typeof input === 'string') return JSON.stringify(input.length > 40 ? `${input.slice(0, 40)}…` : input);
  return typeof input === 'boolean' ? String(input) : 'something else';
};

const listed = (values: readonly unknown[]): string => values.map((v) => JSON.stringify(v)).join(' or ');

const bound = (limit: number | bigint, inclusive: boolean | undefined, side: 'least' | 'most'): string =>
  inclusive
    ? `must be ${side === 'least' ? 'at least' : 'at most'} ${limit}`
    : `must be ${side === 'least' ? 'greater than' : 'less than'} ${limit}`;

const valueAt = (root: unknown, path: readonly PropertyKey[]): unknown =>
  path.reduce<unknown>((node, key) => (node === null || node === undefined ? undefined : (node as never)[key]), root);

const sizeSays = (origin: string, limit: number | bigint, side: 'least' | 'most'): string =>
  `must have at ${side} ${limit} ${origin === 'array' ? (limit === 1 ? 'entry' : 'entries') : 'characters'}`;

type RawIssue = z.core.$ZodIssue;

/** Of a failed union, the branch that got furthest: the one whose first problem lies deepest, then with fewest. */
const closestBranch = (branches: readonly RawIssue[][]): RawIssue[] => {
  const depth = (branch: RawIssue[]): number => Math.max(0, ...branch.map((issue) => issue.path.length));
  const unknown = (branch: RawIssue[]): number => branch.filter((issue) => issue.code === 'unrecognized_keys').length;
  return [...branches].sort((a, b) => unknown(a) - unknown(b) || depth(b) - depth(a) || a.length - b.length)[0] ?? [];
};

/** Flattens one zod issue into plain problems with dotted paths. `root` is the document that was checked. */
export function issuesFromZod(issue: RawIssue, root: unknown, base: readonly PropertyKey[] = []): Issue[] {
  const keys = [...base, ...issue.path];
  const path = joinPath(keys);
  const input = valueAt(root, keys);
  const one = (says: string): Issue[] => [{ path, says }];
  switch (issue.code) {
    case 'unrecognized_keys':
      return issue.keys.map((key) => ({ path: joinPath([...keys, key]), says: 'unknown key' }));
    case 'invalid_type':
      if (input === undefined) return one('is missing');
      return one(`must be ${WANTED[issue.expected] ?? issue.expected}, found ${described(input)}`);
    case 'too_small':
      if (issue.origin === 'array' || issue.origin === 'string')
        return one(sizeSays(issue.origin, issue.minimum, 'least'));
      return one(bound(issue.minimum, issue.inclusive, 'least'));
    case 'too_big':
      if (issue.origin === 'array' || issue.origin === 'string')
        return one(sizeSays(issue.origin, issue.maximum, 'most'));
      return one(bound(issue.maximum, issue.inclusive, 'most'));
    case 'invalid_value':
      if (input === undefined) return one('is missing');
      return one(`must be ${listed(issue.values)}, found ${described(input)}`);
    case 'invalid_union': {
      if (issue.errors.length === 0) {
        const shape = issue.discriminator ?? 'kind';
        const inner = valueAt(root, [...keys]);
        return inner === undefined ? one('is missing') : one(`must be a known ${shape}, found ${described(inner)}`);
      }
      return closestBranch(issue.errors).flatMap((inner) => issuesFromZod(inner, root, keys));
    }
    case 'invalid_format':
      return one(
        issue.format === 'regex' ? 'must be a SHA-256 in lower-case hexadecimal' : `must be a valid ${issue.format}`,
      );
    default:
      return one(issue.message);
  }
}
