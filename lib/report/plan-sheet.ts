import type { Scale } from './paper';

/** A plan on paper: everything in millimetres from the top left corner of its frame, drawn at a standard scale. */
export interface Drawing {
  scale: Scale;
  width: number;
  height: number;
  /** Grid lines with the world coordinate that they stand for, m. */
  grid: { axis: 'x' | 'y'; at: number; metres: number }[];
  /** Direction of north on paper, degrees counter-clockwise from the right. */
  north: number;
  items: Item[];
  legend: { role: Role; text: string }[];
  caption: string;
}

/** What a line or a surface stands for; how it is drawn is decided where it is drawn. */
export type Role =
  | 'vehicle.A'
  | 'vehicle.B'
  | 'detail'
  | 'approach.A'
  | 'approach.B'
  | 'travel.A'
  | 'travel.B'
  | 'plane'
  | 'normal'
  | 'point'
  | 'centre'
  | 'mark';

export type Point = readonly [x: number, y: number];

export type Item =
  | { kind: 'polygon'; role: Role; points: Point[] }
  | { kind: 'line'; role: Role; points: Point[]; arrow?: boolean; label?: string }
  | { kind: 'dot'; role: Role; at: Point }
  | { kind: 'label'; at: Point; text: string; strong?: boolean };
