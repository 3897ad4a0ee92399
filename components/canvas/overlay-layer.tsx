import { memo } from 'react';
import { Circle, Layer, Line } from 'react-konva/lib/ReactKonvaCore';
import type { ThingId } from '@/lib/casefile/fields';
import { type Vec, angleOf, distance, fromBody, subtract, toDegrees } from '@/lib/geometry/vector';
import { type Grip, type Handle, handlesOf, isSameGrip } from '@/lib/scene/grip';
import { type Scene, type Speeds, noseOf, wheelPlaces } from '@/lib/scene/scene';
import { type View, toScreen } from '@/lib/scene/view';
import { thingOf } from '@/lib/session/drag';
import type { Measured } from '@/lib/session/tools/measure';
import type { RestMiss } from '@/lib/solve-case';
import { BoardLabel } from './board-label';
import { flat } from './ink';
import { MissShapes } from './miss-shapes';
import type { Shown } from './scene-labels';
import { OutlineInHand } from './surface-shape';
import type { Theme } from './theme';
import type { InHand } from './use-tool';

interface Props {
  scene: Scene;
  view: View;
  theme: Theme;
  speeds: Speeds;
  selection: ThingId | null;
  hovered: Grip | null;
  drawing: InHand;
  misses: readonly RestMiss[];
  shown: Shown;
}

/** Radius of a handle, pixels: at rest, of what is selected, under the pointer. */
const RADIUS = { quiet: 3.5, own: 5.5, over: 7.5 };

/** The handles, the rest poses that were missed, and what a tool has drawn that is not in the case. */
export const OverlayLayer = memo(function OverlayLayer(props: Props) {
  const { scene, view, theme, speeds, selection, hovered, drawing, misses, shown } = props;
  const { measured, outlining } = drawing;
  return (
    <Layer listening={false}>
      {handlesOf(scene, speeds)
        .filter(({ grip }) => grip.part !== 'point')
        .map((handle) => (
          <HandleShape
            key={JSON.stringify(handle.grip)}
            handle={handle}
            scene={scene}
            view={view}
            theme={theme}
            over={isSameGrip(hovered, handle.grip)}
            own={belongsTo(handle.grip, scene, selection)}
          />
        ))}
      <MissShapes misses={misses} scene={scene} view={view} theme={theme} shown={shown} />
      {hovered?.part === 'point' && <PointRing at={toScreen(view, scene.point.at)} theme={theme} />}
      {outlining && <OutlineInHand drawn={outlining} view={view} theme={theme} />}
      {measured && <MeasureLine measured={measured} view={view} theme={theme} shown={shown} />}
    </Layer>
  );
});

/** Whether a handle is one of what is selected. */
function belongsTo(grip: Grip, scene: Scene, selection: ThingId | null): boolean {
  if (selection === null) return false;
  if (selection === thingOf(grip, scene)) return true;
  if (selection === 'contact.point') return grip.part === 'plane';
  const [kind, which] = selection.split('.');
  return kind !== 'vehicle' && kind !== 'approach' && 'which' in grip && grip.which === which && isOfTravel(grip);
}

const isOfTravel = ({ part }: Grip): boolean => part === 'end' || part === 'joint';

interface HandleProps {
  handle: Handle;
  scene: Scene;
  view: View;
  theme: Theme;
  over: boolean;
  own: boolean;
}

function HandleShape({ handle: { grip, at }, scene, view, theme, over, own }: HandleProps) {
  const [x, y] = toScreen(view, at);
  const colour = 'which' in grip ? theme[grip.which] : theme.ink;
  const vehicle = grip.part === 'turn' ? scene.vehicles[grip.which] : null;
  const wheel = grip.part === 'steer' ? wheelPlaces(scene.vehicles[grip.which])[grip.wheel] : null;
  const nose = wheel ? toScreen(view, wheel) : vehicle && toScreen(view, fromBody([noseOf(vehicle), 0], vehicle.pose));
  return (
    <>
      {nose && <Line points={flat([nose, [x, y]])} stroke={colour} strokeWidth={1} opacity={own || over ? 0.9 : 0.4} />}
      <Circle
        x={x}
        y={y}
        radius={over ? RADIUS.over : own ? RADIUS.own : RADIUS.quiet}
        fill={over ? colour : theme.paper}
        stroke={colour}
        strokeWidth={own || over ? 2 : 1.25}
      />
    </>
  );
}

function PointRing({ at: [x, y], theme }: { at: Vec; theme: Theme }) {
  return <Circle x={x} y={y} radius={11} stroke={theme.ink} strokeWidth={1.5} />;
}

function MeasureLine({
  measured: { from, to },
  view,
  theme,
  shown,
}: Pick<Props, 'view' | 'theme' | 'shown'> & { measured: Measured }) {
  const [a, b] = [toScreen(view, from), toScreen(view, to)];
  const text = `${shown.length(distance(from, to))}, ${shown.angle(toDegrees(angleOf(subtract(to, from))))}`;
  return (
    <>
      <Line points={flat([a, b])} stroke={theme.accent} strokeWidth={2} dash={[8, 4]} />
      {[a, b].map(([x, y], k) => (
        <Circle key={k} x={x} y={y} radius={3} fill={theme.accent} />
      ))}
      <BoardLabel at={[b[0], b[1] - 18]} text={text} theme={theme} colour={theme.accent} size={14} strong />
    </>
  );
}
