import { Circle, Group, Line } from 'react-konva/lib/ReactKonvaCore';
import { type Vec, distance, toDegrees } from '@/lib/geometry/vector';
import type { Scene } from '@/lib/scene/scene';
import { midway } from '@/lib/scene/traces';
import { type View, toScreen } from '@/lib/scene/view';
import type { RestMiss } from '@/lib/solve-case';
import { BoardLabel } from './board-label';
import { flat } from './ink';
import type { Shown } from './scene-labels';
import type { Theme } from './theme';
import { GhostShape } from './vehicle-shape';

interface Props {
  misses: readonly RestMiss[];
  scene: Scene;
  view: View;
  theme: Theme;
  shown: Shown;
}

/** How far the words stand above the middle of the line, pixels. */
const ABOVE = 18;

/** Where the nearest simulated travel ended instead of the measured rest, and by how much it missed. */
export function MissShapes({ misses, scene, view, theme, shown }: Props) {
  return misses.map(({ vehicle, measured, nearest }) => {
    const [from, to]: Vec[] = [
      [measured.x, measured.y],
      [nearest.x, nearest.y],
    ];
    const [x, y] = toScreen(view, midway(measured, nearest));
    return (
      <Group key={vehicle}>
        <Group x={view.originX} y={view.originY} scaleX={view.scale} scaleY={-view.scale}>
          <GhostShape vehicle={scene.vehicles[vehicle]} pose={nearest} theme={theme} dash={[2, 4]} opacity={1} />
        </Group>
        <Line points={flat([toScreen(view, from), toScreen(view, to)])} stroke={theme.caution} strokeWidth={2.5} />
        {[from, to].map((end, k) => (
          <Circle key={k} {...at(toScreen(view, end))} radius={3.5} fill={theme.caution} />
        ))}
        <BoardLabel
          at={[x, y - ABOVE]}
          text={`${vehicle} misses its rest by ${shown.length(distance(from, to))} and ${shown.angle(toDegrees(Math.abs(nearest.heading - measured.heading)))}`}
          theme={theme}
          colour={theme.caution}
          strong
        />
      </Group>
    );
  });
}

const at = ([x, y]: Vec): { x: number; y: number } => ({ x, y });
