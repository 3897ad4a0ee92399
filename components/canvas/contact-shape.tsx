import { Ellipse, Line } from 'react-konva/lib/ReactKonvaCore';
import { add, scale, unit } from '@/lib/geometry/vector';
import { PLANE_REACH } from '@/lib/scene/grip';
import type { Scene } from '@/lib/scene/scene';
import { InkArrow, flat } from './ink';
import { Fan } from './motion-shapes';
import type { Theme } from './theme';

/** Half the arm of the cross, pixels. */
const CROSS = 7;
/** Length of the normal, m. */
const NORMAL = 0.9;

interface Props {
  scene: Scene;
  theme: Theme;
  /** Pixels per metre. */
  zoom: number;
  selected: boolean;
}

/** The contact point as a cross, the contact plane as a line through it with its normal, and how well both are known. */
export function ContactShape({ scene: { point, plane }, theme, zoom, selected }: Props) {
  const along = scale(unit(plane.angle), PLANE_REACH);
  const [x, y] = point.at;
  const arm = CROSS / zoom;
  const line = { stroke: theme.ink, strokeScaleEnabled: false };
  return (
    <>
      {[plane.angle, plane.angle + Math.PI].map((angle) => (
        <Fan
          key={angle}
          centre={point.at}
          angle={angle}
          half={plane.fan}
          radius={PLANE_REACH}
          fill={theme.lineStrong}
        />
      ))}
      {point.spread[0] > 0 && point.spread[1] > 0 && (
        <Ellipse x={x} y={y} radiusX={point.spread[0]} radiusY={point.spread[1]} fill={theme.ink} opacity={0.12} />
      )}
      <Line
        points={flat([add(point.at, scale(along, -1)), add(point.at, along)])}
        strokeWidth={selected ? 2.75 : 1.5}
        {...line}
      />
      <InkArrow
        from={point.at}
        to={add(point.at, scale(unit(plane.normal), NORMAL))}
        colour={theme.inkSoft}
        zoom={zoom}
        width={1.25}
        head={8}
        dash={[4, 3]}
      />
      {[1, -1].map((sign) => (
        <Line
          key={sign}
          points={[x - arm, y - sign * arm, x + arm, y + sign * arm]}
          strokeWidth={selected ? 3 : 2.25}
          {...line}
        />
      ))}
    </>
  );
}
