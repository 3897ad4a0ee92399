import { readFileSync, readdirSync } from 'node:fs';
import { posix } from 'node:path';

/** A source file as the architecture sees it. */
export interface Source {
  /** From the root, with forward slashes: `lib/solve/kernel.ts`. */
  path: string;
  text: string;
}

/** One import, of a file of ours (by its path from the root, without ending) or of a package (by its name). */
export interface Import {
  from: string;
  to: string;
  kind: 'file' | 'package';
}

const SOURCE = /\.(ts|tsx|mjs)$/;
const STATEMENT = /(?:^|[\n;])\s*(?:import|export)\b[^'"`;]*?\bfrom\s*['"]([^'"]+)['"]/g;
const BARE = /(?:^|[\n;])\s*import\s*['"]([^'"]+)['"]/g;
const DYNAMIC = /\b(?:import|require)\s*\(\s*['"]([^'"]+)['"]\s*[,)]/g;
const WORKER = /new URL\(\s*['"](\.[^'"]+)['"]\s*,\s*import\.meta\.url/g;

/** Every source file below some paths. */
export function sourcesBelow(...paths: string[]): Source[] {
  return paths.flatMap((path) => {
    if (SOURCE.test(path)) return [{ path, text: readFileSync(path, 'utf8') }];
    return readdirSync(path, { withFileTypes: true })
      .filter((entry) => entry.isDirectory() || SOURCE.test(entry.name))
      .flatMap((entry) => sourcesBelow(posix.join(path, entry.name)));
  });
}

/** Every import of a file: static, type-only, for its effect, dynamic, and of a worker. */
export function importsOf({ path, text }: Source): Import[] {
  const code = withoutComments(text);
  return [STATEMENT, BARE, DYNAMIC, WORKER].flatMap((pattern) =>
    [...code.matchAll(pattern)].map(([, specifier]) => resolved(path, specifier)),
  );
}

/** Comments replaced by nothing; what stands in a text is left. */
export const withoutComments = (text: string): string =>
  text.replace(
    /("(?:\\.|[^"\\\n])*"|'(?:\\.|[^'\\\n])*'|`(?:\\[\s\S]|[^`\\])*`)|\/\*[\s\S]*?\*\/|\/\/[^\n]*/g,
    (_all, kept: string | undefined) => kept ?? '',
  );

function resolved(from: string, specifier: string): Import {
  if (specifier.startsWith('@/')) return { from, to: withoutEnding(specifier.slice(2)), kind: 'file' };
  if (specifier.startsWith('.'))
    return { from, to: withoutEnding(posix.normalize(posix.join(posix.dirname(from), specifier))), kind: 'file' };
  const parts = specifier.split('/');
  return { from, to: specifier.startsWith('@') ? parts.slice(0, 2).join('/') : parts[0], kind: 'package' };
}

const withoutEnding = (path: string): string => path.replace(SOURCE, '');

/** The cycles of files that import one another, each as the way round. */
export function cyclesOf(imports: readonly Import[]): string[][] {
  const next = new Map<string, string[]>();
  for (const { from, to } of imports.filter(({ kind }) => kind === 'file'))
    next.set(withoutEnding(from), [...(next.get(withoutEnding(from)) ?? []), to]);
  const done = new Set<string>();
  const cycles: string[][] = [];
  const visit = (file: string, way: string[]): void => {
    const at = way.indexOf(file);
    if (at >= 0) return void cycles.push([...way.slice(at), file]);
    if (done.has(file)) return;
    for (const to of next.get(file) ?? []) visit(to, [...way, file]);
    done.add(file);
  };
  for (const file of next.keys()) visit(file, []);
  return cycles;
}
