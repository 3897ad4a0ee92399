import { randomUUID } from 'node:crypto';
import { readFile } from 'node:fs/promises';
import { type Locator, type Page, expect } from '@playwright/test';

/** The list of cases, in the words of someone who keeps them. */
export class CaseDesk {
  constructor(readonly page: Page) {}

  async open(): Promise<void> {
    await this.page.goto('/');
    await expect(this.page.getByRole('heading', { name: 'Cases' })).toBeVisible();
    await live(this.page);
  }
  row = (title: string): Locator =>
    this.page.getByRole('row').filter({ has: this.page.getByRole('link', { name: title, exact: true }) });
  begin = (): Promise<void> => this.page.getByRole('button', { name: 'New case' }).click();
  enter = (title: string): Promise<void> => this.page.getByRole('link', { name: title, exact: true }).click();
  duplicate = (title: string): Promise<void> =>
    this.page.getByRole('button', { name: `Duplicate ${title}`, exact: true }).click();
  remove = (title: string): Promise<void> =>
    this.page.getByRole('button', { name: `Delete ${title}`, exact: true }).click();
  undoDelete = (): Locator => this.page.getByRole('button', { name: 'Undo delete' });
  cautions = (): Locator =>
    this.page.getByRole('region', { name: 'Before you rely on a number' }).getByRole('listitem');

  async openFile(name: string, bytes: Buffer): Promise<void> {
    const choosing = this.page.waitForEvent('filechooser');
    await this.page.getByRole('button', { name: 'Open a case file…' }).click();
    await (await choosing).setFiles({ name, mimeType: 'application/json', buffer: bytes });
  }
}

/** One open case: its name, how it is saved, and what can be done with it as a whole. */
export class OpenCase {
  constructor(readonly page: Page) {}

  async ready(): Promise<void> {
    await expect(this.status()).toBeVisible();
    await live(this.page);
  }
  async visit(id: string): Promise<void> {
    await this.page.goto(`/cases/${id}`);
    await this.ready();
  }
  title = (): Locator => this.page.getByRole('textbox', { name: 'Title', exact: true });
  reference = (): Locator => this.page.getByRole('textbox', { name: 'Reference', exact: true });
  status = (): Locator => this.page.getByRole('banner').getByRole('status').first();
  undo = (): Locator => this.page.getByRole('button', { name: /^Undo:/ });
  redo = (): Locator => this.page.getByRole('button', { name: /^Redo:/ });
  notice = (): Locator => this.page.getByRole('banner').getByRole('alert');

  async rename(title: string): Promise<void> {
    await this.title().fill(title);
    await this.title().press('Enter');
  }
  async saved(): Promise<void> {
    await expect(this.status()).toHaveText(/^saved \d\d:\d\d$/);
  }
  async choose(item: string): Promise<void> {
    await this.page.getByRole('button', { name: 'File', exact: true }).click();
    await this.page.getByRole('button', { name: item, exact: true }).click();
  }
  answer = (choice: string): Promise<void> => this.page.getByRole('button', { name: choice }).click();

  /** Saves the case as a file: its name and what stands in it. */
  async saveFile(): Promise<{ name: string; text: string }> {
    const downloading = this.page.waitForEvent('download');
    await this.choose('Save file…');
    const download = await downloading;
    return { name: download.suggestedFilename(), text: await readFile(await download.path(), 'utf8') };
  }

  /** Drops a file on the window, as from another program. */
  async drop(name: string, text: string): Promise<void> {
    const files = await this.page.evaluateHandle(
      ([fileName, content]) => {
        const transfer = new DataTransfer();
        transfer.items.add(new File([content], fileName, { type: 'application/json' }));
        return transfer;
      },
      [name, text],
    );
    await this.page.dispatchEvent('body', 'dragover', { dataTransfer: files });
    await this.page.dispatchEvent('body', 'drop', { dataTransfer: files });
  }

  id(): string {
    return new URL(this.page.url()).pathname.split('/')[2];
  }
}

/**
 * An example as a case of its own, open, so that tests do not disturb each other: its title is like no other's.
 * @param name the file's name in public/examples, without its ending
 */
export async function openExample(page: Page, name: string): Promise<OpenCase> {
  const example = JSON.parse(await readFile(`public/examples/${name}.case.json`, 'utf8'));
  const made = await page.request.post('/api/cases', { data: { ...example, title: `${name} ${randomUUID()}` } });
  expect(made.status()).toBe(201);
  const open = new OpenCase(page);
  await open.visit((await made.json()).id);
  return open;
}

/** Waits until the page answers to its user: React has taken over what the server drew. */
export async function live(page: Page): Promise<void> {
  await page.waitForFunction(() => {
    const button = document.querySelector('button');
    return button !== null && Object.keys(button).some((key) => key.startsWith('__reactProps'));
  });
}
