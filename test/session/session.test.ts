import { describe, expect, test } from 'vitest';
import { hashOf } from '@/lib/casefile/canonical';
import { emptyCase } from '@/lib/casefile/defaults';
import { createSession } from '@/lib/session/session';

const value = (path: string, to: number) => ({ do: 'value', path, value: to }) as const;

describe('the open case', () => {
  test('undo gives back the very case that was there, redo the other', () => {
    const first = emptyCase();
    const session = createSession(first);
    session.getState().edit('move A', value('impact.A.x', -3));
    const second = session.getState().casefile;
    session.getState().undo();
    expect(session.getState().casefile).toBe(first);
    session.getState().redo();
    expect(session.getState().casefile).toBe(second);
  });

  test('a gesture is one step, whatever it passed through', () => {
    const session = createSession(emptyCase());
    const { begin, preview, commit, undo } = session.getState();
    begin('move A');
    for (let i = 0; i < 50; i++) preview(value('impact.A.x', -2.2 + i / 10));
    commit();
    expect(session.getState().past).toHaveLength(1);
    expect(session.getState().casefile.impact.A.x.value).toBeCloseTo(2.7, 12);
    undo();
    expect(session.getState().casefile.impact.A.x.value).toBe(-2.2);
  });

  test('Escape restores exactly and leaves no step', () => {
    const first = emptyCase();
    const session = createSession(first);
    session.getState().begin('move A');
    session.getState().preview(value('impact.A.x', 9));
    session.getState().cancel();
    expect(session.getState().casefile).toBe(first);
    expect(session.getState().past).toHaveLength(0);
  });

  test('a refused edit says why and the last good case stays in force', () => {
    const session = createSession(emptyCase());
    const issues = session.getState().edit('mass', value('vehicles.A.mass', -5));
    expect(issues).toEqual([{ path: 'vehicles.A.mass.value', says: 'must be greater than 0' }]);
    expect(session.getState().casefile.vehicles.A.mass.value).toBe(1400);
    expect(session.getState().past).toHaveLength(0);
  });

  test('an edit that changes nothing does not clear what can be redone', () => {
    const session = createSession(emptyCase());
    session.getState().edit('title', { do: 'set', path: 'title', to: 'One' });
    session.getState().undo();
    session.getState().edit('title', { do: 'set', path: 'title', to: session.getState().casefile.title });
    expect(session.getState().future).toHaveLength(1);
  });

  test('two hundred mixed edits undone give the same hash', () => {
    const session = createSession(emptyCase());
    const before = hashOf(session.getState().casefile);
    for (let i = 0; i < 200; i++)
      session
        .getState()
        .edit(`edit ${i}`, i % 3 === 0 ? value('impact.B.y', i / 50) : { do: 'set', path: 'title', to: `Case ${i}` });
    for (let i = 0; i < 200; i++) session.getState().undo();
    expect(hashOf(session.getState().casefile)).toBe(before);
  });
});
