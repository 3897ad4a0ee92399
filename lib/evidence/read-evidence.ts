import type { Issue } from '@/lib/casefile/issue';
import { type CaseFile, type Method } from '@/lib/casefile/schema';
import { InputList } from './input-list';
import type { Problem, SolvedMethod } from './problem';
import { readVehicle } from './read-vehicle';

/** What a case asks for that this version does not compute, as the reason of an unsolved case; null when it does. */
export function notYetSolved(casefile: CaseFile, method: Method): Issue | null {
  if (method === 'fit') return { path: 'analysis.method', says: 'this version does not solve the method fit yet' };
  return null;
}

/**
 * Turns a case into the problem that its method solves, in SI and radians. The case must have passed needsOf and
 * notYetSolved for the method.
 */
export function readEvidence(casefile: CaseFile, method: SolvedMethod, seed: number): Problem {
  const list = new InputList();
  const { impact, vehicles, pulse } = casefile;
  const known = method === 'restitution';
  const duration = list.siIf('pulse', pulse);
  const lasts = casefile.analysis.contact === 'lasting' && duration !== null;
  return {
    method,
    lasting: lasts ? { lineOn: impact.lineOn ?? 'B', pulse: duration } : null,
    vehicles: { A: readVehicle(list, casefile, method, 'A'), B: readVehicle(list, casefile, method, 'B') },
    pointX: list.si('impact.point.x', impact.point.x),
    pointY: list.si('impact.point.y', impact.point.y),
    plane: list.angle('impact.plane', impact.plane),
    restitution: known ? list.siIf('impact.restitution', impact.restitution) : null,
    impulseRatio: known ? list.siIf('impact.impulseRatio', impact.impulseRatio) : null,
    pulse: duration,
    seats: { A: vehicles.A.seats ?? [], B: vehicles.B.seats ?? [] },
    seed,
    inputs: list.inputs,
  };
}
