import { readFile } from 'node:fs/promises';
import { type Locator, type Page, expect } from '@playwright/test';

type Place = readonly [x: number, y: number];

/** The board in the words of someone who draws on it; places are in the world, metres. */
export class DrawingBoard {
  constructor(readonly page: Page) {}

  board = (): Locator => this.page.getByTestId('board');

  async ready(): Promise<void> {
    await expect(this.board()).toBeVisible();
    await expect(this.board().locator('canvas').first()).toBeVisible();
  }

  /** The pixel of a place. */
  private async pixel([x, y]: Place): Promise<[number, number]> {
    return this.board().evaluate(
      (element, [wx, wy]) => {
        const box = element.getBoundingClientRect();
        const { scale, originX, originY } = element.dataset;
        return [box.left + Number(originX) + wx * Number(scale), box.top + Number(originY) - wy * Number(scale)] as [
          number,
          number,
        ];
      },
      [x, y] as const,
    );
  }

  async press(at: Place): Promise<void> {
    await this.page.mouse.move(...(await this.pixel(at)));
    await this.page.mouse.down();
  }
  moveTo = async (to: Place): Promise<void> => this.page.mouse.move(...(await this.pixel(to)), { steps: 8 });
  letGo = (): Promise<void> => this.page.mouse.up();

  /** Presses at one place, moves to another and lets go. */
  async drag(from: Place, to: Place): Promise<void> {
    const [x0, y0] = await this.pixel(from);
    const [x1, y1] = await this.pixel(to);
    const { mouse } = this.page;
    await mouse.move(x0, y0);
    await mouse.down();
    for (let i = 1; i <= 6; i++) await mouse.move(x0 + ((x1 - x0) * i) / 6, y0 + ((y1 - y0) * i) / 6);
    await mouse.up();
  }

  takeUp = (tool: string): Promise<void> => this.page.getByRole('button', { name: tool, exact: true }).click();

  /** The entry of a thing in the list of what is on the board. */
  thing = (name: RegExp): Locator =>
    this.page.getByRole('list', { name: 'Things on the board' }).getByRole('button', { name });
}

/** The answer, as it stands under the board. */
export class AnswerStrip {
  constructor(readonly page: Page) {}

  /** All of it. */
  strip = (): Locator => this.page.getByRole('region', { name: 'Answer', exact: true });
  /** The line that says how the answer stands. */
  state = (): Locator => this.page.locator('[data-status]').first();

  async settled(): Promise<void> {
    await expect(this.state()).toHaveAttribute('data-status', 'settled', { timeout: 20_000 });
  }

  /** The result file, as the page saves it. */
  async save(): Promise<string> {
    const downloading = this.page.waitForEvent('download');
    await this.page.getByRole('button', { name: 'File', exact: true }).click();
    await this.page.getByRole('button', { name: 'Save result…' }).click();
    return readFile(await (await downloading).path(), 'utf8');
  }
}

/** Tabs on until something of that name has the focus; every stop must show it. */
export async function tabTo(page: Page, name: RegExp, most = 120): Promise<void> {
  for (let i = 0; i < most; i++) {
    await page.keyboard.press('Tab');
    const focused = await page.evaluate(() => {
      const element = document.activeElement;
      if (!element || element === document.body) return null;
      const style = getComputedStyle(element);
      const labelled = 'labels' in element ? ((element as HTMLInputElement).labels?.[0]?.textContent ?? '') : '';
      return {
        name: element.getAttribute('aria-label') || labelled || element.textContent?.trim() || '',
        outlined: style.outlineStyle !== 'none' && parseFloat(style.outlineWidth) > 0,
      };
    });
    if (!focused) continue;
    expect(focused.outlined, `the focus on «${focused.name}» can be seen`).toBe(true);
    if (name.test(focused.name)) return;
  }
  throw new Error(`no stop of the Tab key is called ${name}`);
}
