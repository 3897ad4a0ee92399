import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { emptyCase } from '@/lib/casefile/defaults';
import { applyEdit } from '@/lib/casefile/edit';
import { fieldsOf } from '@/lib/casefile/fields';
import type { CaseFile } from '@/lib/casefile/schema';
import { type Command, commandsOf, matching } from '@/lib/session/commands';

const example = (name: string): CaseFile =>
  JSON.parse(readFileSync(`public/examples/${name}.case.json`, 'utf8')) as CaseFile;
const CASES: [string, CaseFile][] = [
  ['an empty case', emptyCase()],
  ['the junction', example('junction')],
  ['the queue', example('queue')],
];
const titles = (commands: readonly Command[]): string[] => commands.map(({ title }) => title);

describe.each(CASES)('the commands of %s', (_name, casefile) => {
  const commands = commandsOf(casefile);

  test('have ids, titles and keys of their own', () => {
    expect(new Set(commands.map(({ id }) => id)).size).toBe(commands.length);
    expect(new Set(titles(commands)).size).toBe(commands.length);
    const keys = commands.flatMap(({ key }) => key ?? []);
    expect(new Set(keys).size).toBe(keys.length);
  });

  test('reach every row and every thing that has one', () => {
    const ids = new Set(commands.map(({ id }) => id));
    for (const { path, thing } of fieldsOf(casefile)) {
      expect(ids).toContain(`row.${path}`);
      expect(ids).toContain(`select.${thing}`);
    }
  });

  test('every edit among them is accepted and changes something', () => {
    const edits = commands.flatMap(({ does }) => (does.do === 'edit' ? [does.edit] : []));
    expect(edits.length).toBeGreaterThanOrEqual(2);
    for (const edit of edits) {
      const edited = applyEdit(casefile, edit);
      expect(edited.ok && edited.casefile !== casefile).toBe(true);
    }
  });
});

test('the units and the method that are in force are not offered', () => {
  const casefile: CaseFile = { ...example('junction'), display: { units: 'us', paper: 'Letter' } };
  const ids = commandsOf(casefile).map(({ id }) => id);
  expect(ids).toContain('units.metric');
  expect(ids).not.toContain('units.us');
  expect(ids).toContain('method.restitution');
  expect(ids).not.toContain('method.directions');
});

test('switching the units keeps the paper', () => {
  const casefile: CaseFile = { ...example('junction'), display: { units: 'metric', paper: 'Letter' } };
  const command = commandsOf(casefile).find(({ id }) => id === 'units.us');
  if (command?.does.do !== 'edit') throw new Error('no edit');
  const edited = applyEdit(casefile, command.does.edit);
  expect(edited.ok && edited.casefile.display).toEqual({ units: 'us', paper: 'Letter' });
});

describe('what can be done with the selected thing', () => {
  const casefile = example('junction');
  const verbs = (thing: Parameters<typeof commandsOf>[1]): string[] =>
    titles(commandsOf(casefile, thing).filter(({ id }) => id.startsWith('selected.')));

  test('depends on the thing', () => {
    expect(verbs(null)).toEqual([]);
    expect(verbs('vehicle.A')).toEqual([]);
    expect(verbs('leg.B.1')).toEqual(['Duplicate leg 2 of B', 'Delete leg 2 of B']);
    expect(verbs('approach.A')).toEqual(['Delete the approach of A']);
  });

  test('deleting is an edit that is accepted', () => {
    const command = commandsOf(casefile, 'leg.B.1').find(({ id }) => id === 'selected.delete');
    if (command?.does.do !== 'delete') throw new Error('no such command');
    const edited = applyEdit(casefile, command.does.edit);
    expect(edited.ok && edited.casefile.departure.B).toMatchObject({ legs: [{}] });
  });
});

describe('finding a command', () => {
  const commands = commandsOf(example('junction'));

  test('takes every word, in any order and case', () => {
    const found = titles(matching(commands, 'MASS a'));
    expect(found).toContain('A: Mass');
    expect(found).not.toContain('Undo');
    for (const title of found) expect(title.toLowerCase()).toContain('mass');
  });

  test('puts first what begins so', () => {
    expect(titles(matching(commands, 'select'))[0]).toMatch(/^Select /);
    expect(titles(matching(commands, 'select')).at(-1)).toMatch(/^Tool: Select/);
  });

  test('finds all with nothing typed and nothing with nonsense', () => {
    expect(matching(commands, '  ')).toEqual(commands);
    expect(matching(commands, 'qqq')).toEqual([]);
  });
});
