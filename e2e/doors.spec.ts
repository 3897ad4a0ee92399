import { readFile } from 'node:fs/promises';
import { expect, test } from '@playwright/test';
import { AnswerStrip } from './drawing';
import { solveCommand } from './printed';

/** The same case and seed: the same bytes from the command, over HTTP and from the workers of a tab, however many. */
for (const name of ['junction', 'queue', 'rivals'])
  test(`${name}: command, HTTP, one worker and four give the same bytes`, async ({ page, request }) => {
    const text = await readFile(`public/examples/${name}.case.json`, 'utf8');
    const command = (await solveCommand(text)).trim();
    const response = await request.post('/api/solve', {
      data: Buffer.from(text),
      headers: { 'content-type': 'application/json' },
    });
    expect(response.status()).toBe(200);
    expect((await response.text()).trim()).toBe(command);
    for (const workers of [1, 4]) {
      await page.goto(`/cases/${name}?workers=${workers}`);
      const answer = new AnswerStrip(page);
      await answer.settled();
      expect((await answer.save()).trim(), `${workers} workers`).toBe(command);
    }
  });
