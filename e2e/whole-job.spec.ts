import { type Page, expect, test } from '@playwright/test';
import type { Result } from '@/lib/results/result';
import { AnswerStrip, DrawingBoard, tabTo } from './drawing';
import { OpenCase, live } from './keeping';
import { expectSpeeds, printed, solveCommand } from './printed';

/** From an empty board to a printed answer, once by mouse and once by keyboard. */

/** Of B at contact, rad. */
const HEADING = (80 * Math.PI) / 180;

/** The report of the open case, printed, has the speeds that the command gives for the saved file. */
async function expectPrintedAsSolved(page: Page, caseText: string): Promise<void> {
  const result = JSON.parse(await solveCommand(caseText)) as Result;
  expect(result.checks.filter((check) => check.level === 'fail')).toEqual([]);
  const pages = await printed(page);
  expectSpeeds(pages[0].text, result);
  pages.forEach(({ text }, k) => {
    expect(text).toContain(`Page ${k + 1} of ${pages.length}`);
    expect(text).toContain(result.case.slice(0, 8));
  });
}

test('a case drawn from nothing with the mouse reaches a printed report', async ({ page }) => {
  await page.goto('/');
  await live(page);
  await page.getByRole('button', { name: 'New case' }).click();
  await page.waitForURL(/\/cases\/.+/);
  const [open, board, answer] = [new OpenCase(page), new DrawingBoard(page), new AnswerStrip(page)];
  await open.ready();
  await board.ready();

  await board.drag([2.2, 0.3], [0.9, -0.7]); // B by its body
  await board.drag([-2.05, -1], [0.9 + Math.cos(HEADING), -1 + Math.sin(HEADING)]); // and by the handle ahead of its nose
  await board.takeUp('Contact plane');
  await board.drag([-0.1, -0.3], [-0.1, 1.2]);
  await board.takeUp('Approach');
  await board.drag([-2.2, 0], [-6.5, 0]);
  await board.drag([0.9, -1], [0.9 - 3 * Math.cos(HEADING), -1 - 3 * Math.sin(HEADING)]);
  await board.takeUp('Travel to rest');
  await board.drag([-2.2, 0], [-0.23, 0.35]); // 2 m at 10°
  await board.drag([0.9, -1], [5.23, 1.5]); // 5 m at 30°
  await board.takeUp('Select and move');

  await answer.settled();
  await open.saved();
  const { text } = await open.saveFile();
  await page.getByRole('link', { name: 'Report' }).click();
  await page.waitForURL(/\/report/);
  await expectPrintedAsSolved(page, text);
});

test('a case drawn from nothing with the keyboard alone reaches a printed report', async ({ page }) => {
  const press = async (key: string, times = 1): Promise<void> => {
    for (let i = 0; i < times; i++) await page.keyboard.press(key);
  };
  await page.goto('/');
  await live(page);
  await tabTo(page, /^New case$/);
  await press('Enter');
  await page.waitForURL(/\/cases\/.+/);
  const [open, board, answer] = [new OpenCase(page), new DrawingBoard(page), new AnswerStrip(page)];
  await open.ready();
  await board.ready();

  await tabTo(page, /^Vehicle B/);
  await press('Shift+ArrowLeft');
  await press('ArrowLeft', 3);
  await press('Shift+ArrowDown');
  await press('Shift+BracketRight', 10); // from 180° by ten degrees each to 80°
  await tabTo(page, /^Add the approach of A/);
  await press('Enter');
  await tabTo(page, /^Add the approach of B/);
  await press('Enter');
  await tabTo(page, /^Add the travel of A/);
  await press('Enter');
  await press('Shift+ArrowLeft', 3); // from 5 m to 2 m
  await press('Shift+BracketLeft'); // from 0° to 10°
  await tabTo(page, /^Add the travel of B/);
  await press('Enter');
  await press('Shift+BracketRight', 5); // from 80° to 30°

  await answer.settled();
  await open.saved();
  const { text } = await open.saveFile();
  await page.goto(page.url());
  await open.ready();
  await tabTo(page, /^Report$/);
  await press('Enter');
  await page.waitForURL(/\/report/);
  await expectPrintedAsSolved(page, text);
});
