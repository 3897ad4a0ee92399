import { expect, test } from '@playwright/test';
import type { CaseFile } from '@/lib/casefile/schema';
import { DrawingBoard } from './drawing';
import { OpenCase, live } from './keeping';

/** Wheels are set at the wheel, where the travel is simulated to a rest pose. */
test('each wheel is steered by its handle and its keys, and braked by number', async ({ page }) => {
  await page.goto('/');
  await live(page);
  await page.getByRole('button', { name: 'New case' }).click();
  await page.waitForURL(/\/cases\/.+/);
  const [open, board] = [new OpenCase(page), new DrawingBoard(page)];
  await open.ready();
  await board.ready();
  await page.getByRole('button', { name: 'Add the rest pose of A' }).click();
  await board.thing(/^Rest pose of A/).click();

  const card = page.getByRole('group', { name: 'Numbers of what is selected' });
  await card.getByRole('button', { name: 'Set each wheel' }).click();

  // A looks along +x; its front left wheel stands at (-2.2 + 1.15, 0.75).
  await board.drag([-1.05 + 0.6, 0.75], [-1.05 + 0.6 * Math.cos(0.35), 0.75 + 0.6 * Math.sin(0.35)]);
  await board.thing(/^Wheel of A, front right/).focus();
  await page.keyboard.press('ArrowLeft');
  await page.keyboard.press('Alt+ArrowLeft');
  await page.keyboard.press('ArrowUp');
  await page.keyboard.press('Enter');
  await card.getByRole('textbox', { name: 'Braking share, front right, on the board' }).fill('1');
  await page.keyboard.press('Enter');

  await open.saved();
  const { text } = await open.saveFile();
  const departure = (JSON.parse(text) as CaseFile).departure.A;
  expect(departure).toMatchObject({
    kind: 'spin',
    wheels: {
      frontLeft: { braking: { value: 0.5 }, steer: { value: expect.closeTo(20, 0) } },
      frontRight: { braking: { value: 1 }, steer: { value: 1.1 } },
      rearLeft: { steer: { value: 0 } },
    },
  });
});
