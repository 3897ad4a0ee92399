import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { hashOf } from '@/lib/casefile/canonical';
import { emptyCase } from '@/lib/casefile/defaults';
import type { Issue } from '@/lib/casefile/issue';
import { nodeAt } from '@/lib/casefile/quantities';
import type { CaseFile } from '@/lib/casefile/schema';
import * as cases from '@/lib/entry/http-cases';
import { overStore } from '@/lib/entry/http-door';
import { getHealth } from '@/lib/entry/http-health';
import { type Store, closeStore, openStore } from '@/lib/store/store';

const HERE = 'http://127.0.0.1:4310';
let folder: string;
let store: Store;

beforeEach(async () => {
  folder = await mkdtemp(join(tmpdir(), 'retrodict-http-'));
  let made = 0;
  store = await openStore(
    folder,
    () => Date.UTC(2026, 0, 1),
    () => `case${++made}`,
  );
});
afterEach(async () => {
  await closeStore(store);
  await rm(folder, { recursive: true, force: true });
});

type Body = Record<string, unknown> & { error?: Issue[] };
interface Reply {
  status: number;
  body: Body;
  headers: Headers;
}

type Handler = Parameters<typeof overStore>[0];

/** Asks a route as the server would. */
async function ask(handler: Handler, init: RequestInit = {}, place: Partial<cases.Place> = {}): Promise<Reply> {
  const route = overStore(handler, () => Promise.resolve(store));
  const request = new Request(`${HERE}/api`, { duplex: 'half', ...init } as RequestInit);
  const response = await route(request, { params: Promise.resolve(place) });
  return { status: response.status, body: (await response.json()) as Body, headers: response.headers };
}

const post = (body: BodyInit, headers: Record<string, string> = {}) =>
  ask(cases.postCase, { method: 'POST', body, headers });
const put = (id: string, base: string | null, casefile: CaseFile) =>
  ask(
    cases.putCase,
    { method: 'PUT', body: JSON.stringify(casefile), headers: base === null ? {} : { 'if-match': base } },
    { id },
  );
const get = (id: string) => ask(cases.getCase, {}, { id });
const kept = async (): Promise<unknown[]> => (await ask(cases.getCases)).body as unknown as unknown[];
const says = ({ body }: Reply): string => (body.error ?? []).map((issue) => `${issue.path}: ${issue.says}`).join('\n');

describe('keeping', () => {
  test('a case is created, read, listed', async () => {
    const casefile = { ...emptyCase('One'), reference: 'R' };
    const created = await post(JSON.stringify(casefile));
    const sha256 = hashOf(casefile);
    expect(created).toMatchObject({ status: 201, body: { id: 'case1', revision: 1, sha256 } });
    expect(created.headers.get('location')).toBe('/api/cases/case1');
    const read = await get('case1');
    expect(read).toMatchObject({ status: 200, body: { id: 'case1', revision: 1, sha256, case: casefile } });
    expect(read.headers.get('etag')).toBe('"1"');
    expect(await kept()).toEqual([
      { id: 'case1', title: 'One', reference: 'R', revision: 1, changed: '2026-01-01T00:00:00.000Z', example: false },
    ]);
  });

  test('a save names the revision that it changes', async () => {
    await post(JSON.stringify(emptyCase('One')));
    const two = emptyCase('Two');
    expect(await put('case1', '"1"', two)).toMatchObject({ status: 200, body: { revision: 2, sha256: hashOf(two) } });
    expect(await put('case1', null, emptyCase())).toMatchObject({ status: 428 });
    for (const stale of ['"1"', '"3"', '*', '"2", "1"', 'W/"2"', '"two"', ''])
      expect(await put('case1', stale, emptyCase('Stale')), stale).toMatchObject({
        status: 412,
        body: { revision: 2, sha256: hashOf(two) },
      });
    expect((await get('case1')).body).toMatchObject({ revision: 2, case: { title: 'Two' } });
  });

  test('a draft whose method still lacks inputs is kept', async () => {
    const draft = emptyCase('Draft');
    expect(draft.approach.A.direction).toBeNull();
    expect((await post(JSON.stringify(draft))).status).toBe(201);
  });

  test('revisions can be read, and stay', async () => {
    await post(JSON.stringify(emptyCase('One')));
    await put('case1', '"1"', emptyCase('Two'));
    const created = '2026-01-01T00:00:00.000Z';
    expect((await ask(cases.getRevisions, {}, { id: 'case1' })).body).toEqual([
      { revision: 2, sha256: hashOf(emptyCase('Two')), created },
      { revision: 1, sha256: hashOf(emptyCase('One')), created },
    ]);
    const first = await ask(cases.getRevision, {}, { id: 'case1', revision: '1' });
    expect(first).toMatchObject({ status: 200, body: { id: 'case1', revision: 1, case: { title: 'One' } } });
    for (const revision of ['0', '3', '-1', '1.0', 'x', '99999999999999999999'])
      expect((await ask(cases.getRevision, {}, { id: 'case1', revision })).status, revision).toBe(404);
  });

  test('deleting can be undone; saving what was deleted is refused in words', async () => {
    await post(JSON.stringify(emptyCase('One')));
    const place = { id: 'case1' };
    expect((await ask(cases.removeCase, { method: 'DELETE' }, place)).status).toBe(200);
    expect((await ask(cases.removeCase, { method: 'DELETE' }, place)).status).toBe(404);
    expect((await get('case1')).status).toBe(404);
    expect(await put('case1', '"1"', emptyCase('Two'))).toMatchObject({ status: 410 });
    expect((await ask(cases.undeleteCase, { method: 'POST' }, place)).status).toBe(200);
    expect((await get('case1')).body).toMatchObject({ revision: 1, case: { title: 'One' } });
  });

  test('what is not there is not there', async () => {
    for (const handler of [cases.getCase, cases.getRevisions, cases.removeCase, cases.undeleteCase])
      expect(await ask(handler, {}, { id: 'nobody' })).toMatchObject({ status: 404 });
    expect((await put('nobody', '"1"', emptyCase())).status).toBe(404);
  });

  test('health is 200 while the store can be written, and 503 in words when it cannot', async () => {
    expect((await ask(getHealth)).status).toBe(200);
    const quiet = vi.spyOn(console, 'error').mockImplementation(() => {});
    const full = Object.assign(new Error('database or disk is full'), { code: 'SQLITE_FULL' });
    const broken = await overStore(getHealth, () => Promise.reject(full))(new Request(`${HERE}/api/health`));
    expect(broken.status).toBe(503);
    expect(await broken.text()).toContain('nothing was saved');
    quiet.mockRestore();
  });

  test('our own mistake is a 500 without a stack trace', async () => {
    const quiet = vi.spyOn(console, 'error').mockImplementation(() => {});
    const reply = await ask(() => Promise.reject(new TypeError('x is not a function')));
    expect(reply.status).toBe(500);
    expect(JSON.stringify(reply.body)).not.toMatch(/TypeError|not a function|\.ts/);
    expect(quiet).toHaveBeenCalledOnce();
    quiet.mockRestore();
  });
});

