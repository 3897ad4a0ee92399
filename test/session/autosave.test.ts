import { beforeEach, expect, test } from 'vitest';
import { hashOf } from '@/lib/casefile/canonical';
import { emptyCase } from '@/lib/casefile/defaults';
import type { CaseFile } from '@/lib/casefile/schema';
import { Autosave, GATHER, type Sent } from '@/lib/session/autosave';
import { type CopyStorage, type KeptCopy, copyKey, reopenCopies } from '@/lib/session/kept-copies';

const opened = emptyCase('Opened');
const edited = (title: string): CaseFile => ({ ...opened, title });

/** A server, a browser's memory and a clock that stand still until they are told. */
class World {
  sent: { base: number; title: string; leaving: boolean }[] = [];
  copy: KeptCopy | null = null;
  timer: { wait: number; call: () => void } | null = null;
  reply: (base: number, casefile: CaseFile) => Sent = (base) => ({ kind: 'saved', revision: base + 1 });
  /** While set, answers wait for `answer`. */
  held: (() => void)[] | null = null;

  readonly autosave = new Autosave(
    {
      send: async (base, casefile, leaving) => {
        this.sent.push({ base, title: casefile.title, leaving });
        if (this.held) await new Promise<void>((resolve) => this.held?.push(resolve));
        return this.reply(base, casefile);
      },
      keep: (copy) => (this.copy = copy),
      now: () => 1_000,
      later: (wait, call) => {
        this.timer = { wait, call };
        return () => (this.timer = null);
      },
    },
    { revision: 3, casefile: opened },
  );

  get says(): string {
    return this.autosave.state.getState().save.kind;
  }
  async ring(): Promise<void> {
    this.timer?.call();
    await turn();
  }
  async answer(): Promise<void> {
    this.held?.shift()?.();
    await turn();
  }
}

const turn = (): Promise<void> => new Promise((resolve) => setTimeout(resolve));

let world: World;
beforeEach(() => {
  world = new World();
});

test('an edit is kept in the browser at once, sent after a moment, and dropped from the browser when it is saved', async () => {
  world.autosave.changed(edited('One'));
  expect(world.copy).toMatchObject({ base: 3, casefile: { title: 'One' }, at: 1_000 });
  expect(world.sent).toEqual([]);
  expect(world.timer?.wait).toBe(GATHER);
  await world.ring();
  expect(world.sent).toEqual([{ base: 3, title: 'One', leaving: false }]);
  expect(world.copy).toBeNull();
  expect(world.autosave.state.getState().save).toEqual({ kind: 'saved', at: 1_000 });
  expect(world.autosave.revision).toBe(4);
});

test('edits that follow one another are sent as one', async () => {
  for (const title of ['One', 'Two', 'Three']) world.autosave.changed(edited(title));
  await world.ring();
  expect(world.sent.map(({ title }) => title)).toEqual(['Three']);
});

test('one request at a time: what was edited meanwhile goes over the revision that the first one made', async () => {
  world.held = [];
  world.autosave.changed(edited('One'));
  await world.ring();
  world.autosave.changed(edited('Two'));
  expect(world.copy).toMatchObject({ base: 3, casefile: { title: 'Two' } });
  await world.ring();
  expect(world.sent).toHaveLength(1);
  await world.answer();
  await world.ring();
  expect(world.sent.map(({ base, title }) => [base, title])).toEqual([
    [3, 'One'],
    [4, 'Two'],
  ]);
  expect(world.copy).toMatchObject({ base: 4, casefile: { title: 'Two' } });
  await world.answer();
  expect(world.copy).toBeNull();
  expect(world.says).toBe('saved');
});

test('undone back to what is saved, nothing is sent', async () => {
  world.autosave.changed(edited('One'));
  world.autosave.changed(opened);
  expect(world.copy).toBeNull();
  expect(world.says).toBe('saved');
  await world.ring();
  expect(world.sent).toEqual([]);
});

test('while the server is away the changes stay in the browser and are tried again, ever less often', async () => {
  world.reply = () => ({ kind: 'unreachable' });
  world.autosave.changed(edited('One'));
  const waits: number[] = [];
  for (let i = 0; i < 6; i++) {
    await world.ring();
    waits.push(world.timer?.wait ?? NaN);
  }
  expect(waits).toEqual([1_000, 2_000, 5_000, 15_000, 15_000, 15_000]);
  expect(world.says).toBe('offline');
  expect(world.copy).toMatchObject({ base: 3, casefile: { title: 'One' } });
  world.reply = (base) => ({ kind: 'saved', revision: base + 1 });
  await world.ring();
  expect(world.says).toBe('saved');
  expect(world.copy).toBeNull();
});

