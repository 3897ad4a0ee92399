import AxeBuilder from '@axe-core/playwright';
import { type Locator, type Page, expect, test } from '@playwright/test';
import { AnswerStrip, DrawingBoard } from './drawing';
import { type OpenCase, openExample } from './keeping';

/** The simulated travel under the board, in the words of someone who looks at it. */
class TravelStrip {
  constructor(readonly page: Page) {}

  strip = (): Locator => this.page.getByRole('group', { name: 'Simulated travel' });
  time = (): Locator => this.strip().getByRole('slider', { name: 'Time from first contact' });
  play = (): Locator => this.strip().getByRole('button', { name: 'Play' });
  pause = (): Locator => this.strip().getByRole('button', { name: 'Pause' });
  figures = (): Locator => this.strip().getByText('Figures', { exact: true });
  rows = (): Locator => this.strip().getByRole('table').getByRole('row');
  seconds = async (): Promise<number> => Number(await this.time().inputValue());
  end = async (): Promise<number> => Number(await this.time().getAttribute('max'));
}

async function simulated(page: Page, example = 'nudge'): Promise<{ travel: TravelStrip; open: OpenCase }> {
  const open = await openExample(page, example);
  await new AnswerStrip(page).settled();
  return { travel: new TravelStrip(page), open };
}

const boardPicture = (page: Page): Promise<Buffer> => page.getByTestId('board').screenshot();

test('the travel is gone through by keyboard, its time is spoken, and the board follows', async ({ page }) => {
  const { travel, open } = await simulated(page);
  await expect(travel.strip()).toHaveAccessibleDescription('illustration of one computed case');
  await expect(travel.strip().getByText('illustration of one computed case', { exact: true })).toBeVisible();
  await new DrawingBoard(page).thing(/^Vehicle A/).click();
  await travel.time().focus();
  await expect(travel.time()).toHaveAttribute('aria-valuetext', /^0\.00\u00a0s from first contact$/);
  const atContact = await boardPicture(page);
  await page.keyboard.press('ArrowRight');
  await expect(travel.time()).toHaveAttribute('aria-valuetext', /^0\.01\u00a0s from first contact$/);
  await page.keyboard.press('PageUp');
  await page.keyboard.press('PageUp');
  await expect.poll(async () => (await boardPicture(page)).equals(atContact)).toBe(false);
  await page.keyboard.press('End');
  await expect(travel.time()).toHaveAttribute('aria-valuetext', /, A at rest, B at rest$/);
  // The keys belong to the time, not to what lies on the board.
  await expect(open.undo()).toBeDisabled();
});

test('play runs in real time, pause holds it, and it ends at the last rest', async ({ page }) => {
  const { travel } = await simulated(page);
  await page.clock.install({ time: 0 });
  await page.clock.pauseAt(60_000);
  await travel.play().press('Enter');
  await page.clock.runFor(400);
  const shown = await travel.seconds();
  expect(Math.abs(shown - 0.4)).toBeLessThanOrEqual(0.05);
  await travel.pause().press('Enter');
  await page.clock.runFor(200);
  expect(await travel.seconds()).toBe(shown);
  await travel.play().press('Enter');
  await page.clock.runFor(5000);
  await expect(travel.play()).toBeVisible();
  expect(await travel.seconds()).toBe(await travel.end());
});

test.describe('with reduced motion', () => {
  test.use({ contextOptions: { reducedMotion: 'reduce' } });

  test('nothing plays, and the time can still be chosen', async ({ page }) => {
    const { travel } = await simulated(page);
    await expect(travel.time()).toBeVisible();
    await expect(travel.play()).toHaveCount(0);
    await travel.time().press('End');
    await expect(travel.time()).toHaveAttribute('aria-valuetext', /B at rest$/);
  });
});

test('the same travel stands in a table, from contact to rest', async ({ page }) => {
  const { travel } = await simulated(page);
  await travel.figures().press('Enter');
  // The head, and for each vehicle its name and eleven times.
  await expect(travel.rows()).toHaveCount(1 + 2 * 12);
  await expect(travel.rows().nth(2)).toHaveText(/^0\.00\u22121\.940\.100\.0/);
  await expect(travel.rows().nth(12).getByRole('cell').nth(1)).toHaveText('\u22121.27');
  await expect(travel.rows().nth(24).getByRole('cell').nth(3)).toHaveText('128.0');
});

for (const scheme of ['light', 'dark'] as const)
  test(`axe finds nothing serious with the figures open (${scheme})`, async ({ page }) => {
    await page.emulateMedia({ colorScheme: scheme });
    const { travel } = await simulated(page);
    await travel.figures().click();
    const { violations } = await new AxeBuilder({ page }).analyze();
    const serious = violations.filter(({ impact }) => impact === 'serious' || impact === 'critical');
    expect(serious.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' ')}`)).toEqual([]);
  });

test('a case whose travel is given by legs shows no simulated travel', async ({ page }) => {
  const { travel } = await simulated(page, 'junction');
  await expect(travel.strip()).toHaveCount(0);
});
