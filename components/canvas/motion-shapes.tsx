import { Line, Wedge } from 'react-konva/lib/ReactKonvaCore';
import { type Vec, add, distance, scale, toDegrees, unit } from '@/lib/geometry/vector';
import {
  type Scene,
  type Speeds,
  type Which,
  approachTail,
  approachTip,
  centreOf,
  pathOf,
  restPose,
} from '@/lib/scene/scene';
import { InkArrow, flat } from './ink';
import type { Theme } from './theme';
import { GhostShape } from './vehicle-shape';

interface Props {
  scene: Scene;
  which: Which;
  theme: Theme;
  /** Pixels per metre. */
  zoom: number;
  speeds: Speeds;
}

/** Before contact a ghost stands where the vehicle was this long ago, s. */
const BEFORE = 0.5;
/** Slower than this no ghost can be told from the vehicle, m/s. */
const SLOW = 0.5;
/** Half of a tick across the path, pixels. */
const TICK = 6;

/** How well the directions are known: two standard uncertainties to either side. */
export function Fans({ scene, which, theme, speeds }: Props) {
  const { approach, travel } = { approach: scene.approach[which], travel: scene.travel[which] };
  const centre = centreOf(scene.vehicles[which]);
  const tail = approachTail(scene, which, speeds[which]);
  const reach = travel ? travel.legs.reduce((sum, leg) => sum + leg, 0) : 0;
  const fill = theme[which];
  return (
    <>
      {approach && tail && (
        <Fan
          centre={centre}
          angle={approach.angle + Math.PI}
          half={approach.fan}
          radius={distance(centre, tail)}
          fill={fill}
        />
      )}
      {travel && (
        <Fan centre={centre} angle={travel.direction.angle} half={travel.direction.fan} radius={reach} fill={fill} />
      )}
    </>
  );
}

export function Fan({
  centre,
  angle,
  half,
  radius,
  fill,
}: {
  centre: Vec;
  angle: number;
  half: number;
  radius: number;
  fill: string;
}) {
  const open = Math.min(half, Math.PI);
  if (open <= 0 || radius <= 0) return null;
  return (
    <Wedge
      x={centre[0]}
      y={centre[1]}
      radius={radius}
      angle={toDegrees(2 * open)}
      rotation={toDegrees(angle - open)}
      fill={fill}
      opacity={0.1}
    />
  );
}

/** Where the vehicle came to rest, and where it was a moment before contact at the computed speed. */
export function Ghosts({ scene, which, theme, speeds }: Props) {
  const vehicle = scene.vehicles[which];
  const rest = restPose(scene, which);
  const direction = scene.approach[which];
  const speed = speeds[which] ?? 0;
  const before =
    direction && speed > SLOW ? add(centreOf(vehicle), scale(unit(direction.angle), -BEFORE * speed)) : null;
  return (
    <>
      {before && (
        <GhostShape
          vehicle={vehicle}
          pose={{ x: before[0], y: before[1], heading: vehicle.pose.heading }}
          theme={theme}
          dash={[1, 5]}
          opacity={0.6}
        />
      )}
      {rest && <GhostShape vehicle={vehicle} pose={rest} theme={theme} dash={[7, 5]} opacity={0.85} />}
    </>
  );
}

/** The path of the mass centre from contact to rest, with a tick at the end of every leg. */
export function Travel({ scene, which, theme, zoom, selected }: Props & { selected: boolean }) {
  const travel = scene.travel[which];
  if (!travel) return null;
  const path = pathOf(scene, which);
  const across = scale(unit(travel.direction.angle + Math.PI / 2), TICK / zoom);
  return (
    <>
      <Line points={flat(path)} stroke={theme[which]} strokeWidth={selected ? 3 : 1.75} strokeScaleEnabled={false} />
      {path.slice(1).map((at, k) => (
        <Line
          key={k}
          points={flat([add(at, across), add(at, scale(across, -1))])}
          stroke={theme[which]}
          strokeWidth={1.75}
          strokeScaleEnabled={false}
        />
      ))}
    </>
  );
}

/**
 * The direction of approach as an arrow whose length grows with the computed speed: solid where the direction is known,
 * dashed where it was computed.
 */
export function Approach({
  scene,
  which,
  theme,
  zoom,
  speeds,
  selected,
  computed,
}: Props & { selected: boolean; computed: boolean }) {
  const [tail, tip] = [approachTail(scene, which, speeds[which]), approachTip(scene, which)];
  return tail && tip ? (
    <InkArrow
      from={tail}
      to={tip}
      colour={theme[which]}
      zoom={zoom}
      width={computed ? 1.25 : selected ? 3.5 : 2}
      head={computed ? 10 : 13}
      {...(computed ? { dash: [6, 4] } : {})}
    />
  ) : null;
}
