import { type Page, expect, test } from '@playwright/test';
import { AnswerStrip, DrawingBoard } from './drawing';
import { openExample } from './keeping';

/** Damage and recorded delta-V, entered in the ledger. */

const field = (page: Page, path: string) => page.locator(`[id="field-${path}"]`);

async function enter(page: Page, path: string, typed: string): Promise<void> {
  await field(page, path).fill(typed);
  await field(page, path).press('Enter');
}

test('damage is added, shaped and taken away again, and stands beside the answer', async ({ page }) => {
  const open = await openExample(page, 'queue');
  const answer = new AnswerStrip(page);
  await new DrawingBoard(page).ready();
  await page.getByRole('button', { name: 'Add the damage of A' }).click();
  await expect(field(page, 'damage.A.width')).toBeFocused();
  await enter(page, 'damage.A.depths.0', '4 ± 1 cm');
  await expect(field(page, 'damage.A.depths.0')).toHaveValue('0.04 ± 0.01');
  await answer.settled();
  await expect(page.getByText(/Only the damage of A is given/).first()).toBeVisible();
  await page.getByRole('button', { name: 'Take away depth 4 of A' }).click();
  await expect(field(page, 'damage.A.depths.3')).toHaveCount(0);
  await page.getByRole('button', { name: 'Add a depth of A' }).click();
  await expect(field(page, 'damage.A.depths.3')).toBeFocused();
  await page.getByRole('button', { name: 'Take away the damage of A' }).click();
  await expect(field(page, 'damage.A.width')).toHaveCount(0);
  await open.undo().click();
  await expect(field(page, 'damage.A.width')).toHaveValue(/1\.2/);
});

test('a recorded delta-V that contradicts the answer is pointed at', async ({ page }) => {
  await openExample(page, 'queue');
  const answer = new AnswerStrip(page);
  await new DrawingBoard(page).ready();
  await page.getByRole('button', { name: 'Add A: delta-V recorded, forward' }).click();
  await enter(page, 'recorded.A.forward', '-30 ± 1 km/h');
  await answer.settled();
  await expect(page.getByText(/the recorded forward delta-V of A is .30\.0 km\/h/).first()).toBeVisible();
});
