import { defaultSurface, patchAbout } from '@/lib/casefile/defaults';
import type { Edit } from '@/lib/casefile/edit';
import type { CaseFile, Surface } from '@/lib/casefile/schema';
import { type Vec, add, fromBody, scale, subtract, toRadians } from '@/lib/geometry/vector';
import type { NamedEdit } from './named-edit';

/** Corners are kept to a tenth of a millimetre, so that sums of steps stay clean. */
const tidy = ([x, y]: Vec): [number, number] => [Number(x.toFixed(4)), Number(y.toFixed(4))];
/** How far a copy stands off, m. */
const BESIDE: Vec = [0.5, -0.5];
/** Fewest corners of an outline. */
export const FEWEST_CORNERS = 3;

const PATH = 'scene.surfaces';
const surfacesOf = ({ scene }: CaseFile): Surface[] => scene?.surfaces ?? [];
const outlineEdit = (index: number, outline: readonly Vec[]): Edit => ({
  do: 'set',
  path: `${PATH}.${index}.outline`,
  to: outline.map(tidy),
});
const nothing: Edit = { do: 'all', edits: [] };

/** A new surface over all others. */
export function surfaceAddition(casefile: CaseFile, outline: readonly Vec[]): NamedEdit {
  const index = surfacesOf(casefile).length;
  const entry = defaultSurface(index, outline.map(tidy));
  return { label: `draw surface ${index + 1}`, edit: { do: 'insert', path: PATH, index, entry } };
}

/** A rectangle about the contact point, to be moved and shaped, for those who do not draw. */
export function patchAddition(casefile: CaseFile): NamedEdit {
  const { x, y } = casefile.impact.point;
  const { edit } = surfaceAddition(casefile, patchAbout(x.value, y.value));
  return { label: 'add a surface', edit };
}

export function surfaceRemoval(casefile: CaseFile, index: number): NamedEdit | null {
  if (!surfacesOf(casefile)[index]) return null;
  return { label: `delete surface ${index + 1}`, edit: { do: 'remove', path: PATH, index } };
}

/** A copy beside the surface, over it. */
export function surfaceCopy(casefile: CaseFile, index: number): NamedEdit | null {
  const surface = surfacesOf(casefile)[index];
  if (!surface) return null;
  const outline = surface.outline.map((corner) => tidy(add(corner, BESIDE)));
  return {
    label: `duplicate surface ${index + 1}`,
    edit: { do: 'insert', path: PATH, index: index + 1, entry: { ...surface, outline } },
  };
}

/** Moves a surface as a whole and turns it about its middle (deg, counter-clockwise). */
export function surfaceMove(casefile: CaseFile, index: number, by: Vec, turn = 0): Edit {
  const outline: Vec[] = surfacesOf(casefile)[index]?.outline ?? [];
  if (outline.length === 0) return nothing;
  const middle = scale(outline.reduce(add), 1 / outline.length);
  const [x, y] = add(middle, by);
  const pose = { x, y, heading: toRadians(turn) };
  return outlineEdit(
    index,
    outline.map((corner) => (turn === 0 ? add(corner, by) : fromBody(subtract(corner, middle), pose))),
  );
}

export function cornerMove(casefile: CaseFile, index: number, corner: number, to: Vec): Edit {
  const outline = surfacesOf(casefile)[index]?.outline;
  return outline?.[corner] ? outlineEdit(index, outline.with(corner, [...to])) : nothing;
}

/** A further corner in the middle of the edge that leads on from a corner. */
export function cornerAddition(casefile: CaseFile, index: number, corner: number): NamedEdit {
  const outline = surfacesOf(casefile)[index].outline;
  const next = outline[(corner + 1) % outline.length];
  const middle = scale(add(outline[corner], next), 0.5);
  return {
    label: `add a corner to surface ${index + 1}`,
    edit: outlineEdit(index, outline.toSpliced(corner + 1, 0, tidy(middle))),
  };
}

/** Takes a corner away; null where too few would be left. */
export function cornerRemoval(casefile: CaseFile, index: number, corner: number): NamedEdit | null {
  const outline = surfacesOf(casefile)[index]?.outline ?? [];
  if (outline.length <= FEWEST_CORNERS) return null;
  return {
    label: `take away corner ${corner + 1} of surface ${index + 1}`,
    edit: outlineEdit(index, outline.toSpliced(corner, 1)),
  };
}