test('what another tab saved is never written over: nothing more is sent, everything is kept', async () => {
  world.reply = () => ({ kind: 'conflict', revision: 7, sha256: 'another' });
  world.autosave.changed(edited('One'));
  await world.ring();
  expect(world.autosave.state.getState().save).toEqual({ kind: 'conflict', revision: 7 });
  world.autosave.changed(edited('Two'));
  world.autosave.changed(opened);
  world.autosave.changed(edited('Three'));
  await world.autosave.flush(true);
  expect(world.sent).toHaveLength(1);
  expect(world.says).toBe('conflict');
  expect(world.copy).toMatchObject({ base: 3, casefile: { title: 'Three' } });
});

test('a conflict with what was sent from here is none: only the answer had been lost', async () => {
  world.reply = (_base, casefile) => ({ kind: 'conflict', revision: 4, sha256: hashOf(casefile) });
  world.autosave.changed(edited('One'));
  await world.ring();
  expect(world.says).toBe('saved');
  expect(world.autosave.revision).toBe(4);
});

test('after the other version was taken, edits go over its revision', async () => {
  world.reply = () => ({ kind: 'conflict', revision: 7, sha256: 'another' });
  world.autosave.changed(edited('One'));
  await world.ring();
  const theirs = edited('Theirs');
  world.autosave.opened(7, theirs);
  world.autosave.changed(theirs);
  expect([world.says, world.copy]).toEqual(['saved', null]);
  world.reply = (base) => ({ kind: 'saved', revision: base + 1 });
  world.autosave.changed(edited('Two'));
  await world.ring();
  expect(world.sent.at(-1)).toMatchObject({ base: 7, title: 'Two' });
});

test('a deleted case waits for the user, and is saved again when it was restored', async () => {
  world.reply = () => ({ kind: 'deleted' });
  world.autosave.changed(edited('One'));
  await world.ring();
  expect(world.says).toBe('deleted');
  expect(world.copy).not.toBeNull();
  world.reply = (base) => ({ kind: 'saved', revision: base + 1 });
  await world.autosave.restored();
  expect(world.says).toBe('saved');
});

test('what was kept as a new case is not sent any more', async () => {
  world.autosave.changed(edited('One'));
  world.autosave.abandon();
  await world.autosave.flush();
  expect([world.sent, world.copy]).toEqual([[], null]);
});

test('leaving sends at once, in a request that outlives the page', async () => {
  world.autosave.changed(edited('One'));
  await world.autosave.flush(true);
  expect(world.sent).toEqual([{ base: 3, title: 'One', leaving: true }]);
});

class Memory implements CopyStorage {
  readonly entries = new Map<string, string>();
  get length(): number {
    return this.entries.size;
  }
  key = (i: number): string | null => [...this.entries.keys()][i] ?? null;
  getItem = (key: string): string | null => this.entries.get(key) ?? null;
  setItem = (key: string, value: string): void => void this.entries.set(key, value);
  removeItem = (key: string): void => void this.entries.delete(key);
}

test.each<[string, KeptCopy, string]>([
  ['changes of the newest revision', { base: 3, casefile: edited('Mine'), at: 1 }, 'newer'],
  ['what the server has', { base: 1, casefile: opened, at: 1 }, 'same'],
  ['changes of an older revision', { base: 2, casefile: edited('Mine'), at: 1 }, 'apart'],
  [
    'changes after a save whose answer never came',
    { base: 2, casefile: edited('Mine'), at: 1, sent: hashOf(opened) },
    'newer',
  ],
  ['changes after a save that lost', { base: 2, casefile: edited('Mine'), at: 1, sent: 'other' }, 'apart'],
])('a kept copy: %s', (_what, copy, kind) => {
  const storage = new Memory();
  storage.setItem(copyKey('case', 'tab'), JSON.stringify(copy));
  expect(reopenCopies(storage, 'case', { revision: 3, casefile: opened })).toEqual([
    { key: copyKey('case', 'tab'), copy, kind },
  ]);
});

test('of two tabs that died, the first goes on and the second is kept apart; other cases and broken copies are left alone', () => {
  const storage = new Memory();
  const keep = (key: string, title: string, at: number): void =>
    storage.setItem(key, JSON.stringify({ base: 3, casefile: edited(title), at }));
  keep(copyKey('case', 'second'), 'Second', 20);
  keep(copyKey('case', 'first'), 'First', 10);
  keep(copyKey('other', 'tab'), 'Other', 5);
  storage.setItem(copyKey('case', 'broken'), '{"base":3');
  storage.setItem(copyKey('case', 'invalid'), JSON.stringify({ base: 3, at: 1, casefile: { title: 'No case' } }));
  const found = reopenCopies(storage, 'case', { revision: 3, casefile: opened });
  expect(found.map(({ copy, kind }) => [copy.casefile.title, kind])).toEqual([
    ['First', 'newer'],
    ['Second', 'apart'],
  ]);
  expect(storage.length).toBe(5);
});
