import { Text } from 'react-konva/lib/ReactKonvaCore';
import type { Vec } from '@/lib/geometry/vector';
import type { Theme } from './theme';

/** Mean width of a character over the type's size. */
const SET = 0.56;

/** Upright words on the board, centred on a pixel, kept readable over lines by an edge of paper. */
export function BoardLabel({
  at,
  text,
  theme,
  colour,
  size = 12,
  strong = false,
}: {
  at: Vec;
  text: string;
  theme: Theme;
  colour: string;
  size?: number;
  strong?: boolean;
}) {
  const width = text.length * size * SET + 12;
  return (
    <Text
      x={Math.round(at[0] - width / 2)}
      y={Math.round(at[1] - size / 2)}
      width={width}
      align="center"
      text={text}
      fontFamily={theme.font}
      fontSize={size}
      fontStyle={strong ? '700' : '500'}
      fill={colour}
      stroke={theme.paper}
      strokeWidth={3}
      lineJoin="round"
      fillAfterStrokeEnabled
    />
  );
}
