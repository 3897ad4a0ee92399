import type { Context } from 'konva/lib/Context';
import { Circle, Group, Line, Shape } from 'react-konva/lib/ReactKonvaCore';
import type { ScenePose, SceneVehicle, SceneWheels } from '@/lib/scene/scene';
import { noseOf } from '@/lib/scene/scene';
import { toDegrees } from '@/lib/geometry/vector';
import type { Theme } from './theme';
import { Wheels } from './wheel-shape';

/** Between two lines of the hatch, m. */
const HATCH = 0.28;

/** A vehicle to scale. A and B differ in pattern and nose as well as in colour; a ghost is dashed and empty. */
export function VehicleShape({
  vehicle,
  pose,
  theme,
  wheels,
  wheel,
  selected,
}: {
  vehicle: SceneVehicle;
  pose: ScenePose;
  theme: Theme;
  wheels: SceneWheels | null;
  /** The selected one of its wheels. */
  wheel: number | null;
  selected: boolean;
}) {
  const { length, width } = vehicle.body;
  const nose = noseOf(vehicle);
  const colour = theme[vehicle.which];
  return (
    <Group x={pose.x} y={pose.y} rotation={toDegrees(pose.heading)}>
      <Shape sceneFunc={(context) => fillBody(context, vehicle, theme)} />
      <Wheels vehicle={vehicle} set={wheels} selected={wheel} theme={theme} />
      <Shape
        sceneFunc={(context, shape) => {
          tracePath(context, nose, length, width);
          context.strokeShape(shape);
        }}
        stroke={colour}
        strokeWidth={selected ? 3 : 1.75}
        strokeScaleEnabled={false}
      />
      <NoseMark vehicle={vehicle} colour={colour} />
      <Circle radius={0.09} fill={theme.paper} stroke={theme.ink} strokeWidth={1.25} strokeScaleEnabled={false} />
      <Line points={[-0.2, 0, 0.2, 0]} stroke={theme.ink} strokeWidth={1} strokeScaleEnabled={false} />
      <Line points={[0, -0.2, 0, 0.2]} stroke={theme.ink} strokeWidth={1} strokeScaleEnabled={false} />
    </Group>
  );
}

/** Where a vehicle was or came to be: an outline only. */
export function GhostShape({
  vehicle,
  pose,
  theme,
  dash,
  opacity,
  nosed = false,
}: {
  vehicle: SceneVehicle;
  pose: ScenePose;
  theme: Theme;
  dash: number[];
  opacity: number;
  /** With the mark of the nose, where one must see which way it faces. */
  nosed?: boolean;
}) {
  const { which, body } = vehicle;
  return (
    <Group x={pose.x} y={pose.y} rotation={toDegrees(pose.heading)} opacity={opacity}>
      <Shape
        sceneFunc={(context, shape) => {
          tracePath(context, noseOf(vehicle), body.length, body.width);
          context.strokeShape(shape);
        }}
        stroke={theme[which]}
        strokeWidth={nosed ? 1.75 : 1.25}
        strokeScaleEnabled={false}
        dash={dash}
      />
      {nosed && <NoseMark vehicle={vehicle} colour={theme[which]} />}
    </Group>
  );
}

/** A: an arrow head at the nose. B: a bar across it. */
function NoseMark({ vehicle, colour }: { vehicle: SceneVehicle; colour: string }) {
  const nose = noseOf(vehicle);
  const half = vehicle.body.width / 2;
  const points =
    vehicle.which === 'A'
      ? [nose - 0.55, half * 0.7, nose - 0.12, 0, nose - 0.55, -half * 0.7]
      : [nose - 0.35, half * 0.8, nose - 0.35, -half * 0.8];
  return <Line points={points} stroke={colour} strokeWidth={2} strokeScaleEnabled={false} lineJoin="round" />;
}

/** The outline, corners rounded a little more at the nose. */
function tracePath(context: Context, nose: number, length: number, width: number): void {
  const half = width / 2;
  const tail = nose - length;
  const [front, rear] = [Math.min(0.45, half), Math.min(0.22, half)];
  context.beginPath();
  context.moveTo(tail + rear, -half);
  context.lineTo(nose - front, -half);
  context.quadraticCurveTo(nose, -half, nose, -half + front);
  context.lineTo(nose, half - front);
  context.quadraticCurveTo(nose, half, nose - front, half);
  context.lineTo(tail + rear, half);
  context.quadraticCurveTo(tail, half, tail, half - rear);
  context.lineTo(tail, -half + rear);
  context.quadraticCurveTo(tail, -half, tail + rear, -half);
  context.closePath();
}

/** A is a plain tint, B is hatched, as in the answer and in the report. */
function fillBody(context: Context, vehicle: SceneVehicle, theme: Theme): void {
  const { which, body } = vehicle;
  const nose = noseOf(vehicle);
  context.save();
  tracePath(context, nose, body.length, body.width);
  context.setAttr('fillStyle', which === 'A' ? theme.ASoft : theme.BSoft);
  context.fill();
  if (which === 'B') {
    context.clip();
    hatch(context, nose, body, theme.B);
  }
  context.restore();
}

function hatch(context: Context, nose: number, { length, width }: SceneVehicle['body'], colour: string): void {
  context.setAttr('strokeStyle', colour);
  context.setAttr('globalAlpha', 0.3);
  context.setAttr('lineWidth', 0.025);
  context.beginPath();
  for (let x = nose - length - width; x < nose + width; x += HATCH) {
    context.moveTo(x, -width / 2);
    context.lineTo(x + width, width / 2);
  }
  context.stroke();
}
