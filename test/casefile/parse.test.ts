import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { MAX_BYTES, parseCase, parseCaseText } from '@/lib/casefile/parse';
import { needsOf } from '@/lib/casefile/needs';
import type { CaseFile } from '@/lib/casefile/schema';

const text = readFileSync('public/examples/junction.case.json', 'utf8');
const bytes = (s: string): Uint8Array => new TextEncoder().encode(s);
const good = (): CaseFile => JSON.parse(text) as CaseFile;

/** A case as parsed and not yet checked: a test may put anything anywhere. */
type Draft = ReturnType<typeof JSON.parse>;

/** The problems of the example after a change. */
function problems(change: (c: Draft) => void): string[] {
  const changed = good();
  change(changed);
  const parsed = parseCaseText(JSON.stringify(changed));
  return parsed.ok ? [] : parsed.issues.map((i) => `${i.path}: ${i.says}`);
}

test('the example is valid', () => expect(parseCase(bytes(text)).ok).toBe(true));

describe('every problem is named with its path', () => {
  const cases: [string, (c: Draft) => void, string[]][] = [
    ['missing', (c) => delete c.vehicles.A.mass, ['vehicles.A.mass: is missing']],
    ['unknown key', (c) => (c.vehicles.A.colour = 'red'), ['vehicles.A.colour: unknown key']],
    [
      'wrong type',
      (c) => (c.vehicles.A.mass.value = '1400'),
      ['vehicles.A.mass.value: must be a number, found "1400"'],
    ],
    ['wrong sign', (c) => (c.vehicles.A.mass.value = -1), ['vehicles.A.mass.value: must be greater than 0']],
    ['null for a needed value', (c) => (c.impact.plane = null), ['impact.plane: must be an object, found null']],
    [
      'share above one',
      (c) => (c.departure.A.legs[0].share = { value: 1.5 }),
      ['departure.A.legs.0.share.value: must be at most 1'],
    ],
    [
      'limits crossed',
      (c) => (c.vehicles.A.mass.spread = { shape: 'rectangular', low: 1600, high: 1500 }),
      ['vehicles.A.mass.spread: low (1600) must be less than high (1500)'],
    ],
    [
      'value outside its limits',
      (c) => (c.vehicles.A.mass.spread = { shape: 'triangular', low: 1000, high: 1200 }),
      ['vehicles.A.mass.value: must lie between low (1000) and high (1200), found 1510'],
    ],
    [
      'limits outside what is possible',
      (c) => (c.impact.restitution = { value: 0.9, spread: { shape: 'rectangular', low: 0.5, high: 1.2 } }),
      ['impact.restitution.spread.high: must be at most 1'],
    ],
    [
      'limit of a positive quantity at zero',
      (c) => (c.pulse = { value: 0.1, spread: { shape: 'rectangular', low: 0, high: 0.2 } }),
      ['pulse.spread.low: must be greater than 0'],
    ],
    [
      'unknown method',
      (c) => (c.analysis.method = 'magic'),
      ['analysis.method: must be "directions" or "restitution" or "fit", found "magic"'],
    ],
    [
      'unknown kind of travel',
      (c) => (c.departure.A.kind = 'glide'),
      ['departure.A.kind: must be a known kind, found "glide"'],
    ],
    [
      'wheelbase beyond the length',
      (c) => (c.vehicles.B.wheelbase = 5),
      ['vehicles.B.wheelbase: must be less than the length (3.98), found 5'],
    ],
    [
      'mass centre behind the rear axle',
      (c) => (c.vehicles.A.frontAxleToMassCentre = { value: 2.8 }),
      ['vehicles.A.frontAxleToMassCentre.value: must be less than the wheelbase (2.7), found 2.8'],
    ],
    ['no legs', (c) => (c.departure.A.legs = []), ['departure.A.legs: must have at least 1 entry']],
    ['version', (c) => (c.version = 2), ['version: must be 1, found 2']],
    ['draws', (c) => (c.analysis.draws = 0), ['analysis.draws: must be at least 1']],
    [
      'three at once',
      (c) => {
        c.vehicles.A.mass.value = -1;
        c.impact.plane = null;
        c.analysis.coverage = 1;
      },
      [
        'vehicles.A.mass.value: must be greater than 0',
        'impact.plane: must be an object, found null',
        'analysis.coverage: must be less than 1',
      ],
    ],
  ];
  test.each(cases)('%s', (_, change, says) => expect(problems(change)).toEqual(says));

  test('a hypothesis may only set known paths', () => {
    expect(problems((c) => (c.hypotheses = [{ name: 'B stood', set: { 'approach.B.pace': { value: 0 } } }]))).toEqual([
      'hypotheses.0.set.approach.B.pace: is no path of a quantity or a departure',
    ]);
    expect(problems((c) => (c.hypotheses = [{ name: 'B stood', set: { 'approach.B.speed': { value: 0 } } }]))).toEqual(
      [],
    );
  });
});

