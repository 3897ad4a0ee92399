import { expect, test } from '@playwright/test';
import { AnswerStrip } from './drawing';
import { OpenCase, openExample } from './keeping';

test.describe('a narrow screen', () => {
  test.use({ viewport: { width: 390, height: 844 } });

  test('shows the ledger below the board, and a value can be changed there', async ({ page }) => {
    await openExample(page, 'junction');
    const answer = new AnswerStrip(page);
    await answer.settled();
    const mass = page.locator('[id="field-vehicles.A.mass"]');
    await mass.scrollIntoViewIfNeeded();
    await expect(mass).toBeInViewport({ ratio: 1 });
    const before = await answer.strip().textContent();
    await mass.fill('1700 ± 20');
    await mass.press('Enter');
    await expect.poll(() => answer.strip().textContent()).not.toBe(before);
    await answer.settled();
  });
});

test.describe('a window of 1280 by 720', () => {
  test.use({ viewport: { width: 1280, height: 720 } });

  test('cuts nothing short where the answer is folded to one line, and remembers that it is', async ({ page }) => {
    await new OpenCase(page).visit('junction');
    const answer = new AnswerStrip(page);
    await answer.settled();
    await page.getByRole('button', { name: 'Fold the answer to one line' }).click();
    await expect(answer.strip().getByText(/^1 caution/)).toBeInViewport({ ratio: 1 });
    const cut = await answer
      .strip()
      .locator('p:not([role="status"])')
      .evaluateAll((lines) => lines.filter((line) => line.scrollWidth > line.clientWidth).map((l) => l.textContent));
    expect(cut).toEqual([]);
    await page.reload();
    await answer.settled();
    await expect(page.getByRole('button', { name: 'Unfold the answer' })).toBeVisible();
  });
});
