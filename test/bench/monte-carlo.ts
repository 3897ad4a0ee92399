import { readFileSync } from 'node:fs';
import { parseCaseText } from '@/lib/casefile/parse';
import type { CaseFile } from '@/lib/casefile/schema';
import { solveCase } from '@/lib/solve-case';
import { engineDraws, plainDraws } from '../support/plain-draws';
import { plainInputs, plainMonteCarlo } from '../support/plain-monte-carlo';
import { type Finding, compare } from './measure';

const COVERAGE = 0.95;

function example(): CaseFile {
  const parsed = parseCaseText(
    readFileSync(new URL('../../public/examples/junction.case.json', import.meta.url), 'utf8'),
  );
  if (!parsed.ok) throw new Error(JSON.stringify(parsed.issues));
  return parsed.casefile;
}

const casefile = example();
const uncertain = plainInputs(casefile).filter(
  ({ quantity }) => quantity.spread && quantity.spread.shape !== 'fixed',
).length;

const engine = (draws: number) => ({
  pieces: draws,
  work: () => solveCase(casefile, { draws, seed: 5, sensitivity: false }),
});

/** Both sides must give the same answer over the same draws before either is timed. */
async function assertSameAnswers(): Promise<number> {
  const draws = 4096;
  const outcome = await solveCase(casefile, { draws, seed: 5, sensitivity: false });
  const plain = plainMonteCarlo(casefile, 'directions', draws, COVERAGE, engineDraws(casefile, 5, draws));
  if (outcome.kind !== 'solved') throw new Error('the example is not solved');
  for (const [name, band] of Object.entries(plain.bands)) {
    const off = Math.abs(outcome.result.bands[name].median - band.median);
    if (!(off <= 1e-9 * (Math.abs(band.median) + band.sd))) throw new Error(`engine and reference differ in ${name}`);
  }
  return Object.keys(plain.bands).length;
}

/** G1: a Monte Carlo of 100,000 draws with all its statistics, one thread, against the plain reference (at 5,000 draws). */
export async function monteCarloAgainstPlain(): Promise<Finding> {
  const results = await assertSameAnswers();
  const plain = {
    pieces: 5000,
    work: () => plainMonteCarlo(casefile, 'directions', 5000, COVERAGE, plainDraws(casefile)),
  };
  const [fast, slow] = await compare(engine(100_000), plain);
  return {
    id: 'G1',
    what: `Monte Carlo, ${uncertain} inputs, ${results} results: ${fast.toFixed(0)} ns a draw against ${slow.toFixed(0)} of the plain reference`,
    found: `${(slow / fast).toFixed(1)} times`,
    goal: '40 times',
    met: slow / fast >= 40,
  };
}

/** G13: a draw among a million may not cost much more than one among ten thousand. */
export async function cost(): Promise<Finding> {
  const [few, many] = await compare(engine(10_000), engine(1_000_000));
  return {
    id: 'G13',
    what: `ns a draw among 1,000,000 (${many.toFixed(0)}) over one among 10,000 (${few.toFixed(0)})`,
    found: (many / few).toFixed(2),
    goal: '1.30 at most',
    met: many / few <= 1.3,
  };
}
