import { type Vec, scale } from '@/lib/geometry/vector';
import { handlesOf } from './grip';
import { WHEEL_WORDS, wheelLabelAt } from './labels';
import { type Scene, type Speeds, approachTip, centreOf, outlineAt, pathOf } from './scene';
import { type Size, type View, toScreen } from './view';

/** Free pixels along each edge of the board, where tools and words lie. */
export interface Clear {
  left: number;
  top: number;
  right: number;
  bottom: number;
}

/** How far a card stands off what it belongs to, pixels. */
const OFF = [18, 70, 130];

/** The top left pixel of a card beside a pixel, inside the board, where it covers the fewest of some pixels. */
export function placeBeside(at: Vec, card: Size, board: Size, clear: Clear, avoid: readonly Vec[]): Vec {
  const inside = ([left, top]: Vec): Vec => [
    Math.max(clear.left, Math.min(board.width - card.width - clear.right, left)),
    Math.max(clear.top, Math.min(board.height - card.height - clear.bottom, top)),
  ];
  const places = OFF.flatMap((off) => {
    const [right, left] = [at[0] + off, at[0] - off - card.width];
    const [below, above, level] = [at[1] + off, at[1] - off - card.height, at[1] - card.height / 2];
    const all: Vec[] = [
      [right, below],
      [right, above],
      [left, below],
      [left, above],
      [right, level],
      [left, level],
    ];
    return all.map((place) => {
      const put = inside(place);
      return { put, cost: covered(put, card, avoid) + off / 1000 };
    });
  });
  return places.reduce((best, next) => (next.cost < best.cost ? next : best)).put;
}

const covered = ([left, top]: Vec, { width, height }: Size, points: readonly Vec[]): number =>
  points.filter(([x, y]) => x > left && x < left + width && y > top && y < top + height).length;

/** Points on a stretch, its ends included. */
const SAMPLES = 6;
const along = (from: Vec, to: Vec): Vec[] =>
  Array.from({ length: SAMPLES + 1 }, (_, k): Vec => [
    from[0] + ((to[0] - from[0]) * k) / SAMPLES,
    from[1] + ((to[1] - from[1]) * k) / SAMPLES,
  ]);

/** The pixels that a card should leave to be seen: outlines, paths, arrows and handles. */
export function inkOf(scene: Scene, speeds: Speeds, view: View): Vec[] {
  const points = (['A', 'B'] as const).flatMap((which) => {
    const corners = outlineAt(scene.vehicles[which]);
    const path = pathOf(scene, which);
    const tip = approachTip(scene, which);
    return [
      centreOf(scene.vehicles[which]),
      ...corners.flatMap((corner, k) => along(corner, corners[(k + 1) % corners.length])),
      ...path.slice(1).flatMap((to, k) => along(path[k], to)),
      ...(tip ? [tip] : []),
    ];
  });
  const handles = handlesOf(scene, speeds).map(({ at }) => at);
  return [...points, ...handles].map((point) => toScreen(view, point)).concat(wheelWords(scene, view));
}

/** The ends and the middle of the words beside the open wheels, pixels. */
function wheelWords(scene: Scene, view: View): Vec[] {
  const { open, wheels } = scene;
  if (!open) return [];
  return (wheels[open]?.each ?? []).flatMap((_, k) => {
    const [x, y] = toScreen(view, wheelLabelAt(scene, open, k, scale(WHEEL_WORDS, 1 / view.scale)));
    return [-WHEEL_WORDS[0], 0, WHEEL_WORDS[0]].map((aside): Vec => [x + aside, y]);
  });
}
