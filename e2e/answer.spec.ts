import { type Page, expect, test } from '@playwright/test';
import { AnswerStrip, DrawingBoard } from './drawing';
import { type OpenCase, openExample } from './keeping';

/** The example at a junction, open and answered. */
async function junction(page: Page): Promise<{ board: DrawingBoard; answer: AnswerStrip; open: OpenCase }> {
  const open = await openExample(page, 'junction');
  const [board, answer] = [new DrawingBoard(page), new AnswerStrip(page)];
  await board.ready();
  await answer.settled();
  return { board, answer, open };
}

const field = (page: Page, path: string) => page.locator(`[id="field-${path}"]`);

test('the answer follows a drag while it is under way, and settles after it', async ({ page }) => {
  const { board, answer } = await junction(page);
  const before = await answer.strip().textContent();
  await board.press([2.35, 1.63]); // the handle ahead of the nose of B
  await board.moveTo([1.4, 2.1]);
  await expect(answer.state()).toHaveAttribute('data-status', 'live');
  await board.letGo();
  await answer.settled();
  expect(await answer.strip().textContent()).not.toBe(before);
});

test('what is drawn stands in the ledger, what is typed stands on the board, and undo takes both back', async ({
  page,
}) => {
  const { board, open } = await junction(page);
  const x = field(page, 'impact.A.x');
  await expect(x).toHaveValue('\u22122.05 ± 0.08');
  await board.drag([-3.2, 0.9], [-3.7, 0.9]);
  await expect(x).toHaveValue('\u22122.55 ± 0.08');
  await x.fill('-8 ft 6 in');
  await x.press('Enter');
  await expect(x).toHaveValue('\u22122.5908 ± 0.08');
  await expect(board.thing(/^Vehicle A/)).toHaveAccessibleName(/mass centre at \u22122\.59/);
  await open.undo().click();
  await open.undo().click();
  await expect(x).toHaveValue('\u22122.05 ± 0.08');
});

test('an entry that cannot be read says why, and the last good value stays in force', async ({ page }) => {
  const { answer } = await junction(page);
  const mass = field(page, 'vehicles.A.mass');
  const before = await mass.inputValue();
  await mass.fill('12 furlong');
  await mass.press('Enter');
  await expect(page.getByRole('alert').filter({ hasText: 'furlong' })).toContainText('is no unit known here');
  await expect(mass).toHaveAttribute('aria-invalid', 'true');
  await expect(answer.state()).toHaveAttribute('data-status', 'settled');
  await mass.press('Escape');
  await expect(mass).toHaveValue(before);
});

test('work beyond half a second shows its progress and can be cancelled', async ({ page }) => {
  const { answer } = await junction(page);
  const draws = page.getByRole('textbox', { name: 'Draws' });
  await draws.fill('5000000');
  await draws.press('Enter');
  await expect(answer.strip().getByRole('progressbar')).toBeVisible();
  await answer.strip().getByRole('button', { name: 'Cancel' }).click();
  await expect(answer.state()).toHaveAttribute('data-status', 'cancelled');
  await draws.fill('20000');
  await draws.press('Enter');
  await answer.settled();
});

test('a failing check withholds the figures and says why', async ({ page }) => {
  const { answer } = await junction(page);
  const direction = field(page, 'approach.B.direction');
  await direction.fill('4');
  await direction.press('Enter');
  await answer.settled();
  await expect(answer.strip()).toContainText('withheld');
  await expect(answer.strip()).toContainText('nearly in line');
});
