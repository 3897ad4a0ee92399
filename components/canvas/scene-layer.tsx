import { Arrow, Group, Layer, Line, Wedge, Ellipse, Text } from 'react-konva/lib/ReactKonvaCore';
import type { ThingId } from '@/lib/casefile/fields';
import { type Vec, add, scale, toDegrees, unit } from '@/lib/geometry/vector';
import { PLANE_REACH } from '@/lib/scene/grip';
import {
  type Scene,
  type Speeds,
  type Which,
  approachTail,
  approachTip,
  centreOf,
  noseOf,
  pathOf,
  restPose,
} from '@/lib/scene/scene';
import { type View, toScreen } from '@/lib/scene/view';
import type { Theme } from './theme';
import { GhostShape, VehicleShape } from './vehicle-shape';

interface Props {
  scene: Scene;
  view: View;
  theme: Theme;
  selection: ThingId | null;
  speeds: Speeds;
  /** Shown length of a leg, with its unit. */
  lengthText: (metres: number) => string;
}

const BOTH = ['A', 'B'] as const;
const flat = (points: readonly Vec[]): number[] => points.flatMap(([x, y]) => [x, y]);

/** The collision itself, drawn in world metres. Measured things are solid, what follows from them dashed and lighter. */
export function SceneLayer({ scene, view, theme, selection, speeds, lengthText }: Props) {
  return (
    <Layer listening={false}>
      <Group x={view.originX} y={view.originY} scaleX={view.scale} scaleY={-view.scale}>
        {scene.marks.map((mark, k) => (
          <Line
            key={k}
            points={flat(mark.points)}
            stroke={theme.lineStrong}
            strokeWidth={1.5}
            strokeScaleEnabled={false}
          />
        ))}
        {BOTH.map((which) => (
          <Fans key={which} scene={scene} which={which} theme={theme} />
        ))}
        {BOTH.map((which) => (
          <Travel key={which} scene={scene} which={which} theme={theme} selected={isTravel(selection, which)} />
        ))}
        {BOTH.map((which) => (
          <VehicleShape
            key={which}
            vehicle={scene.vehicles[which]}
            pose={scene.vehicles[which].pose}
            theme={theme}
            selected={selection === `vehicle.${which}`}
          />
        ))}
        {BOTH.map((which) => (
          <Approach
            key={which}
            scene={scene}
            which={which}
            theme={theme}
            speed={speeds[which]}
            selected={selection === `approach.${which}`}
          />
        ))}
        <Contact scene={scene} theme={theme} selection={selection} />
      </Group>
      {scene.marks.map((mark, k) => (
        <Label key={k} at={toScreen(view, mark.points[0])} text={mark.label} theme={theme} colour={theme.inkSoft} />
      ))}
      {BOTH.map((which) => (
        <Labels key={which} scene={scene} which={which} view={view} theme={theme} lengthText={lengthText} />
      ))}
    </Layer>
  );
}

const isTravel = (selection: ThingId | null, which: Which): boolean =>
  selection === `departure.${which}` || (selection?.startsWith(`leg.${which}.`) ?? false);

/** How well the directions are known: two standard uncertainties to either side. */
function Fans({ scene, which, theme }: { scene: Scene; which: Which; theme: Theme }) {
  const approach = scene.approach[which];
  const travel = scene.travel[which];
  const [x, y] = centreOf(scene.vehicles[which]);
  const fan = (angle: number, half: number, radius: number) => (
    <Wedge
      x={x}
      y={y}
      radius={radius}
      angle={toDegrees(2 * half)}
      rotation={toDegrees(angle - half)}
      fill={theme[which]}
      opacity={0.1}
    />
  );
  const tail = approachTail(scene, which, undefined);
  const reach = travel?.legs.reduce((sum, leg) => sum + leg, 0) ?? 0;
  return (
    <>
      {approach &&
        tail &&
        approach.fan > 0 &&
        fan(approach.angle + Math.PI, Math.min(approach.fan, Math.PI), Math.hypot(tail[0] - x, tail[1] - y) + 1)}
      {travel &&
        travel.direction.fan > 0 &&
        reach > 0 &&
        fan(travel.direction.angle, Math.min(travel.direction.fan, Math.PI), reach)}
    </>
  );
}

function Travel({ scene, which, theme, selected }: { scene: Scene; which: Which; theme: Theme; selected: boolean }) {
  const rest = restPose(scene, which);
  const vehicle = scene.vehicles[which];
  if (!rest) return null;
  const path = pathOf(scene, which);
  const across = unit((scene.travel[which]?.direction.angle ?? 0) + Math.PI / 2);
  return (
    <>
      <GhostShape vehicle={vehicle} pose={rest} theme={theme} dash={[7, 5]} />
      <Line points={flat(path)} stroke={theme[which]} strokeWidth={selected ? 3 : 2} strokeScaleEnabled={false} />
      {path.map((at, k) => (
        <Line
          key={k}
          points={flat([add(at, scale(across, 0.18)), add(at, scale(across, -0.18))])}
          stroke={theme[which]}
          strokeWidth={2}
          strokeScaleEnabled={false}
        />
      ))}
    </>
  );
}