const withText = (change: (text: string) => string): string => change(JSON.stringify(emptyCase('Bad')));
/** A case in which some paths hold something else; undefined takes a key away. */
const withPaths = (changes: Record<string, unknown>): string => {
  const casefile: unknown = structuredClone(emptyCase('Bad'));
  for (const [path, to] of Object.entries(changes)) {
    const keys = path.split('.');
    const last = keys.pop() ?? '';
    (nodeAt(casefile, keys.join('.')) as Record<string, unknown>)[last] = to;
  }
  return JSON.stringify(casefile);
};
const utf16 = (text: string): Uint8Array<ArrayBuffer> => {
  const bytes = new Uint8Array(2 + text.length * 2);
  bytes.set([0xff, 0xfe]);
  for (let i = 0; i < text.length; i++) bytes.set([text.charCodeAt(i) & 0xff, text.charCodeAt(i) >> 8], 2 + 2 * i);
  return bytes;
};

/** Every kind of bad input, and what its problems must name. */
const BAD: Record<string, { body: () => BodyInit; says: RegExp[] }> = {
  'nothing at all': { body: () => '', says: [/\(document\): is empty/] },
  'no JSON': { body: () => 'hello', says: [/\(document\): is not valid JSON/] },
  'cut off': { body: () => withText((t) => t.slice(0, -20)), says: [/is not valid JSON/] },
  'a list': { body: () => '[]', says: [/must be an object/] },
  null: { body: () => 'null', says: [/must be an object/] },
  NaN: { body: () => withText((t) => t.replace('"length":4.4', '"length":NaN')), says: [/is not valid JSON/] },
  'a comment': { body: () => withText((t) => `/* hi */${t}`), says: [/is not valid JSON/] },
  missing: { body: () => withPaths({ 'vehicles.A.mass': undefined }), says: [/^vehicles\.A\.mass: is missing$/m] },
  unknown: {
    body: () => withPaths({ 'vehicles.A.colour': 'red' }),
    says: [/^vehicles\.A\.colour: unknown key$/m],
  },
  'wrong type': {
    body: () => withPaths({ 'vehicles.B.length': '4.4' }),
    says: [/^vehicles\.B\.length: must be a number, found "4\.4"$/m],
  },
  'wrong sign': {
    body: () => withPaths({ 'vehicles.A.mass.value': -1 }),
    says: [/^vehicles\.A\.mass\.value: must be greater than 0$/m],
  },
  'limits crossed': {
    body: () => withPaths({ 'impact.plane.spread': { shape: 'rectangular', low: 95, high: 80 } }),
    says: [/^impact\.plane\.spread: low \(95\) must be less than high \(80\)$/m],
  },
  'value outside its limits': {
    body: () => withPaths({ 'impact.plane.spread': { shape: 'triangular', low: 95, high: 99 } }),
    says: [/^impact\.plane\.value: must lie between/m],
  },
  'a duplicate key': {
    body: () => withText((t) => t.replace('{', '{"title":"Other",')),
    says: [/^title: stands twice in one object/m],
  },
  __proto__: {
    body: () => withText((t) => t.replace('{', '{"__proto__":{"polluted":true},')),
    says: [/__proto__: unknown key/],
  },
  'Latin-1': { body: () => new Uint8Array([0x7b, 0x22, 0xe9, 0x22, 0x7d]), says: [/is not UTF-8/] },
  'UTF-16': { body: () => utf16(JSON.stringify(emptyCase())), says: [/is not UTF-8/] },
  'a thousand levels': { body: () => '['.repeat(1000) + ']'.repeat(1000), says: [/nested deeper than 64 levels/] },
  'a hundred thousand levels': { body: () => '{"a":'.repeat(100_000), says: [/nested deeper than 64 levels/] },
  'a number too large': {
    body: () => withText((t) => t.replace('"length":4.4', '"length":1e999')),
    says: [/vehicles\.A\.length/],
  },
  'another version': { body: () => withPaths({ version: 2 }), says: [/^version: must be 1, found 2$/m] },
  'several at once': {
    body: () => withPaths({ title: undefined, 'vehicles.A.width': 0, extra: 1, 'analysis.coverage': 2 }),
    says: [
      /^title: is missing$/m,
      /^vehicles\.A\.width: /m,
      /^extra: unknown key$/m,
      /^analysis\.coverage: must be less than 1$/m,
    ],
  },
};

