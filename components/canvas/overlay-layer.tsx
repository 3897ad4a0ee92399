import { Circle, Group, Layer, Line, Text } from 'react-konva/lib/ReactKonvaCore';
import { angleOf, distance, subtract, toDegrees } from '@/lib/geometry/vector';
import { type Grip, handlesOf } from '@/lib/scene/grip';
import type { Scene, Speeds } from '@/lib/scene/scene';
import { type View, toScreen } from '@/lib/scene/view';
import type { Measured } from '@/lib/session/tools/measure';
import type { Theme } from './theme';

/** The handles, and the line of the measuring tool. */
export function OverlayLayer({
  scene,
  view,
  theme,
  speeds,
  hovered,
  measured,
  lengthText,
}: {
  scene: Scene;
  view: View;
  theme: Theme;
  speeds: Speeds;
  hovered: Grip | null;
  measured: Measured | null;
  lengthText: (metres: number) => string;
}) {
  return (
    <Layer listening={false}>
      {handlesOf(scene, speeds).map(({ grip, at }) => {
        const [x, y] = toScreen(view, at);
        const colour = 'which' in grip ? theme[grip.which] : theme.ink;
        const over = hovered !== null && JSON.stringify(hovered) === JSON.stringify(grip);
        return (
          <Circle
            key={JSON.stringify(grip)}
            x={x}
            y={y}
            radius={over ? 8 : 5.5}
            fill={over ? colour : theme.paper}
            stroke={colour}
            strokeWidth={2}
          />
        );
      })}
      {measured && <MeasureLine measured={measured} view={view} theme={theme} lengthText={lengthText} />}
    </Layer>
  );
}

function MeasureLine({
  measured: { from, to },
  view,
  theme,
  lengthText,
}: {
  measured: Measured;
  view: View;
  theme: Theme;
  lengthText: (metres: number) => string;
}) {
  const [a, b] = [toScreen(view, from), toScreen(view, to)];
  const degrees = toDegrees(angleOf(subtract(to, from)));
  const text = `${lengthText(distance(from, to))}, ${degrees.toFixed(1).replace('-', '\u2212')}°`;
  return (
    <Group>
      <Line points={[a[0], a[1], b[0], b[1]]} stroke={theme.accent} strokeWidth={2} dash={[8, 4]} />
      <Text
        x={b[0] + 10}
        y={b[1] - 8}
        text={text}
        fontFamily={theme.font}
        fontSize={14}
        fontStyle="600"
        fill={theme.accent}
        stroke={theme.paper}
        strokeWidth={4}
        fillAfterStrokeEnabled
      />
    </Group>
  );
}
