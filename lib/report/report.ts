import type { Level } from '@/lib/results/result';
import type { Paper } from './paper';
import type { Drawing } from './plan-sheet';
import type { SpeedFigure } from './speed-figure';
import type { Chapter } from './worked/sheet';

/** A report as plain data: what is said, in which order, in which kind of block. How it looks is not known here. */
export interface Report {
  header: Header;
  sections: Section[];
}

export type { Paper } from './paper';

export interface Header {
  title: string;
  subject: string;
  reference: string;
  /** The rows of the title block. */
  rows: [term: string, text: string][];
  paper: Paper;
  /** Printed at the edges of every page. */
  edges: { case: string; hash: string; engine: string };
}

export interface Section {
  id: string;
  title: string;
  blocks: Block[];
  /** Stands on a page of its own. */
  ownPage?: boolean;
}

export type Block =
  | { kind: 'paragraph'; text: string }
  /** Instead of a figure that a failed check withholds. */
  | { kind: 'withheld'; reasons: string[] }
  | { kind: 'headline'; figures: HeadlineFigure[] }
  | { kind: 'definitions'; rows: [term: string, text: string][] }
  | { kind: 'list'; ordered: boolean; items: string[] }
  | Table
  | { kind: 'steps'; chapters: Chapter[] }
  | { kind: 'symbols'; rows: [symbol: string, meaning: string][] }
  | { kind: 'plan'; drawing: Drawing }
  | { kind: 'speeds'; figure: SpeedFigure }
  | { kind: 'checks'; items: PrintedCheck[] }
  | { kind: 'signature'; lines: string[] };

export interface HeadlineFigure {
  label: string;
  /** The median, or the one-sided bound. */
  value: string;
  unit: string;
  /** «95 % interval 23.0 to 30.4 km/h». */
  interval: string;
}

export interface Table {
  kind: 'table';
  caption: string;
  columns: Column[];
  rows: Row[];
  /** Said under the table. */
  notes?: string[];
}

export interface Column {
  title: string;
  kind: 'words' | 'number';
}

/** A row of cells, or the title of a group of rows. */
export type Row = { cells: string[] } | { group: string };

export interface PrintedCheck {
  level: Level;
  title: string;
  says: string;
  advice: string;
  /** Number held against limit, and where the limit comes from. */
  source: string;
}