describe('bad input is refused with every problem, and nothing is written', () => {
  test.each(Object.entries(BAD))('%s', async (_name, { body, says: expected }) => {
    const created = await post(body());
    expect(created.status).toBe(422);
    for (const pattern of expected) expect(says(created)).toMatch(pattern);
    expect(await kept()).toEqual([]);

    await post(JSON.stringify(emptyCase('Good')));
    const saved = await ask(
      cases.putCase,
      { method: 'PUT', body: body(), headers: { 'if-match': '"1"' } },
      { id: 'case1' },
    );
    expect(saved).toMatchObject({ status: 422, body: { error: created.body.error } });
    expect((await get('case1')).body).toMatchObject({ revision: 1, case: { title: 'Good' } });
    expect(({} as Record<string, unknown>).polluted).toBeUndefined();
  });

  test('50 MB is cut off while it arrives, and never held whole', async () => {
    let sent = 0;
    const chunk = new Uint8Array(1024 * 1024).fill(0x20);
    const body = new ReadableStream<Uint8Array>({
      pull(controller) {
        if (++sent > 50) controller.close();
        else controller.enqueue(chunk);
      },
    });
    const before = process.memoryUsage().arrayBuffers;
    const reply = await post(body);
    expect(process.memoryUsage().arrayBuffers - before).toBeLessThan(30 * 1024 * 1024);
    expect(reply.status).toBe(422);
    expect(says(reply)).toContain('8 MiB');
    expect(await kept()).toEqual([]);
  });

  test('a body without end is not read for ever', async () => {
    let cancelled = false;
    const body = new ReadableStream<Uint8Array>({
      pull: (controller) => controller.enqueue(new Uint8Array(4 * 1024 * 1024)),
      cancel: () => void (cancelled = true),
    });
    expect((await post(body)).status).toBe(422);
    expect(cancelled).toBe(true);
  });
});

describe('who may ask', () => {
  const from = (headers: Record<string, string>) =>
    post(JSON.stringify(emptyCase()), { host: '127.0.0.1:4310', ...headers });

  test.each([
    ['this page', { origin: 'http://127.0.0.1:4310', 'sec-fetch-site': 'same-origin' }, 201],
    ['a command without an origin', {}, 201],
    ['localhost', { host: 'localhost:4310', origin: 'http://localhost:4310' }, 201],
    ['the loopback address of IPv6', { host: '[::1]:4310' }, 201],
    ['another site', { origin: 'https://example.org' }, 403],
    ['another port', { origin: 'http://127.0.0.1:9' }, 403],
    ['a sandboxed page', { origin: 'null' }, 403],
    ['a form of another site', { 'sec-fetch-site': 'cross-site' }, 403],
    ['a name of its own that points here', { host: 'example.org:4310', origin: 'http://example.org:4310' }, 403],
    ['a name that only begins like ours', { host: 'localhost.example.org' }, 403],
  ])('%s', async (_who, headers, status) => {
    const reply = await from(headers);
    expect(reply.status).toBe(status);
    expect(await kept()).toHaveLength(status === 201 ? 1 : 0);
  });

  test('HOST opens the server to other names', async () => {
    vi.stubEnv('HOST', '0.0.0.0');
    expect((await from({ host: 'office.example:4310', origin: 'http://office.example:4310' })).status).toBe(201);
    expect((await from({ host: 'office.example:4310', origin: 'http://elsewhere.example' })).status).toBe(403);
    vi.unstubAllEnvs();
  });
});
