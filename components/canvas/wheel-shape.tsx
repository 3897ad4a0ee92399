import { Group, Line, Rect } from 'react-konva/lib/ReactKonvaCore';
import { scale, toDegrees } from '@/lib/geometry/vector';
import { WHEEL_WORDS, wheelLabelAt } from '@/lib/scene/labels';
import { type Scene, type SceneVehicle, type SceneWheels, type Which, wheelsOf } from '@/lib/scene/scene';
import { type View, toScreen } from '@/lib/scene/view';
import { BoardLabel } from './board-label';
import type { Shown } from './scene-labels';
import type { Theme } from './theme';

/** m */
const WHEEL = { length: 0.6, width: 0.2 };
/** The bar across a braked wheel, m. */
const BAR = 0.44;
/** A share of braking below this is none. */
const BRAKED = 0.005;

interface Props {
  vehicle: SceneVehicle;
  /** How they are set, where the travel is simulated. */
  set: SceneWheels | null;
  /** The one that is selected. */
  selected: number | null;
  theme: Theme;
}

/** The wheels in the axes of their vehicle: turned as steered, filled as far as they brake, with a bar across if they do. */
export function Wheels({ vehicle, set, selected, theme }: Props) {
  return wheelsOf(vehicle).map(([x, y], k) => {
    const wheel = set?.each[k];
    return (
      <Group key={k} x={x} y={y} rotation={toDegrees(wheel?.steer ?? 0)}>
        {wheel ? (
          <SetWheel braking={wheel.braking} selected={selected === k} theme={theme} />
        ) : (
          <PlainWheel theme={theme} />
        )}
      </Group>
    );
  });
}

const box = (share: number) => ({
  x: -WHEEL.length / 2,
  y: -WHEEL.width / 2,
  width: WHEEL.length * share,
  height: WHEEL.width,
  cornerRadius: 0.05,
});

const PlainWheel = ({ theme }: { theme: Theme }) => <Rect {...box(1)} fill={theme.ink} opacity={0.75} />;

function SetWheel({ braking, selected, theme }: { braking: number; selected: boolean; theme: Theme }) {
  const colour = selected ? theme.accent : theme.ink;
  return (
    <>
      <Rect {...box(1)} fill={theme.paper} />
      <Rect {...box(braking)} fill={colour} opacity={0.75} />
      <Rect {...box(1)} stroke={colour} strokeWidth={selected ? 2.5 : 1.25} strokeScaleEnabled={false} />
      {braking >= BRAKED && (
        <Line points={[0, -BAR / 2, 0, BAR / 2]} stroke={colour} strokeWidth={2.5} strokeScaleEnabled={false} />
      )}
    </>
  );
}

/** Below this zoom the words would run into one another, pixels per metre. */
const LEGIBLE = 34;

interface LabelProps {
  scene: Scene;
  which: Which;
  view: View;
  theme: Theme;
  shown: Shown;
}

/** What the wheels of the open vehicle are set to, beside each. */
export function WheelLabels({ scene, which, view, theme, shown }: LabelProps) {
  const set = scene.wheels[which];
  if (!set || view.scale < LEGIBLE) return null;
  return set.each.map(({ braking, steer }, k) => (
    <BoardLabel
      key={k}
      at={toScreen(view, wheelLabelAt(scene, which, k, scale(WHEEL_WORDS, 1 / view.scale)))}
      text={`brake ${shown.ratio(braking)}${steer === 0 ? '' : `, ${shown.angle(toDegrees(steer))}`}`}
      theme={theme}
      colour={theme.ink}
      size={11}
    />
  ));
}
