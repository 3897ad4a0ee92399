import { readFile } from 'node:fs/promises';
import AxeBuilder from '@axe-core/playwright';
import { type Page, expect, test } from '@playwright/test';
import { CaseDesk, OpenCase } from './keeping';

/** A new case under a title of its own, open and saved. */
async function begun(page: Page, title: string): Promise<OpenCase> {
  const desk = new CaseDesk(page);
  await desk.open();
  await desk.begin();
  await page.waitForURL(/\/cases\/.+/);
  const open = new OpenCase(page);
  await open.ready();
  await open.rename(title);
  await open.saved();
  return open;
}

test('the list shows the examples, marked, and the five standing cautions', async ({ page }) => {
  const desk = new CaseDesk(page);
  await desk.open();
  for (const title of ['Angled contact at a junction', 'Contact in a queue of traffic'])
    await expect(desk.row(title).filter({ hasText: 'example' })).toHaveCount(1);
  await expect(desk.cautions()).toHaveCount(5);
  await expect(desk.cautions().last()).toContainText('No conclusion about injury');
});

test('a case is begun, named, saved by itself and found again', async ({ page }) => {
  const open = await begun(page, 'Named case');
  await open.reference().fill('N-7');
  await open.reference().press('Tab');
  await open.saved();
  await page.reload();
  await open.ready();
  await expect(open.title()).toHaveValue('Named case');
  await page.getByRole('link', { name: 'Cases' }).click();
  await expect(new CaseDesk(page).row('Named case')).toContainText('N-7');
});

test('undo and redo say what they do, and what they did is saved too', async ({ page }) => {
  const open = await begun(page, 'Before');
  await open.rename('After');
  await expect(open.undo()).toHaveAccessibleName('Undo: title');
  await open.undo().click();
  await expect(open.title()).toHaveValue('Before');
  await open.redo().click();
  await expect(open.title()).toHaveValue('After');
  await open.saved();
  await page.reload();
  await expect(open.title()).toHaveValue('After');
});

test('Escape puts a title back that was being typed', async ({ page }) => {
  const open = await begun(page, 'As it was');
  await open.title().fill('Half typed');
  await open.title().press('Escape');
  await expect(open.title()).toHaveValue('As it was');
});

test('a case is duplicated, deleted, and brought back by undo', async ({ page }) => {
  await begun(page, 'Twice');
  const desk = new CaseDesk(page);
  await desk.open();
  await desk.duplicate('Twice');
  await page.waitForURL(/\/cases\/.+/);
  await expect(new OpenCase(page).title()).toHaveValue('Twice (copy)');
  await desk.open();
  await desk.remove('Twice (copy)');
  await expect(desk.undoDelete()).toBeFocused();
  await expect(desk.row('Twice (copy)')).toHaveCount(0);
  await desk.undoDelete().press('Enter');
  await expect(desk.row('Twice (copy)')).toBeVisible();
  await desk.remove('Twice (copy)');
  await expect(desk.undoDelete()).toBeVisible();
  await desk.open();
  await expect(desk.row('Twice (copy)')).toHaveCount(0);
});

test('a saved file opens again as the same case', async ({ page, request }) => {
  const file = await readFile('public/examples/junction.case.json');
  const { id } = await (await request.post('/api/cases', { data: file })).json();
  const open = new OpenCase(page);
  await open.visit(id);
  const { name, text } = await open.saveFile();
  expect(name).toBe('Angled contact at a junction.case.json');
  const example: unknown = JSON.parse(file.toString());
  expect(JSON.parse(text)).toEqual(example);
  const desk = new CaseDesk(page);
  await desk.open();
  await desk.openFile(name, Buffer.from(text));
  await page.waitForURL((url) => /^\/cases\/.+/.test(url.pathname) && !url.pathname.endsWith(id));
  await open.ready();
  expect(JSON.parse((await open.saveFile()).text)).toEqual(example);
});

test('a bad file is refused with every problem, and the open case stays as it was', async ({ page }) => {
  const open = await begun(page, 'Stays');
  const bad = JSON.parse(await readFile('public/examples/junction.case.json', 'utf8'));
  bad.vehicles.A.mass.value = -5;
  bad.colour = 'red';
  await open.drop('bad.case.json', JSON.stringify(bad));
  await expect(open.notice()).toContainText('bad.case.json was refused');
  await expect(open.notice()).toContainText('vehicles.A.mass.value: must be greater than 0');
  await expect(open.notice()).toContainText('colour: unknown key');
  await expect(open.title()).toHaveValue('Stays');
  await open.notice().getByRole('button', { name: 'Close' }).click();
  await expect(open.notice()).toHaveCount(0);
  await open.drop('good.case.json', await readFile('public/examples/queue.case.json', 'utf8'));
  await expect(open.title()).toHaveValue('Contact in a queue of traffic');
});

