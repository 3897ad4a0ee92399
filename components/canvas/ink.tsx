import { Arrow } from 'react-konva/lib/ReactKonvaCore';
import type { Vec } from '@/lib/geometry/vector';

/** Points as Konva takes them. */
export const flat = (points: readonly Vec[]): number[] => points.flatMap(([x, y]) => [x, y]);

interface Props {
  from: Vec;
  to: Vec;
  colour: string;
  /** Pixels per metre. */
  zoom: number;
  /** Of the line, and of the head, pixels. */
  width: number;
  head: number;
  dash?: number[];
}

/** An arrow in the world whose line and head keep their size on the screen. */
export function InkArrow({ from, to, colour, zoom, width, head, dash }: Props) {
  return (
    <Arrow
      points={flat([from, to])}
      stroke={colour}
      fill={colour}
      strokeWidth={width}
      strokeScaleEnabled={false}
      pointerLength={head / zoom}
      pointerWidth={(head * 0.7) / zoom}
      {...(dash ? { dash } : {})}
    />
  );
}
