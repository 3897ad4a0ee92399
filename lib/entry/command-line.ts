import { readFileSync, writeFileSync } from 'node:fs';
import { type Issue, issueLine } from '@/lib/casefile/issue';
import { parseCase } from '@/lib/casefile/parse';
import { METHODS, type Method } from '@/lib/casefile/schema';
import { solveCase } from '@/lib/solve-case';

/**
 * npm run --silent solve -- case.json …
 * One case: its result on standard output. Several: one JSON line per case, in order. Progress and problems go to
 * standard error. Exit 0 solved, 2 invalid, 1 not solvable; several cases exit with the greatest code.
 */

const USAGE = `usage: npm run --silent solve -- [options] case.json [case2.json …]     (- reads standard input)
  --draws N     draws of the Monte Carlo, 1 to 10000000
  --seed N      seed of the random numbers, a whole number from 0
  --method M    ${METHODS.join(', ')}
  --out FILE    write there instead of to standard output`;

interface Command {
  files: string[];
  draws?: number;
  seed?: number;
  method?: Method;
  out?: string;
}

/** A mistake in the command itself. */
class UsageError extends Error {}

function wholeNumber(option: string, text: string | undefined, low: number, high: number): number {
  const n = text !== undefined && /^\d+$/.test(text) ? Number(text) : NaN;
  if (!(n >= low && n <= high))
    throw new UsageError(`${option}: must be a whole number from ${low} to ${high}, found ${text ?? 'nothing'}`);
  return n;
}

function readCommand(words: readonly string[]): Command {
  const command: Command = { files: [] };
  for (let i = 0; i < words.length; i++) {
    const word = words[i];
    if (word === '--draws') command.draws = wholeNumber(word, words[++i], 1, 10_000_000);
    else if (word === '--seed') command.seed = wholeNumber(word, words[++i], 0, Number.MAX_SAFE_INTEGER);
    else if (word === '--method') {
      const method = METHODS.find((m) => m === words[i + 1]);
      if (!method)
        throw new UsageError(`--method: must be one of ${METHODS.join(', ')}, found ${words[i + 1] ?? 'nothing'}`);
      command.method = method;
      i++;
    } else if (word === '--out') {
      command.out = words[++i];
      if (command.out === undefined) throw new UsageError('--out: needs a file name');
    } else if (word.startsWith('--')) throw new UsageError(`${word}: unknown option`);
    else command.files.push(word);
  }
  if (command.files.length === 0) throw new UsageError('no case file given');
  return command;
}

interface Solved {
  code: 0 | 1 | 2;
  result?: object;
  issues: Issue[];
}

async function solveFile(file: string, command: Command): Promise<Solved> {
  let bytes: Uint8Array;
  try {
    bytes = readFileSync(file === '-' ? 0 : file);
  } catch (error) {
    const why =
      (error as NodeJS.ErrnoException).code === 'ENOENT'
        ? 'no such file'
        : `cannot be read (${(error as Error).message})`;
    return { code: 2, issues: [{ path: file, says: why }] };
  }
  const parsed = parseCase(bytes);
  if (!parsed.ok) return { code: 2, issues: parsed.issues };
  const { draws, seed, method } = command;
  const outcome = await solveCase(parsed.casefile, { draws, seed, method, onProgress: progressOf(file) });
  if (outcome.kind === 'invalid') return { code: 2, issues: outcome.issues };
  if (outcome.kind === 'unsolved') return { code: 1, issues: [outcome.reason] };
  return { code: 0, result: outcome.result, issues: [] };
}

/** Says on a terminal how far the work is; silent where standard error is a file. */
const progressOf = (file: string) => (done: number) => {
  if (process.stderr.isTTY) process.stderr.write(`\r${file}: ${Math.round(100 * done)} %${done === 1 ? '\n' : ''}`);
};

async function main(words: readonly string[]): Promise<number> {
  const command = readCommand(words);
  const several = command.files.length > 1;
  const lines: string[] = [];
  let greatest = 0;
  for (const file of command.files) {
    const { code, result, issues } = await solveFile(file, command);
    greatest = Math.max(greatest, code);
    for (const issue of issues) process.stderr.write(`${several ? `${file}: ` : ''}${issueLine(issue)}\n`);
    const line = result ? JSON.stringify(result) : several ? JSON.stringify({ error: issues }) : null;
    if (line !== null && command.out === undefined) process.stdout.write(`${line}\n`);
    if (line !== null) lines.push(line);
  }
  if (command.out !== undefined && lines.length > 0) writeFileSync(command.out, `${lines.join('\n')}\n`);
  return greatest;
}

try {
  process.exitCode = await main(process.argv.slice(2));
} catch (error) {
  if (!(error instanceof UsageError)) throw error;
  process.stderr.write(`${error.message}\n${USAGE}\n`);
  process.exitCode = 2;
}
