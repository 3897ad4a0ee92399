import { execFile } from 'node:child_process';
import { mkdtemp, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { type Page, expect } from '@playwright/test';
import type { Result } from '@/lib/results/result';

interface PrintedPage {
  width: number;
  height: number;
  text: string;
}

/** Prints the report that is open, and reads the pages back. Sizes in millimetres. */
export async function printed(page: Page): Promise<PrintedPage[]> {
  await expect(page.locator('html[data-report-ready]')).toBeAttached();
  const bytes = await page.pdf({ preferCSSPageSize: true, printBackground: true, tagged: true, outline: true });
  const { getDocument } = await import('pdfjs-dist/legacy/build/pdf.mjs');
  const pdf = await getDocument({ data: new Uint8Array(bytes), verbosity: 0 }).promise;
  const pages: PrintedPage[] = [];
  for (let k = 1; k <= pdf.numPages; k++) {
    const sheet = await pdf.getPage(k);
    const [, , width, height] = sheet.view;
    const { items } = await sheet.getTextContent();
    const text = items.map((item) => ('str' in item ? item.str : '')).join(' ');
    pages.push({ width: (width * 25.4) / 72, height: (height * 25.4) / 72, text: text.replaceAll(/\s+/g, ' ') });
  }
  return pages;
}

const run = promisify(execFile);

/** What npm run solve says of a case file: its standard output, to the byte. */
export async function solveCommand(caseText: string): Promise<string> {
  const file = join(await mkdtemp(join(tmpdir(), 'retrodict-solve-')), 'case.json');
  await writeFile(file, caseText);
  const { stdout } = await run('npm', ['run', '--silent', 'solve', '--', file], { maxBuffer: 1 << 26 });
  return stdout;
}

/** Holds the leading speeds in a printed text (km/h) against a result (m/s), to the printed digits. */
export function expectSpeeds(text: string, result: Result): void {
  for (const [label, name] of [
    ['Approach speed of A', 'A.approachSpeed'],
    ['Approach speed of B', 'B.approachSpeed'],
    ['Delta-V of A', 'A.deltaV'],
    ['Delta-V of B', 'B.deltaV'],
  ] as const) {
    const found = new RegExp(`${label} (at most )?([\\d.]+) km/h`).exec(text);
    expect(found, `«${label}» is printed with its speed`).not.toBeNull();
    const [, bound, figure] = found as unknown as [string, string | undefined, string];
    const band = result.bands[name];
    const wanted = 3.6 * (bound ? band.shortest[1] : band.median);
    const half = 0.5 * 10 ** -(figure.split('.')[1]?.length ?? 0);
    expect(Math.abs(Number(figure) - wanted), `${label}: ${figure} printed, ${wanted} solved`).toBeLessThanOrEqual(
      half + 1e-9,
    );
  }
}
