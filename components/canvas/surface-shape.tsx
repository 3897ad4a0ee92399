import type { Context } from 'konva/lib/Context';
import { memo } from 'react';
import { Circle, Layer, Line, Shape } from 'react-konva/lib/ReactKonvaCore';
import type { ThingId } from '@/lib/casefile/fields';
import type { Vec } from '@/lib/geometry/vector';
import { surfacePlace } from '@/lib/scene/labels';
import type { Scene } from '@/lib/scene/scene';
import { type View, boundsOf, toScreen } from '@/lib/scene/view';
import type { Outlining } from '@/lib/session/tools/surface';
import { BoardLabel } from './board-label';
import { flat } from './ink';
import type { Shown } from './scene-labels';
import type { Theme } from './theme';

/** Between two dots of the ground's pattern, m at a scale where that is some 10 to 20 pixels; and pixels of a dot. */
const DOTS = { least: 10, size: 1.5 };
/** From the handle inside a surface to its words, pixels. */
const BELOW = 16;

interface Props {
  scene: Scene;
  view: View;
  theme: Theme;
  selection: ThingId | null;
  shown: Shown;
}

/** The ground, under everything else: each surface tinted and dotted within its outline, later ones over earlier ones. */
export const SurfaceLayer = memo(function SurfaceLayer({ scene, view, theme, selection, shown }: Props) {
  return (
    <Layer listening={false}>
      {scene.surfaces.map(({ outline }, k) => (
        <Ground
          key={k}
          outline={outline.map((corner) => toScreen(view, corner))}
          view={view}
          theme={theme}
          shifted={k % 2 === 1}
          selected={selection === `surface.${k}`}
        />
      ))}
      {scene.surfaces.map(({ name, friction }, k) => {
        const [x, y] = toScreen(view, surfacePlace(scene, k));
        return (
          <BoardLabel
            key={k}
            at={[x, y + BELOW]}
            text={`${name}, friction ${shown.ratio(friction)}`}
            theme={theme}
            colour={selection === `surface.${k}` ? theme.ink : theme.inkSoft}
          />
        );
      })}
    </Layer>
  );
});

interface GroundProps {
  /** Pixels. */
  outline: Vec[];
  view: View;
  theme: Theme;
  /** Neighbours differ in pattern. */
  shifted: boolean;
  selected: boolean;
}

function Ground({ outline, view, theme, shifted, selected }: GroundProps) {
  return (
    <Shape
      sceneFunc={(context, shape) => {
        context.save();
        trace(context, outline);
        context.clip();
        context.setAttr('fillStyle', theme.paper);
        context.fill();
        context.setAttr('fillStyle', theme.lineStrong);
        context.setAttr('globalAlpha', 0.12);
        context.fill();
        context.setAttr('globalAlpha', 0.55);
        dot(context, outline, view, shifted);
        context.restore();
        trace(context, outline);
        context.strokeShape(shape);
      }}
      stroke={selected ? theme.ink : theme.lineStrong}
      strokeWidth={selected ? 2.25 : 1.25}
      lineJoin="round"
    />
  );
}

function trace(context: Context, outline: readonly Vec[]): void {
  context.beginPath();
  outline.forEach(([x, y], k) => (k === 0 ? context.moveTo(x, y) : context.lineTo(x, y)));
  context.closePath();
}

/** Dots that stand still in the world, in rows or, shifted, in a quincunx. */
function dot(context: Context, outline: readonly Vec[], view: View, shifted: boolean): void {
  const step = view.scale * 2 ** Math.ceil(Math.log2(DOTS.least / view.scale));
  const box = boundsOf(outline);
  const { width, height } = context.canvas;
  const from = (origin: number, least: number): number => origin + Math.ceil((least - origin) / step) * step;
  const [right, bottom] = [Math.min(box.right, width), Math.min(box.top, height)];
  const first = from(view.originY, Math.max(0, box.bottom));
  for (let y = first; y < bottom; y += step) {
    const isOdd = Math.round((y - view.originY) / step) % 2 !== 0;
    const aside = shifted && isOdd ? step / 2 : 0;
    for (let x = from(view.originX, Math.max(0, box.left)) - aside; x < right; x += step)
      context.fillRect(x, y, DOTS.size, DOTS.size);
  }
}

/** The outline in the making: what is fixed is solid, what would come next is dashed. */
export function OutlineInHand({ drawn, view, theme }: { drawn: Outlining; view: View; theme: Theme }) {
  const corners = drawn.corners.map((corner) => toScreen(view, corner));
  const at = toScreen(view, drawn.at);
  const closing = corners.length > 1 ? [corners[corners.length - 1], at, corners[0]] : [corners[0], at];
  return (
    <>
      <Line points={flat(corners)} stroke={theme.accent} strokeWidth={2} lineJoin="round" />
      <Line points={flat(closing)} stroke={theme.accent} strokeWidth={1.25} dash={[6, 4]} />
      {corners.map(([x, y], k) => (
        <Circle
          key={k}
          x={x}
          y={y}
          radius={k === 0 ? 6 : 3.5}
          fill={k === 0 ? theme.paper : theme.accent}
          stroke={theme.accent}
          strokeWidth={2}
        />
      ))}
    </>
  );
}
