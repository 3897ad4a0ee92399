import { sceneOf } from '@/lib/casefile/scene-of';
import type { CaseFile } from '@/lib/casefile/schema';
import { type Vec, distance } from '@/lib/geometry/vector';
import { centreOf } from '@/lib/scene/scene';
import { approachEdit } from '../drag';
import { type Drawing, drawFromVehicle } from './draw-from-vehicle';

/** Draws where a vehicle came from: back from the vehicle, or from there to the vehicle. */
export const approachTool = drawFromVehicle({
  id: 'approach',
  hint: 'Press on a vehicle and drag back to where it came from',
  label: (which) => `direction of approach of ${which}`,
  thing: (which) => `approach.${which}`,
  edit: (casefile, drawing, to, coarse) => approachEdit(casefile, drawing.which, origin(casefile, drawing, to), coarse),
});

/** The end of the stroke that lies farther from the vehicle is where it came from. */
function origin(casefile: CaseFile, { which, from }: Drawing, to: Vec): Vec {
  const centre = centreOf(sceneOf(casefile).vehicles[which]);
  return distance(from, centre) > distance(to, centre) ? from : to;
}
