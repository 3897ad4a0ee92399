import { readFile } from 'node:fs/promises';
import AxeBuilder from '@axe-core/playwright';
import { expect, test } from '@playwright/test';
import type { Result } from '@/lib/results/result';
import { expectSpeeds, printed, solveCommand } from './printed';

const PAPERS = { A4: [210, 297], Letter: [215.9, 279.4] } as const;

for (const name of ['junction', 'queue'])
  for (const [paper, [width, height]] of Object.entries(PAPERS))
    test(`the report of ${name} prints on ${paper}, numbered, hashed and with the speeds of the command`, async ({
      page,
    }) => {
      await page.goto(`/cases/${name}/report?paper=${paper}`);
      const pages = await printed(page);
      const result = JSON.parse(
        await solveCommand(await readFile(`public/examples/${name}.case.json`, 'utf8')),
      ) as Result;
      expectSpeeds(pages[0].text, result);
      pages.forEach((sheet, k) => {
        expect(Math.abs(sheet.width - width)).toBeLessThan(0.5);
        expect(Math.abs(sheet.height - height)).toBeLessThan(0.5);
        expect(sheet.text).toContain(`Page ${k + 1} of ${pages.length}`);
        expect(sheet.text).toContain(result.case.slice(0, 8));
      });
    });

for (const path of ['/cases/junction', '/cases/queue', '/cases/junction/report'])
  test(`axe finds nothing serious on ${path}`, async ({ page }) => {
    await page.goto(path);
    const ready = page.locator('[data-status="settled"], html[data-report-ready]').first();
    await expect(ready).toBeAttached({ timeout: 20_000 });
    const { violations } = await new AxeBuilder({ page }).analyze();
    const serious = violations.filter(({ impact }) => impact === 'serious' || impact === 'critical');
    expect(serious.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' ')}`)).toEqual([]);
  });
