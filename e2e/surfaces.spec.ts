import { expect, test } from '@playwright/test';
import type { CaseFile } from '@/lib/casefile/schema';
import { DrawingBoard } from './drawing';
import { OpenCase, live } from './keeping';

/** Ground with a friction of its own, drawn, shaped and stated. */
test('a surface is drawn corner by corner, shaped by mouse and keys, and kept', async ({ page }) => {
  await page.goto('/');
  await live(page);
  await page.getByRole('button', { name: 'New case' }).click();
  await page.waitForURL(/\/cases\/.+/);
  const [open, board] = [new OpenCase(page), new DrawingBoard(page)];
  await open.ready();
  await board.ready();

  const click = async (x: number, y: number): Promise<void> => {
    await board.press([x, y]);
    await board.letGo();
  };
  await board.takeUp('Surface');
  await click(2, 1.5);
  await click(6, 1.5);
  await click(6, 4);
  await click(0, 4);
  await page.keyboard.press('Escape');
  await click(3, 4);
  await board.moveTo([1, 3]);
  await page.keyboard.press('Enter');
  await board.takeUp('Select and move');

  await board.drag([6, 4], [6.5, 4.5]);
  await board.thing(/^Surface 1/).focus();
  await page.keyboard.press('ArrowDown');
  const ledger = page.getByRole('complementary', { name: 'Ledger' });
  await ledger.getByRole('textbox', { name: 'Surface 1: name' }).fill('Wet leaves');
  await ledger.getByRole('textbox', { name: 'Surface 1: friction' }).fill('0.35 ± 0.05');
  await page.keyboard.press('Enter');
  await ledger.getByLabel('Corners of surface 1', { exact: true }).click();
  await ledger.getByRole('textbox', { name: 'Surface 1: corner 1, x' }).fill('2.5');
  await page.keyboard.press('Enter');

  await open.saved();
  const { text } = await open.saveFile();
  const [surface] = (JSON.parse(text) as CaseFile).scene?.surfaces ?? [];
  expect(surface).toMatchObject({
    name: 'Wet leaves',
    friction: { value: 0.35, spread: { shape: 'normal', sd: 0.05 } },
  });
  expect(surface.outline).toEqual([
    [2.5, 1.4],
    [6, 1.4],
    [6.5, 4.4],
    [3, 3.9],
  ]);
});

test('a surface is added, moved, taken away and brought back by keyboard', async ({ page }) => {
  await page.goto('/');
  await live(page);
  await page.getByRole('button', { name: 'New case' }).click();
  await page.waitForURL(/\/cases\/.+/);
  const [open, board] = [new OpenCase(page), new DrawingBoard(page)];
  await open.ready();
  await board.ready();
  const press = (key: string): Promise<void> => page.keyboard.press(key);

  await page.getByRole('button', { name: 'Add a surface' }).focus();
  await press('Enter');
  await expect(page.getByRole('textbox', { name: 'Surface 1: name' })).toBeFocused();
  await board.thing(/^Surface 1/).focus();
  await press('Shift+ArrowRight');
  await press('Enter'); // its numbers
  await expect(page.getByRole('textbox', { name: 'Surface 1: friction, on the board' })).toBeFocused();
  await press('Escape');
  await open.saved();
  const outline = (text: string) =>
    (JSON.parse(text) as CaseFile).scene?.surfaces?.map((surface) => surface.outline[0]);
  expect(outline((await open.saveFile()).text)).toEqual([[-2, -2]]);

  await board.thing(/^Surface 1/).focus();
  await press('Delete');
  await expect(board.thing(/^Surface 1/)).toHaveCount(0);
  await press('Control+z');
  await expect(board.thing(/^Surface 1/)).toHaveCount(1);
});
