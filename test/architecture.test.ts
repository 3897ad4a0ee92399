import { describe, expect, test } from 'vitest';
import { type Import, type Source, cyclesOf, importsOf, sourcesBelow, withoutComments } from './support/imports';

/**
 * Which layer may import which. A layer is a folder of lib or of components, or one of the few files that stand alone; a
 * layer may always import itself. `door` is what only the server and the command open; `entry` is what a tab opens too.
 */
const MAY: Record<string, readonly string[]> = {
  units: [],
  geometry: [],
  numerics: [],
  mechanics: ['geometry', 'numerics'],
  scene: ['geometry'],
  casefile: ['scene', 'units', 'geometry'],
  evidence: ['casefile', 'scene', 'mechanics', 'geometry', 'numerics', 'units'],
  solve: ['evidence', 'mechanics', 'geometry', 'numerics', 'casefile'],
  results: ['solve', 'evidence', 'mechanics', 'numerics', 'geometry', 'casefile', 'units'],
  'fit-case': ['evidence', 'solve', 'results', 'casefile'],
  'solve-case': ['fit-case', 'evidence', 'solve', 'results', 'casefile'],
  report: ['results', 'evidence', 'casefile', 'scene', 'geometry', 'units'],
  session: ['casefile', 'scene', 'geometry'],
  store: ['casefile'],
  entry: ['solve-case', 'solve', 'evidence', 'casefile'],
  door: ['entry', 'solve-case', 'solve', 'report', 'results', 'casefile', 'store'],
  ui: [],
  components: [
    'ui',
    'units',
    'geometry',
    'scene',
    'casefile',
    'evidence',
    'results',
    'solve-case',
    'report',
    'session',
    'entry',
  ],
  app: ['components', 'ui', 'entry', 'door', 'casefile'],
};

/** Layers that compute from their arguments alone: no framework, no clock, no chance, no talk. */
const PURE = [
  'units',
  'geometry',
  'numerics',
  'mechanics',
  'scene',
  'casefile',
  'evidence',
  'solve',
  'results',
  'fit-case',
  'solve-case',
  'report',
  'session',
];
const FRAMEWORKS = /^(react|react-dom|next|konva|react-konva|better-sqlite3|kysely)$|^node:/;
const IMPURE =
  /\bMath\.random\b|\bDate\.now\b|\bnew Date\(\s*\)|\bconsole\.|\bperformance\.now\b|\blocalStorage\b|\bprocess\.env\b/;

/** Packages that have one home. */
const HOMES: Record<string, RegExp> = {
  'better-sqlite3': /^lib\/store\//,
  kysely: /^lib\/store\//,
  'decimal.js': /^lib\/units\//,
  konva: /^components\/canvas\//,
  'react-konva': /^components\/canvas\//,
};

function layerOf(path: string): string {
  const [top, folder = ''] = path.split('/');
  if (top === 'components') return folder === 'ui' ? 'ui' : 'components';
  if (top !== 'lib') return 'app';
  if (folder !== 'entry') return folder.replace(/\.ts$/, '');
  return /^lib\/entry\/(worker|worker-pool|protocol)(\.ts)?$/.test(path) ? 'entry' : 'door';
}

const edgeProblem = ({ from, to, kind }: Import): string[] => {
  if (kind === 'package') {
    const home = HOMES[to];
    const foreign = home && !home.test(from);
    const framework = PURE.includes(layerOf(from)) && FRAMEWORKS.test(to);
    return foreign || framework ? [`${from} may not import the package ${to}`] : [];
  }
  const [layer, other] = [layerOf(from), layerOf(to)];
  return layer === other || MAY[layer]?.includes(other) ? [] : [`${from} (${layer}) may not import ${to} (${other})`];
};

function textProblem({ path, text }: Source): string[] {
  if (!PURE.includes(layerOf(path))) return [];
  const found = IMPURE.exec(withoutComments(text));
  return found ? [`${path} may not use ${found[0]}`] : [];
}

/** Everything that a tree of sources does against the plan. */
function problemsOf(sources: readonly Source[]): string[] {
  const imports = sources.flatMap(importsOf);
  return [
    ...sources.filter(({ path }) => !(layerOf(path) in MAY)).map(({ path }) => `${path} lies in no known layer`),
    ...imports.flatMap(edgeProblem),
    ...sources.flatMap(textProblem),
    ...cyclesOf(imports).map((way) => `a cycle: ${way.join(' -> ')}`),
  ];
}