test('what another tab saved is not written over; either version can be taken', async ({ page, context }) => {
  const mine = await begun(page, 'Common');
  const theirs = new OpenCase(await context.newPage());
  await theirs.visit(mine.id());
  await theirs.rename('Theirs');
  await theirs.saved();

  await mine.rename('Mine');
  await expect(mine.notice()).toContainText('Another tab saved revision 3');
  await mine.answer('Keep mine as a new case');
  await expect(mine.title()).toHaveValue('Mine (kept copy)');

  await mine.visit(theirs.id());
  await expect(mine.title()).toHaveValue('Theirs');
  await theirs.rename('Theirs again');
  await theirs.saved();
  await mine.rename('Mine again');
  await mine.answer('Take the other version');
  await expect(mine.title()).toHaveValue('Theirs again');
  await mine.undo().click();
  await expect(mine.title()).toHaveValue('Mine again');
  await mine.saved();
});

test('a tab that comes back into sight shows what another one saved', async ({ page, context }) => {
  const first = await begun(page, 'Shown in two');
  const second = new OpenCase(await context.newPage());
  await second.visit(first.id());
  await second.rename('Changed elsewhere');
  await second.saved();
  await page.evaluate(() => document.dispatchEvent(new Event('visibilitychange')));
  await expect(first.title()).toHaveValue('Changed elsewhere');
  await first.rename('And changed here');
  await first.saved();
});

test('without a server the changes are kept in the browser and put back when the case is opened again', async ({
  page,
  context,
}) => {
  const open = await begun(page, 'Safe');
  const id = open.id();
  await context.setOffline(true);
  await open.rename('Drawn while away');
  await expect(open.status()).toHaveText('offline, kept in this browser');
  await page.close();
  await context.setOffline(false);

  const again = new OpenCase(await context.newPage());
  await again.visit(id);
  await expect(again.title()).toHaveValue('Drawn while away');
  await again.saved();
  await expect(again.undo()).toHaveAccessibleName('Undo: what this browser had kept');
});

test('when the server comes back, the changes are saved by themselves', async ({ page, context }) => {
  const open = await begun(page, 'Comes back');
  await context.setOffline(true);
  await open.rename('Drawn while away');
  await expect(open.status()).toHaveText('offline, kept in this browser');
  await context.setOffline(false);
  await open.saved();
});

test('kept changes to a revision that has moved on become a case of their own', async ({ page, request }) => {
  const open = await begun(page, 'Moves on');
  const id = open.id();
  await page.route('**/api/cases/**', (route) => route.abort());
  await open.rename('Drawn while away');
  await expect(open.status()).toHaveText('offline, kept in this browser');
  const { revision, case: casefile } = await (await request.get(`/api/cases/${id}`)).json();
  const elsewhere = { ...casefile, title: 'Moved on' };
  await request.put(`/api/cases/${id}`, { headers: { 'if-match': `"${revision}"` }, data: elsewhere });
  await page.goto('/nothing-here');
  await page.unroute('**/api/cases/**');
  await open.visit(id);
  await expect(open.title()).toHaveValue('Moved on');
  await page.getByRole('link', { name: 'Drawn while away (kept copy)' }).click();
  await expect(open.title()).toHaveValue('Drawn while away (kept copy)');
});

test('an edit made in the last moment before leaving is saved', async ({ page, request }) => {
  const open = await begun(page, 'Leaving');
  const id = open.id();
  await open.rename('Left in a hurry');
  await page.goto('/');
  await expect
    .poll(async () => (await (await request.get(`/api/cases/${id}`)).json()).case.title)
    .toBe('Left in a hurry');
});

test('a case that is not there says so', async ({ page }) => {
  const response = await page.goto('/cases/nobody');
  expect(response?.status()).toBe(404);
  await expect(page.getByRole('heading')).toHaveText('Nothing is kept here');
});

for (const scheme of ['light', 'dark'] as const)
  test(`axe finds nothing on the list, a refusal and the title bar (${scheme})`, async ({ page }) => {
    await page.emulateMedia({ colorScheme: scheme });
    const desk = new CaseDesk(page);
    await desk.open();
    await desk.openFile('bad.json', Buffer.from('{}'));
    await expect(page.getByText('bad.json was refused')).toBeVisible();
    expect((await new AxeBuilder({ page }).analyze()).violations).toEqual([]);
    const open = new OpenCase(page);
    await open.visit('junction');
    expect((await new AxeBuilder({ page }).include('header').analyze()).violations).toEqual([]);
  });

test('the report and the list show what was changed the moment before', async ({ page }) => {
  const open = await begun(page, 'A moment before');
  await open.title().fill('Changed just now');
  await page.getByRole('link', { name: 'Report', exact: true }).click();
  await page.waitForURL(/\/report$/);
  await expect(page.getByText('Changed just now').first()).toBeVisible();
});

test('a case that was deleted elsewhere can be restored, or kept as a new one', async ({ page, request }) => {
  const open = await begun(page, 'Deleted elsewhere');
  await request.delete(`/api/cases/${open.id()}`);
  await open.rename('Drawn on');
  await expect(open.notice()).toContainText('This case was deleted elsewhere');
  await open.answer('Restore the case');
  await open.saved();
  await page.reload();
  await expect(open.title()).toHaveValue('Drawn on');
});
