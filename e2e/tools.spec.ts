import { expect, test } from '@playwright/test';
import { DrawingBoard } from './drawing';
import { openExample } from './keeping';

test('Enter on a tool takes it up, although something is selected', async ({ page }) => {
  await openExample(page, 'junction');
  const board = new DrawingBoard(page);
  await board.ready();
  await board.thing(/^Vehicle A/).click();
  const tools = page.getByRole('toolbar', { name: 'Board tools' });
  const measure = tools.getByRole('button', { name: /^Measure/ });
  await measure.focus();
  await page.keyboard.press('Enter');
  await expect(measure).toHaveAttribute('aria-pressed', 'true');
});
