import { type Vec, scale } from '@/lib/geometry/vector';
import { WHEEL_WORDS, legLabelAt, letterAt, restLabelAt, wheelLabelAt } from '@/lib/scene/labels';
import { type Scene, type Speeds, type Which, approachTail } from '@/lib/scene/scene';
import { type View, toScreen } from '@/lib/scene/view';
import { BoardLabel } from './board-label';
import type { Theme } from './theme';
import type { AnswerDrawn } from './use-answer-drawn';

/** How numbers are shown, with their unit. */
export interface Shown {
  length: (metres: number) => string;
  angle: (degrees: number) => string;
  ratio: (share: number) => string;
}

interface Props {
  scene: Scene;
  which: Which;
  view: View;
  theme: Theme;
  speeds: Speeds;
  words: AnswerDrawn['words'];
  shown: Shown;
}

/** How far words stand off what they name, pixels. */
const OFF = { rest: [38, 13], leg: 20, speed: [46, 18] } as const;
/** Legs shorter than this carry no length, pixels. */
const SHORT = 36;

/** The letter of a vehicle, its computed speed, the lengths of its legs, and where it came to rest. */
export function SceneLabels({ scene, which, view, theme, speeds, words, shown }: Props) {
  const screen = (at: Vec): Vec => toScreen(view, at);
  const rest = restLabelAt(scene, which, [OFF.rest[0] / view.scale, OFF.rest[1] / view.scale]);
  const speed = words[which];
  const tail = approachTail(scene, which, speeds[which]);
  return (
    <>
      <BoardLabel
        at={screen(letterAt(scene, which))}
        text={which}
        theme={theme}
        colour={theme[which]}
        size={17}
        strong
      />
      {rest && !isOverWheels(scene, which, view, rest) && (
        <BoardLabel at={screen(rest)} text={`${which} at rest`} theme={theme} colour={theme[which]} />
      )}
      {tail && speed && (
        <BoardLabel
          at={besideTail(screen(tail), screen(scene.point.at))}
          text={speed}
          theme={theme}
          colour={theme.inkSoft}
        />
      )}
      {scene.travel[which]?.legs.map((leg, k) =>
        leg * view.scale < SHORT ? null : (
          <BoardLabel
            key={k}
            at={screen(legLabelAt(scene, which, k, OFF.leg / view.scale))}
            text={shown.length(leg)}
            theme={theme}
            colour={theme.ink}
          />
        ),
      )}
    </>
  );
}

/** Where the words about its wheels stand, those at rest give way. */
function isOverWheels(scene: Scene, which: Which, view: View, at: Vec): boolean {
  if (scene.open !== which) return false;
  const [width, height] = scale(WHEEL_WORDS, 2 / view.scale);
  return [0, 1, 2, 3].some((wheel) => {
    const [x, y] = wheelLabelAt(scene, which, wheel, scale(WHEEL_WORDS, 1 / view.scale));
    return Math.abs(x - at[0]) < width && Math.abs(y - at[1]) < height;
  });
}

/** Beyond the tail of an arrow, seen from the contact. */
function besideTail([x, y]: Vec, [px, py]: Vec): Vec {
  const reach = Math.hypot(x - px, y - py) || 1;
  return [x + ((x - px) / reach) * OFF.speed[0], y + ((y - py) / reach) * OFF.speed[1]];
}
