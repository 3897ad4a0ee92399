import { cpus } from 'node:os';
import { Worker } from 'node:worker_threads';
import { summarise } from '@/lib/numerics/quantile';
import { Kernel, BLOCK } from '@/lib/solve/kernel';
import { sobolIndices } from '@/lib/solve/sobol';
import { type Outcome, solveCase } from '@/lib/solve-case';
import { plainMonteCarlo } from '../support/plain-monte-carlo';
import { plainSummary } from '../support/plain-summary';
import { benchCase, benchProblem, plainDraws } from './cases';
import { type Line, compare, medianTime, times } from './measure';
import { simulatedTravel } from './travel';
import { mathjsMonteCarlo } from './with-mathjs';

/**
 * npm run bench: ratios within one run, medians of seven interleaved rounds, after both sides were seen to give the same
 * answers. Goals are those of the project for its engine; nothing here fails a test.
 */

const casefile = benchCase();
const draws = (n: number) => () => solveCase(casefile, { draws: n, sensitivity: false });
const plain = (n: number) => () => plainMonteCarlo(casefile, 'directions', n, 0.95, plainDraws(casefile));

function bands(outcome: Outcome) {
  if (outcome.kind !== 'solved') throw new Error('the bench case was not solved');
  return outcome.result.bands;
}

/** Both sides must agree within five standard errors of the mean before they are timed. */
async function seenToAgree(): Promise<string> {
  const n = 20_000;
  const ours = bands(await draws(n)());
  const theirs = plain(n)().bands;
  const library = mathjsMonteCarlo(casefile, plainDraws(casefile), 3000);
  const checks: [string, number, number, number][] = [
    ...['A.approachSpeed', 'B.deltaV', 'closingSpeed', 'energyLost'].map((name): [string, number, number, number] => [
      name,
      ours[name].mean,
      theirs[name].mean,
      (5 * ours[name].sd * Math.SQRT2) / Math.sqrt(n),
    ]),
    [
      'A.approachSpeed (mathjs)',
      ours['A.approachSpeed'].mean,
      library[0].mean,
      (5 * ours['A.approachSpeed'].sd) / Math.sqrt(3000),
    ],
  ];
  for (const [name, a, b, tolerance] of checks)
    if (!(Math.abs(a - b) <= tolerance)) throw new Error(`${name}: ${a} against ${b}, more than ${tolerance} apart`);
  return `${checks.length} figures agree with the peers within five standard errors`;
}

async function monteCarlo(): Promise<Line> {
  const n = 100_000;
  const { ratio, ours } = await compare(draws(n), plain(n / 5), 7, 1 / 5);
  return {
    id: 'G1',
    what: 'Monte Carlo, 100,000 draws, one thread, against the plain reference (timed at 20,000 and scaled up)',
    goal: '>= 40',
    found: `${times(ratio)}; ${((ours * 1e6) / n).toFixed(0)} ns a draw`,
  };
}

async function againstLibrary(): Promise<Line> {
  const { ratio } = await compare(draws(3000), () => mathjsMonteCarlo(casefile, plainDraws(casefile), 3000));
  return { id: 'G2', what: 'the same, 3,000 draws, against mathjs', goal: '>= 250', found: times(ratio) };
}

async function statistics(): Promise<Line[]> {
  const sizes = [
    [10_000, '>= 4'],
    [1_000_000, '>= 5.5'],
  ] as const;
  const lines: Line[] = [];
  for (const [n, goal] of sizes) {
    const values = new Float64Array(n).map(
      () => Math.sqrt(-2 * Math.log(1 - Math.random())) * Math.cos(7 * Math.random()),
    );
    const exact = plainSummary([...values], 0.95);
    const fast = summarise(values.slice(), 0.95);
    if (fast.low !== exact.low || fast.high !== exact.high || fast.median !== exact.median)
      throw new Error('statistics differ');
    const { ratio } = await compare(
      () => summarise(values.slice(), 0.95),
      () => values.slice().sort(),
    );
    lines.push({
      id: 'G3',
      what: `statistics of ${n.toLocaleString('en')} values, against sorting them`,
      goal,
      found: times(ratio),
    });
  }
  return lines;
}

/** From an edit to new bands, through a worker, against the plain reference on the main thread. */
async function throughWorker(): Promise<Line> {
  const url = new URL('./worker.ts', import.meta.url).href;
  const worker = new Worker(
    `import('tsx/esm/api').then(({ register }) => { register(); return import(${JSON.stringify(url)}); })`,
    { eval: true },
  );
  const ask = (): Promise<unknown> =>
    new Promise((resolve) => {
      worker.once('message', resolve);
      worker.postMessage({ casefile, draws: 10_000 });
    });
  const { ours, ratio } = await compare(ask, plain(10_000));
  await worker.terminate();
  return {
    id: 'G11',
    what: 'an edit to 28 bands, 10,000 draws, through a worker, against the plain reference',
    goal: '>= 30, <= 16 ms',
    found: `${times(ratio)}, ${ours.toFixed(1)} ms`,
  };
}

async function growth(): Promise<Line> {
  const few = (await medianTime(draws(10_000), 15)) / 10_000;
  const many = (await medianTime(draws(1_000_000), 3)) / 1_000_000;
  return {
    id: 'G13',
    what: 'time a draw at 1,000,000 draws over that at 10,000',
    goal: '<= 1.3',
    found: (many / few).toFixed(2),
  };
}

async function sensitivity(): Promise<Line> {
  const problem = benchProblem();
  const kernel = new Kernel(problem);
  const slots = problem.inputs.flatMap((input, slot) => (input.spread.shape === 'fixed' ? [] : [slot]));
  const blocks = 16;
  const { ours, peer } = await compare(
    () => sobolIndices(problem, slots, blocks * BLOCK, ['A.approachSpeed', 'B.approachSpeed']),
    () => {
      for (let block = 0; block < blocks * (slots.length + 2); block++) {
        kernel.draw(block, BLOCK);
        kernel.solve(BLOCK);
      }
    },
  );
  return {
    id: 'G14',
    what: "Sobol' indices, per solve, against drawing and solving",
    goal: '<= 1.6',
    found: (ours / peer).toFixed(2),
  };
}

process.stdout.write(
  `${await seenToAgree()}\nNode ${process.version}, ${cpus().length} x ${cpus()[0]?.model ?? 'unknown processor'}\n\n`,
);
for (const bench of [monteCarlo, againstLibrary, statistics, throughWorker, growth, sensitivity, simulatedTravel])
  for (const { id, what, goal, found } of [await bench()].flat())
    process.stdout.write(`${id.padEnd(4)} ${what}\n     ${found}   (goal ${goal})\n`);
