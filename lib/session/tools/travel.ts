import { travelEdit } from '../drag';
import { drawFromVehicle } from './draw-from-vehicle';

/** Draws where a vehicle came to rest. */
export const travelTool = drawFromVehicle({
  id: 'travel',
  hint: 'Press on a vehicle and drag to where it came to rest',
  label: (which) => `travel of ${which}`,
  thing: (which) => `departure.${which}`,
  edit: travelEdit,
});
