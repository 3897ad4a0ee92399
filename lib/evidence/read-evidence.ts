import { type CaseFile, type Method } from '@/lib/casefile/schema';
import { InputList } from './input-list';
import type { Problem } from './problem';
import { readFit } from './read-fit';
import { readVehicle } from './read-vehicle';

/**
 * Turns a case into the problem that its method solves, in SI and radians. The case must have passed needsOf
 * for the method.
 */
export function readEvidence(casefile: CaseFile, method: Method, seed: number): Problem {
  const list = new InputList();
  const { impact, vehicles, pulse } = casefile;
  const known = method === 'restitution';
  const duration = list.siIf('pulse', pulse);
  const lasts = casefile.analysis.contact === 'lasting' && duration !== null;
  return {
    method,
    fit: method === 'fit' ? readFit(list, casefile, seed) : null,
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