/** An arrow that ends at the tail of the vehicle's mass centre; the ghost half a second before contact at the computed speed. */
function Approach({
  scene,
  which,
  theme,
  speed,
  selected,
}: {
  scene: Scene;
  which: Which;
  theme: Theme;
  speed: number | undefined;
  selected: boolean;
}) {
  const direction = scene.approach[which];
  const vehicle = scene.vehicles[which];
  const tail = approachTail(scene, which, speed);
  if (!direction || !tail) return null;
  const centre = centreOf(vehicle);
  const tip = approachTip(scene, which) ?? centre;
  const before = speed === undefined ? null : add(centre, scale(unit(direction.angle), -0.5 * speed));
  return (
    <>
      {before && speed !== undefined && speed > 0.5 && (
        <Group opacity={0.55}>
          <GhostShape
            vehicle={vehicle}
            pose={{ x: before[0], y: before[1], heading: vehicle.pose.heading }}
            theme={theme}
            dash={[2, 4]}
          />
        </Group>
      )}
      <Arrow
        points={flat([tail, tip])}
        stroke={theme[which]}
        fill={theme[which]}
        strokeWidth={selected ? 3.5 : 2.25}
        strokeScaleEnabled={false}
        pointerLength={0.42}
        pointerWidth={0.3}
      />
    </>
  );
}

function Contact({ scene, theme, selection }: { scene: Scene; theme: Theme; selection: ThingId | null }) {
  const { point, plane } = scene;
  const along = unit(plane.angle);
  const normal = unit(plane.normal);
  const [from, to] = [add(point.at, scale(along, -PLANE_REACH)), add(point.at, scale(along, PLANE_REACH))];
  const selected = selection === 'contact.plane' || selection === 'contact.point';
  const [x, y] = point.at;
  return (
    <>
      {point.spread[0] > 0 && point.spread[1] > 0 && (
        <Ellipse x={x} y={y} radiusX={point.spread[0]} radiusY={point.spread[1]} fill={theme.ink} opacity={0.12} />
      )}
      <Line
        points={flat([from, to])}
        stroke={theme.ink}
        strokeWidth={selected ? 2.75 : 1.75}
        strokeScaleEnabled={false}
      />
      <Arrow
        points={flat([point.at, add(point.at, scale(normal, 0.9))])}
        stroke={theme.inkSoft}
        fill={theme.inkSoft}
        strokeWidth={1.25}
        strokeScaleEnabled={false}
        pointerLength={0.2}
        pointerWidth={0.16}
        dash={[5, 3]}
      />
      <Line
        points={[x - 0.16, y - 0.16, x + 0.16, y + 0.16]}
        stroke={theme.ink}
        strokeWidth={2}
        strokeScaleEnabled={false}
      />
      <Line
        points={[x - 0.16, y + 0.16, x + 0.16, y - 0.16]}
        stroke={theme.ink}
        strokeWidth={2}
        strokeScaleEnabled={false}
      />
    </>
  );
}

/** The letters of a vehicle and the lengths of its legs, in screen space so that they stay upright. */
function Labels({
  scene,
  which,
  view,
  theme,
  lengthText,
}: {
  scene: Scene;
  which: Which;
  view: View;
  theme: Theme;
  lengthText: (metres: number) => string;
}) {
  const vehicle = scene.vehicles[which];
  const path = pathOf(scene, which);
  const back = noseOf(vehicle) - vehicle.body.length + 0.7;
  const at = add(centreOf(vehicle), scale(unit(vehicle.pose.heading), back));
  const rest = restPose(scene, which);
  return (
    <>
      <Label at={toScreen(view, at)} text={which} theme={theme} colour={theme[which]} size={17} strong centred />
      {rest && (
        <Label
          at={toScreen(view, add([rest.x, rest.y], scale(unit(rest.heading), back)))}
          text={`${which} at rest`}
          theme={theme}
          colour={theme[which]}
          centred
        />
      )}
      {scene.travel[which]?.legs.map((leg, k) => {
        const middle: Vec = [(path[k][0] + path[k + 1][0]) / 2, (path[k][1] + path[k + 1][1]) / 2];
        const [px, py] = toScreen(view, middle);
        return leg * view.scale > 40 ? (
          <Label key={k} at={[px + 6, py + 6]} text={lengthText(leg)} theme={theme} colour={theme.ink} />
        ) : null;
      })}
    </>
  );
}

function Label({
  at,
  text,
  theme,
  colour,
  size = 12,
  strong = false,
  centred = false,
}: {
  at: Vec;
  text: string;
  theme: Theme;
  colour: string;
  size?: number;
  strong?: boolean;
  centred?: boolean;
}) {
  const width = text.length * size * 0.56 + 6;
  return (
    <Text
      x={centred ? at[0] - width / 2 : at[0]}
      y={centred ? at[1] - size / 2 : at[1]}
      width={centred ? width : undefined}
      align={centred ? 'center' : 'left'}
      text={text}
      fontFamily={theme.font}
      fontSize={size}
      fontStyle={strong ? '700' : '500'}
      fill={colour}
      stroke={theme.paper}
      strokeWidth={3}
      fillAfterStrokeEnabled
    />
  );
}