const tree = sourcesBelow('lib', 'components', 'app', 'proxy.ts', 'instrumentation-client.ts');

describe('the sources keep to the plan', () => {
  test('no import against the table, no cycle, nothing impure in a pure layer', () => {
    expect(problemsOf(tree)).toEqual([]);
  });

  test('every layer of the table is there, and the checker saw the imports', () => {
    const seen = new Set(tree.map(({ path }) => layerOf(path)));
    expect(Object.keys(MAY).filter((layer) => !seen.has(layer))).toEqual([]);
    expect(tree.flatMap(importsOf).length).toBeGreaterThan(200);
  });
});

describe('the checker can fail', () => {
  const plant = (path: string, text: string): string[] => problemsOf([{ path, text }]);

  test.each([
    ['a wrong edge', 'lib/mechanics/impact.ts', `import { solve } from '@/lib/solve/solve';`],
    ['a type alone', 'lib/numerics/root.ts', `import type { CaseFile } from '@/lib/casefile/schema';`],
    ['over several lines', 'lib/units/unit.ts', `import {\n  a,\n  b,\n} from '@/lib/geometry/point';`],
    ['a relative path', 'lib/numerics/root.ts', `import { x } from '../mechanics/impact';`],
    ['for its effect', 'lib/solve/solve.ts', `import '@/lib/results/names';`],
    ['passed on', 'lib/geometry/point.ts', `export { x } from '@/lib/numerics/root';`],
    ['everything passed on', 'lib/geometry/point.ts', `export * from '@/lib/numerics/root';`],
    ['on demand', 'lib/report/report.ts', `const x = await import('@/lib/store/cases');`],
    ['by a worker', 'lib/session/session.ts', `new Worker(new URL('../entry/worker.ts', import.meta.url))`],
    ['a tab to the store', 'components/panels/list.tsx', `import { listCases } from '@/lib/store/cases';`],
    ['a tab to a door', 'components/panels/list.tsx', `import { keptCases } from '@/lib/entry/kept-cases';`],
    ['a page to the engine', 'app/page.tsx', `import { solve } from '@/lib/solve/solve';`],
    ['ui to the domain', 'components/ui/button.tsx', `import type { CaseFile } from '@/lib/casefile/schema';`],
    ['React in lib', 'lib/session/session.ts', `import { useState } from 'react';`],
    ['a part of a framework', 'lib/report/report.ts', `import x from 'react-dom/server';`],
    ['files in lib', 'lib/casefile/parse.ts', `import { readFileSync } from 'node:fs';`],
    ['Konva outside the canvas', 'components/panels/list.tsx', `import Konva from 'konva';`],
    ['the driver outside the store', 'app/page.tsx', `import Database from 'better-sqlite3';`],
    ['chance', 'lib/solve/draws.ts', `export const x = Math.random();`],
    ['the clock', 'lib/session/session.ts', `const now = Date.now();`],
    ['the clock by another name', 'lib/report/report.ts', `const now = new Date();`],
    ['talk', 'lib/casefile/parse.ts', `console.log('here');`],
    ['a new folder', 'lib/helpers/thing.ts', `export const x = 1;`],
  ])('%s', (_what, path, text) => {
    expect(plant(path, text)).toHaveLength(1);
  });

  test('a cycle', () => {
    const sources = [
      { path: 'lib/solve/a.ts', text: `import { b } from './b';` },
      { path: 'lib/solve/b.ts', text: `import type { c } from '@/lib/solve/c';` },
      { path: 'lib/solve/c.ts', text: `export { a } from './a';` },
    ];
    expect(problemsOf(sources)).toEqual(['a cycle: lib/solve/a -> lib/solve/b -> lib/solve/c -> lib/solve/a']);
  });

  test.each([
    [
      'what a comment says',
      'lib/solve/draws.ts',
      `// import { x } from '@/lib/store/cases';\n/* Math.random() */ const x = 'a // b';`,
    ],
    ['an allowed edge', 'lib/solve/draws.ts', `import { x } from '@/lib/numerics/random';`],
    ['a date that was given', 'lib/report/report.ts', `const day = new Date(at).toISOString();`],
  ])('but lets pass %s', (_what, path, text) => {
    expect(plant(path, text)).toEqual([]);
  });
});
