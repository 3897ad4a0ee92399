import { memo } from 'react';
import { Group, Layer, Line } from 'react-konva/lib/ReactKonvaCore';
import type { ThingId } from '@/lib/casefile/fields';
import { WHEELS } from '@/lib/casefile/wheels';
import { type Scene, type Which, withComputed } from '@/lib/scene/scene';
import { type View, toScreen } from '@/lib/scene/view';
import { BoardLabel } from './board-label';
import { ContactShape } from './contact-shape';
import { flat } from './ink';
import { Approach, Fans, Ghosts, Travel } from './motion-shapes';
import { SceneLabels, type Shown } from './scene-labels';
import type { Theme } from './theme';
import type { AnswerDrawn } from './use-answer-drawn';
import { VehicleShape } from './vehicle-shape';
import { WheelLabels } from './wheel-shape';

interface Props {
  scene: Scene;
  view: View;
  theme: Theme;
  selection: ThingId | null;
  answer: AnswerDrawn;
  shown: Shown;
}

const BOTH = ['A', 'B'] as const;

const isTravel = (selection: ThingId | null, which: Which): boolean =>
  selection === `departure.${which}` || (selection?.startsWith(`leg.${which}.`) ?? false);

/** The selected wheel of a vehicle, by its place in the list. */
function wheelIn(selection: ThingId | null, which: Which): number | null {
  const index = WHEELS.findIndex(({ id }) => selection === `wheel.${which}.${id}`);
  return index < 0 ? null : index;
}

/** The collision itself, drawn in world metres. What is known is solid; what follows from it is dashed and lighter. */
export const SceneLayer = memo(function SceneLayer({ scene: known, view, theme, selection, answer, shown }: Props) {
  const { speeds, words, directions } = answer;
  const scene = withComputed(known, directions);
  const each = (which: Which) => ({ scene, which, theme, zoom: view.scale, speeds });
  return (
    <Layer listening={false}>
      <Group x={view.originX} y={view.originY} scaleX={view.scale} scaleY={-view.scale}>
        <Marks scene={scene} theme={theme} selection={selection} />
        {BOTH.map((which) => (
          <Fans {...each(which)} key={which} />
        ))}
        {BOTH.map((which) => (
          <Ghosts {...each(which)} key={which} />
        ))}
        {BOTH.map((which) => (
          <Travel {...each(which)} key={which} selected={isTravel(selection, which)} />
        ))}
        {BOTH.map((which) => (
          <VehicleShape
            key={which}
            vehicle={scene.vehicles[which]}
            pose={scene.vehicles[which].pose}
            theme={theme}
            wheels={scene.wheels[which]}
            wheel={wheelIn(selection, which)}
            selected={selection === `vehicle.${which}`}
          />
        ))}
        {BOTH.map((which) => (
          <Approach
            {...each(which)}
            key={which}
            selected={selection === `approach.${which}`}
            computed={!known.approach[which]}
          />
        ))}
        <ContactShape
          scene={scene}
          theme={theme}
          zoom={view.scale}
          selected={selection === 'contact.plane' || selection === 'contact.point'}
        />
      </Group>
      {scene.marks.map((mark, k) => (
        <BoardLabel
          key={k}
          at={beside(toScreen(view, mark.points[0]))}
          text={mark.label}
          theme={theme}
          colour={theme.inkSoft}
        />
      ))}
      {scene.open && <WheelLabels scene={scene} which={scene.open} view={view} theme={theme} shown={shown} />}
      {BOTH.map((which) => (
        <SceneLabels
          key={which}
          scene={scene}
          which={which}
          view={view}
          theme={theme}
          speeds={speeds}
          words={words}
          shown={shown}
        />
      ))}
    </Layer>
  );
});

const beside = ([x, y]: readonly [number, number]): [number, number] => [x + 18, y + 12];

function Marks({ scene, theme, selection }: { scene: Scene; theme: Theme; selection: ThingId | null }) {
  return scene.marks.map((mark, k) => (
    <Line
      key={k}
      points={flat(mark.points)}
      stroke={selection === `mark.${k}` ? theme.ink : theme.lineStrong}
      strokeWidth={selection === `mark.${k}` ? 2.5 : 1.25}
      strokeScaleEnabled={false}
    />
  ));
}
