import { addLegEdit, travelEdit } from '../drag';
import { drawFromVehicle } from './draw-from-vehicle';

/** Draws where a vehicle came to rest; with Shift, a further leg of the travel that is there. */
export const travelTool = drawFromVehicle({
  id: 'travel',
  hint: 'Press on a vehicle and drag to where it came to rest; press with Shift to add a leg',
  label: (which) => `travel of ${which}`,
  thing: (which) => `departure.${which}`,
  edit: (casefile, { which, shift }, to, coarse) =>
    (shift ? addLegEdit(casefile, which, to) : null) ?? travelEdit(casefile, which, to, coarse),
});
