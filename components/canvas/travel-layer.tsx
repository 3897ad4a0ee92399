import { memo } from 'react';
import { Group, Layer, Line } from 'react-konva/lib/ReactKonvaCore';
import { type TimedPath, type Travels, endOf, poseAt } from '@/lib/geometry/timed-path';
import type { Scene, Which } from '@/lib/scene/scene';
import { courseOf, tracesOf } from '@/lib/scene/traces';
import type { View } from '@/lib/scene/view';
import { flat } from './ink';
import type { Theme } from './theme';
import { type TravelClock, useTravelTime } from './travel-clock';
import { GhostShape } from './vehicle-shape';

interface Props {
  scene: Scene;
  view: View;
  theme: Theme;
  travels: Travels;
  clock: TravelClock;
}

/** The simulated travel: where the mass centre and the wheels went, and the outline at the moment that is shown. */
export function TravelLayer({ scene, view, theme, travels, clock }: Props) {
  const time = useTravelTime(clock, endOf(travels));
  const moving = (['A', 'B'] as const).flatMap((which) => {
    const path = travels[which];
    return path ? [{ which, path }] : [];
  });
  return (
    <Layer listening={false}>
      <Group x={view.originX} y={view.originY} scaleX={view.scale} scaleY={-view.scale}>
        {moving.map(({ which, path }) => (
          <Course key={which} path={path} which={which} theme={theme} />
        ))}
        {moving.map(({ which, path }) => (
          <GhostShape
            key={which}
            vehicle={scene.vehicles[which]}
            pose={poseAt(path, time)}
            theme={theme}
            dash={[4, 3]}
            opacity={1}
            nosed
          />
        ))}
      </Group>
    </Layer>
  );
}

/** The path of the mass centre, dashed, and a line for every wheel: darker and wider where its tyre slides. */
const Course = memo(function Course({ path, which, theme }: { path: TimedPath; which: Which; theme: Theme }) {
  const line = { stroke: theme[which], strokeScaleEnabled: false };
  return (
    <>
      {path.wheels.flatMap((wheel, i) =>
        tracesOf(wheel).map(({ points, slides }, k) => (
          <Line
            key={`${i} ${k}`}
            points={flat(points)}
            strokeWidth={slides ? 2.5 : 1}
            opacity={slides ? 0.75 : 0.55}
            {...line}
          />
        )),
      )}
      <Line points={flat(courseOf(path))} strokeWidth={1.25} opacity={0.8} dash={[6, 4]} {...line} />
    </>
  );
});
