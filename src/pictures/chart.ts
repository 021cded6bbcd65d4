/**
 * @module A chart as plain data: what is to be seen, not how. The vector writers and the terminal draw the same chart, and
 * --csv writes its numbers.
 */

export interface ValueAxis {
  readonly kind: 'linear' | 'log' | 'whole';
  readonly low: number;
  readonly high: number;
  /** In the notation of `vector/typeset.ts`. */
  readonly label: string;
  /** Room beyond low and high, as a part of their distance. */
  readonly margin?: number;
}

/** An upward axis of names instead of numbers, the first at the top; y is the index of the name. */
export interface NameAxis {
  readonly kind: 'names';
  readonly names: readonly string[];
  readonly label: string;
}

export type Point = readonly [x: number, y: number];
export type MarkerShape = 'disc' | 'ring' | 'square' | 'diamond' | 'triangle' | 'cross' | 'bar';
export type LineStyle = 'full' | 'dashed' | 'dotted';

interface Named {
  /** For the legend; a layer without a name is not in it. */
  readonly name?: string;
}

/** Points in order, joined by a line, marked, or both. */
export interface Curve extends Named {
  readonly kind: 'curve';
  readonly points: readonly Point[];
  readonly ink: number;
  readonly line?: LineStyle;
  readonly marker?: MarkerShape;
}

/** Everything between two values of one axis. */
export interface Band extends Named {
  readonly kind: 'band';
  readonly along: 'x' | 'y';
  readonly from: number;
  readonly to: number;
  readonly tone: 'first' | 'second';
}

/** A line right across at one value of one axis. */
export interface Rule extends Named {
  readonly kind: 'rule';
  readonly along: 'x' | 'y';
  readonly at: number;
  readonly line: LineStyle;
  readonly ink: number | 'faint';
}

/** Intervals in x or y: thin with ends, or thick. */
export interface Intervals extends Named {
  readonly kind: 'intervals';
  readonly along: 'x' | 'y';
  readonly items: readonly { readonly x: number; readonly y: number; readonly minus: number; readonly plus: number }[];
  readonly ink: number;
  readonly weight: 'thin' | 'thick';
}

/** Columns from `base` (0) up, side by side. */
export interface Columns extends Named {
  readonly kind: 'columns';
  readonly bins: readonly { readonly from: number; readonly to: number; readonly height: number }[];
  readonly ink: number;
}

/** Bars that lie, one on a name. */
export interface Bars extends Named {
  readonly kind: 'bars';
  readonly items: readonly { readonly y: number; readonly from: number; readonly to: number }[];
  readonly ink: number;
}

/** Words at a point. */
export interface Note {
  readonly kind: 'note';
  readonly at: Point;
  readonly text: string;
  readonly anchor: 'start' | 'middle' | 'end';
}

export type Layer = Curve | Band | Rule | Intervals | Columns | Bars | Note;

export interface Panel {
  readonly x: ValueAxis;
  readonly y: ValueAxis | NameAxis;
  /** Drawn in this order, the first at the bottom. */
  readonly layers: readonly Layer[];
  /** A legend of the named layers: inside, where it covers least, or below. */
  readonly legend?: 'inside' | 'below';
  /** A unit of x is as long as a unit of y. */
  readonly square?: boolean;
}

/** Plotted numbers with the names of their columns, as texts: those of the result where it has them. */
export interface Plotted {
  readonly name: string;
  readonly columns: readonly string[];
  readonly rows: readonly (readonly string[])[];
}

export interface Chart {
  /** One line: what is shown, of what. */
  readonly title: string;
  /** What a reader who cannot see it needs to know. */
  readonly description: string;
  /** Above each other, the x axis of each its own. */
  readonly panels: readonly Panel[];
  readonly data: readonly Plotted[];
}
