import { spawn } from 'node:child_process';
import { readFile } from 'node:fs/promises';
import { text } from 'node:stream/consumers';
import { expect, test } from '@playwright/test';
import { AnswerStrip } from './drawing';
import { OpenCase } from './keeping';

/** A case with changes at dotted paths. */
async function changed(file: string, changes: Record<string, unknown>): Promise<string> {
  const casefile = JSON.parse(await readFile(file, 'utf8'));
  for (const [path, to] of Object.entries(changes)) {
    const keys = path.split('.');
    const last = keys.pop() ?? '';
    keys.reduce((node, key) => (node[key] ??= {}), casefile)[last] = to;
  }
  return JSON.stringify(casefile);
}

/** The headless command: what it says on standard error, and its exit code. */
async function refusedByCommand(casefile: string): Promise<{ says: string; code: number | null }> {
  const command = spawn('npm', ['run', '--silent', 'solve', '--', '-'], { stdio: ['pipe', 'ignore', 'pipe'] });
  command.stdin.end(casefile);
  const ended = new Promise<number | null>((resolve) => command.on('close', resolve));
  const says = await text(command.stderr);
  return { says, code: await ended };
}

const q = (value: number) => ({ value });
const STRAIGHT = 'test/cases/spin-straight.case.json';
const ICE = {
  name: 'Ice',
  outline: [
    [-1.2, -3],
    [4.8, -3],
    [4.8, 3],
    [-1.2, 3],
  ],
  friction: q(0.06),
};

const UNSOLVABLE: [title: string, file: string, changes: Record<string, unknown>, says: string][] = [
  [
    'a vehicle that rolls away downhill',
    STRAIGHT,
    { 'departure.A.slope': { grade: q(0.3), uphill: q(180) }, 'departure.A.friction': q(0.1) },
    'vehicle A does not come to rest: friction and braking as stated cannot hold it on this slope',
  ],
  [
    'a rest pose on ice that no separation leads to',
    STRAIGHT,
    { 'departure.A.slope': { grade: q(0.12), uphill: q(0) }, scene: { surfaces: [ICE] } },
    'no separation velocity and yaw rate lead vehicle A to its rest pose',
  ],
  [
    'a contact that never parts',
    'public/examples/nudge.case.json',
    { 'analysis.contact': 'lasting', pulse: q(1.2) },
    'the contact never parts as stated',
  ],
];

for (const [title, file, changes, says] of UNSOLVABLE)
  test(`${title} is refused in the same words by command, HTTP and screen`, async ({ page, request }) => {
    test.setTimeout(150_000);
    const casefile = await changed(file, changes);
    const command = await refusedByCommand(casefile);
    expect(command.code).toBe(1);
    expect(command.says).toContain(says);
    const headers = { 'content-type': 'application/json' };
    const solved = await request.post('/api/solve', { data: Buffer.from(casefile), headers });
    expect(solved.status()).toBe(422);
    const [problem] = (await solved.json()).error;
    expect(`${problem.path}: ${problem.says}`).toBe(command.says.trim().split('\n').at(-1));
    const made = await request.post('/api/cases', { data: Buffer.from(casefile), headers });
    await new OpenCase(page).visit((await made.json()).id);
    const answer = new AnswerStrip(page).strip();
    await expect(answer.getByRole('listitem').filter({ hasText: says })).toBeVisible({ timeout: 60_000 });
  });