describe('the document as a whole', () => {
  const refused = (b: Uint8Array): string[] => {
    const parsed = parseCase(b);
    return parsed.ok ? [] : parsed.issues.map((i) => `${i.path}: ${i.says}`);
  };
  test('a byte-order mark is accepted', () => expect(refused(bytes(`\uFEFF${text}`))).toEqual([]));
  test('UTF-16 is refused in words', () =>
    expect(refused(Buffer.from(text, 'utf16le'))).toEqual(['(document): is not UTF-8 text: save the file as UTF-8']));
  test('a lone byte is refused in words', () => expect(refused(new Uint8Array([0xff]))).toHaveLength(1));
  test('empty', () => expect(refused(bytes(' \n'))[0]).toMatch('is empty'));
  test('truncated', () =>
    expect(refused(bytes(text.slice(0, 500)))[0]).toMatch(/is not valid JSON: .* at line \d+, column \d+/));
  test('too deep', () =>
    expect(refused(bytes(`${'['.repeat(1000)}${']'.repeat(1000)}`))).toEqual([
      '(document): is nested deeper than 64 levels',
    ]));
  test('so deep that a parser would fall over', () =>
    expect(refused(bytes('['.repeat(3_000_000)))[0]).toMatch('nested deeper'));
  test('too long', () => expect(refused(new Uint8Array(MAX_BYTES + 1))[0]).toMatch('at most 8388608'));
  test('a comment is no JSON', () =>
    expect(refused(bytes(text.replace('{', '{ // x\n')))[0]).toMatch('is not valid JSON'));
  test('a duplicate key is named', () => {
    const twice = text.replace('"mass": {', '"mass": {"value": 900}, "mass": {');
    expect(refused(bytes(twice))[0]).toMatch(/^vehicles\.A\.mass: stands twice/);
  });
  test('__proto__ is an unknown key', () =>
    expect(refused(bytes(text.replace('{', '{"__proto__": {"x": 1},')))).toEqual(['__proto__: unknown key']));
  test('a number too large to hold', () =>
    expect(refused(bytes(text.replace('"value": 1510', '"value": 1e400')))).toEqual([
      'vehicles.A.mass.value: must be a number, found a number too large to hold',
    ]));
  test.each(['null', '[]', '3', '"case"', 'true'])('%s is no case', (document) =>
    expect(refused(bytes(document))).toHaveLength(1),
  );
});

describe('what a method needs', () => {
  const lacks = (change: (c: Draft) => void): string[] => {
    const changed = good();
    change(changed);
    return needsOf(changed).map((i) => `${i.path}: ${i.says}`);
  };
  test('directions', () =>
    expect(
      lacks((c) => {
        c.approach.A.direction = null;
        c.departure.B = null;
      }),
    ).toEqual([
      'approach.A.direction: needed by the method directions',
      'departure.B: needed by the method directions',
    ]));
  test('restitution', () =>
    expect(
      lacks((c) => {
        c.analysis.method = 'restitution';
        c.departure.A.yawRate = null;
      }),
    ).toEqual([
      'impact.restitution: needed by the method restitution',
      'impact.impulseRatio: needed by the method restitution',
      'departure.A.yawRate: needed by the method restitution',
    ]));
  test('lasting needs a pulse, and not the method restitution', () => {
    expect(lacks((c) => Object.assign(c, { pulse: null, analysis: { ...c.analysis, contact: 'lasting' } }))).toEqual([
      'pulse: needed by the contact lasting',
    ]);
    expect(lacks((c) => Object.assign(c.analysis, { contact: 'lasting', method: 'restitution' }))).toContain(
      'analysis.contact: the method restitution has no lasting contact: choose instant, or another method',
    );
  });
  test('fit needs an observation, with a spread', () => {
    expect(lacks((c) => Object.assign(c, { departure: { A: null, B: null }, analysis: { method: 'fit' } }))).toEqual([
      'departure: the method fit needs at least one observation',
    ]);
    expect(
      lacks((c) => {
        c.analysis.method = 'fit';
        delete c.departure.A.direction.spread;
      }),
    ).toEqual(['departure.A.direction: needs a spread: an observation without one would weigh infinitely']);
  });
});
