import { approachEdit } from '../drag';
import { drawFromVehicle } from './draw-from-vehicle';

/** Draws where a vehicle came from. */
export const approachTool = drawFromVehicle({
  id: 'approach',
  hint: 'Press on a vehicle and drag back to where it came from',
  label: (which) => `direction of approach of ${which}`,
  thing: (which) => `approach.${which}`,
  edit: (casefile, { which }, to, coarse) => approachEdit(casefile, which, to, coarse),
});
