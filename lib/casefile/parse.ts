import { type ParseError, printParseErrorCode, visit } from 'jsonc-parser';
import { type Issue, DOCUMENT, issuesFromZod, joinPath } from './issue';
import { relationIssues } from './relations';
import { type CaseFile, caseSchema } from './schema';

export const MAX_BYTES = 8 * 1024 * 1024;
export const MAX_DEPTH = 64;

export type Parsed = { ok: true; casefile: CaseFile } | { ok: false; issues: Issue[] };

const refuse = (says: string, path = DOCUMENT): Parsed => ({ ok: false, issues: [{ path, says }] });

/**
 * Reads a case from the bytes of a file or a request: UTF-8 (a byte-order mark is accepted), at most MAX_BYTES and
 * MAX_DEPTH levels, no duplicate key. Never throws for what a user wrote; every problem is reported with its path.
 */
export function parseCase(bytes: Uint8Array): Parsed {
  if (bytes.byteLength > MAX_BYTES)
    return refuse(`is ${bytes.byteLength} bytes long; at most ${MAX_BYTES} (8 MiB) are read`);
  const text = decode(bytes);
  if (text === null) return refuse('is not UTF-8 text: save the file as UTF-8');
  return parseCaseText(text);
}

/** As parseCase, from text that is already decoded. */
export function parseCaseText(text: string): Parsed {
  if (text.trim() === '') return refuse('is empty: a case file is one JSON document');
  if (depthOf(text) > MAX_DEPTH) return refuse(`is nested deeper than ${MAX_DEPTH} levels`);
  const syntax = syntaxIssues(text);
  if (syntax.length > 0) return { ok: false, issues: syntax };
  return checkCase(JSON.parse(text));
}

/** Holds a document against the schema and the relations between its keys. */
export function checkCase(document: unknown): Parsed {
  const checked = caseSchema.safeParse(document);
  const relations = relationIssues(document);
  if (checked.success && relations.length === 0) return { ok: true, casefile: checked.data };
  const issues = checked.success ? [] : checked.error.issues.flatMap((issue) => issuesFromZod(issue, document));
  const known = new Set(issues.map((issue) => issue.path));
  return { ok: false, issues: [...issues, ...relations.filter((issue) => !known.has(issue.path))] };
}

function decode(bytes: Uint8Array): string | null {
  if (bytes.includes(0)) return null; // UTF-16 of plain letters would pass as UTF-8 with zero bytes between
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    return null;
  }
}

/** The deepest level of brackets outside strings; counted before parsing, so that no depth can exhaust the stack. */
function depthOf(text: string): number {
  let depth = 0;
  let deepest = 0;
  let inString = false;
  for (let i = 0; i < text.length; i++) {
    const c = text.charCodeAt(i);
    if (inString) {
      if (c === 92) i++;
      else if (c === 34) inString = false;
    } else if (c === 34) inString = true;
    else if (c === 123 || c === 91) deepest = Math.max(deepest, ++depth);
    else if (c === 125 || c === 93) depth--;
  }
  return deepest;
}

const place = (text: string, offset: number): string => {
  const before = text.slice(0, offset).split('\n');
  return `line ${before.length}, column ${(before.at(-1)?.length ?? 0) + 1}`;
};

/** Problems of the JSON text itself: syntax, and keys that stand twice in one object. */
function syntaxIssues(text: string): Issue[] {
  const issues: Issue[] = [];
  const keys: Set<string>[] = [];
  visit(
    text,
    {
      onObjectBegin: () => void keys.push(new Set()),
      onObjectEnd: () => void keys.pop(),
      onObjectProperty: (key, _offset, _length, line, column, pathOf) => {
        const seen = keys.at(-1);
        if (seen?.has(key))
          issues.push({
            path: joinPath([...pathOf(), key]),
            says: `stands twice in one object (again at line ${line + 1}, column ${column + 1}); one value would be lost`,
          });
        seen?.add(key);
      },
      onError: (error: ParseError['error'], offset) =>
        void issues.push({ path: DOCUMENT, says: `is not valid JSON: ${spelled(error)} at ${place(text, offset)}` }),
    },
    { disallowComments: true, allowTrailingComma: false, allowEmptyContent: false },
  );
  const syntax = issues.findIndex(({ path }) => path === DOCUMENT);
  if (syntax >= 0) return [issues[syntax]];
  return issues.length > 0 ? issues : strictJsonIssue(text);
}

const spelled = (error: ParseError['error']): string =>
  printParseErrorCode(error)
    .replace(/([a-z])([A-Z])/g, '$1 $2')
    .toLowerCase();

/** What the forgiving visitor lets pass and JSON does not. */
function strictJsonIssue(text: string): Issue[] {
  try {
    JSON.parse(text);
    return [];
  } catch (error) {
    return [{ path: DOCUMENT, says: `is not valid JSON: ${error instanceof Error ? error.message : 'unreadable'}` }];
  }
}
