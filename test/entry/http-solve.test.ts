import { readFile } from 'node:fs/promises';
import { expect, test } from 'vitest';
import { emptyCase } from '@/lib/casefile/defaults';
import { needsOf } from '@/lib/casefile/needs';
import type { CaseFile } from '@/lib/casefile/schema';
import { plain } from '@/lib/entry/http-door';
import { postSolve } from '@/lib/entry/http-solve';
import { solveCase } from '@/lib/solve-case';

const ADDRESS = 'http://127.0.0.1:4310/api/solve';
const solve = (body: string, signal?: AbortSignal): Promise<Response> =>
  plain(postSolve)(new Request(ADDRESS, { method: 'POST', body, signal }));

async function junction(draws: number): Promise<CaseFile> {
  const casefile = JSON.parse(await readFile('public/examples/junction.case.json', 'utf8')) as CaseFile;
  return { ...casefile, analysis: { ...casefile.analysis, draws } };
}

test('the answer is the result, to the byte', async () => {
  const casefile = await junction(2_000);
  const response = await solve(JSON.stringify(casefile));
  expect(response.status).toBe(200);
  const outcome = await solveCase(casefile);
  expect(outcome.kind).toBe('solved');
  if (outcome.kind === 'solved') expect(await response.text()).toBe(JSON.stringify(outcome.result));
});

test('a case that lacks what its method needs is refused with each need', async () => {
  const response = await solve(JSON.stringify(emptyCase()));
  expect(response.status).toBe(422);
  expect(await response.json()).toEqual({ error: needsOf(emptyCase()) });
});

test('a case that cannot be computed is answered with the reason, at its place', async () => {
  const casefile = await junction(100);
  casefile.approach.B.direction = casefile.approach.A.direction;
  const response = await solve(JSON.stringify(casefile));
  expect(response.status).toBe(422);
  expect(await response.json()).toMatchObject({ error: [{ path: 'approach.B.direction' }] });
});

test('a bad file is refused as everywhere', async () => {
  const response = await solve('{');
  expect(response.status).toBe(422);
  expect(await response.json()).toMatchObject({ error: [{ path: '(document)' }] });
});

test('the work stops when the one who asked goes away', async () => {
  const gone = new AbortController();
  const answered = solve(JSON.stringify(await junction(10_000_000)), gone.signal);
  setTimeout(() => gone.abort(), 50);
  expect((await answered).status).toBe(408);
}, 20_000);
