import type { ThingId } from '@/lib/casefile/fields';
import { sceneOf } from '@/lib/casefile/scene-of';
import type { CaseFile, VehicleId } from '@/lib/casefile/schema';
import type { Scene } from '@/lib/scene/scene';

/** Selecting a vehicle, its rest pose or one of its wheels opens its wheels to be set. */
const OPENS = /^(?:vehicle|rest|wheel)\.([AB])/;

/** What the board shows of a case while a thing is selected. */
export function shownScene(casefile: CaseFile, selection: ThingId | null): Scene {
  const scene = sceneOf(casefile);
  const which = OPENS.exec(selection ?? '')?.[1] as VehicleId | undefined;
  return which && scene.wheels[which] ? { ...scene, open: which } : scene;
}
