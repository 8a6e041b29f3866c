/** What the panel draws, as data: sections with plots, each item with its words and its place in the spec. Every number is finite, so it survives JSON. */
import type { PlaceName } from './position';

/** All sections of one channel. */
export interface PanelPicture {
  readonly channel: string;
  readonly heading: Heading;
  readonly sections: readonly Section[];
}

/** How something stands against its limits: `thin` passes with little in hand, `unjudged` has no limit that could be judged. */
export type Standing = 'passes' | 'thin' | 'over' | 'unjudged';

/** A one-line answer and how it stands, so that no reader depends on its colour. */
export interface Answer {
  readonly text: string;
  readonly standing: Standing;
}

/** The top of the panel. */
export interface Heading {
  /** "capture · 51.2 kHz · 16 bits" */
  readonly summary: string;
  readonly verdict: Answer;
  /** The verdict in whole sentences, for a screen reader. */
  readonly words: string;
}

/** Which section: capture has `sampling`, generate `leaving`, both `path`. */
export type SectionId = 'sampling' | 'leaving' | 'path';

/** A foldable part of the panel with its answer in the heading. */
export interface Section {
  readonly id: SectionId;
  readonly title: string;
  readonly answer: Answer;
  /** The line its answer is about. */
  readonly place: PlaceName | null;
  readonly plots: readonly Plot[];
}

/** One canvas: one pane, or two stacked panes with ribbons between them. */
export interface Plot {
  /** Unique in the picture and the same in every picture of its kind, so that zoom and folds can be kept. */
  readonly id: string;
  readonly title: string;
  /** What the plot shows, in sentences, for a screen reader. */
  readonly words: string;
  /** Whether it is always drawn, or once the reader opens it. */
  readonly shown: 'always' | 'on demand';
  readonly panes: readonly Pane[];
  /** What the legend lists and the reader can hide. */
  readonly series: readonly Series[];
  readonly items: readonly Item[];
  readonly table: Table;
}

/** A pair of axes. */
export interface Pane {
  readonly id: string;
  readonly x: FrequencyAxis;
  readonly y: LevelAxis;
}

/** The axis of frequencies, drawn linear or logarithmic at the reader's choice. */
export interface FrequencyAxis {
  /** "Hz at the input" */
  readonly title: string;
  readonly lowHz: number;
  readonly highHz: number;
  /** Where the axis begins when it is logarithmic; above zero. */
  readonly logLowHz: number;
  readonly scale: 'log' | 'linear';
}

/** What a vertical axis is counted in. */
export type LevelUnit = 'dBFS' | 'dB' | 'deg' | 's' | 'ms' | 'µs' | 'ns';

/** The axis of levels, gains, phases or delays. */
export interface LevelAxis {
  readonly title: string;
  readonly unit: LevelUnit;
  readonly low: number;
  readonly high: number;
}

/** Something the legend lists; its items are shown and hidden together. */
export interface Series {
  readonly id: string;
  readonly name: string;
  readonly role: Role;
  readonly place: PlaceName | null;
}

/** What an item stands for; the page and the exports choose colour, dash and pattern by it. */
export type Role =
  | 'wanted'
  | 'source'
  | 'landing'
  | 'harm'
  | 'copy'
  | 'path'
  | 'total'
  | 'stage'
  | 'pulse'
  | 'envelope'
  | 'limit'
  | 'noise'
  | 'rule';

/** One thing that is drawn, read out, lit and followed as a whole. */
export interface Item {
  /** Unique in the picture. */
  readonly id: string;
  readonly series: string;
  readonly pane: string;
  readonly role: Role;
  /** "drive hash, behind the path" */
  readonly name: string;
  /** One sentence for a screen reader and for the line under the pointer. */
  readonly words: string;
  readonly place: PlaceName | null;
  /** Further places whose cursor lights it: the shared filter or clock behind it. */
  readonly alsoAt?: readonly PlaceName[];
  /** Items that light up with this one: a source's landing and ribbons, and the other way round. */
  readonly joins: readonly string[];
  readonly shapes: readonly Shape[];
  readonly label: Label | null;
}

/** Points of a curve from left to right, levels in the pane's unit. */
export interface Points {
  readonly x: readonly number[];
  readonly y: readonly number[];
  /** For each point the frequency it comes from: of a landing the input's, of a copy the wanted one. */
  readonly from?: readonly number[];
}

/** How strongly something is inked: a pale fill for what was, a solid one for what is. */
export type Tone = 'pale' | 'solid';

/** How a curve is dashed: told apart without colour. */
export type Stroke = 'solid' | 'dashed' | 'dotted' | 'dash-dot' | 'long-dash';

/** The geometry of an item, in data units. */
export type Shape =
  | {
      readonly kind: 'curve';
      readonly points: Points;
      readonly stroke: Stroke;
      readonly weight: 'thin' | 'bold';
    }
  /** Filled between two curves over the same x; `lower` null: down to the bottom of the pane. */
  | { readonly kind: 'area'; readonly upper: Points; readonly lower: Points | null; readonly tone: Tone }
  /** Filled from `top` down to the bottom of the pane. */
  | { readonly kind: 'block'; readonly lowHz: number; readonly highHz: number; readonly top: number; readonly tone: Tone }
  /** A line from the bottom of the pane up to `top`. */
  | { readonly kind: 'stem'; readonly frequencyHz: number; readonly top: number; readonly tone: Tone }
  /** A vertical line over the whole pane. */
  | { readonly kind: 'rule'; readonly frequencyHz: number }
  /** A boundary that must not be crossed, shaded on its forbidden side. */
  | { readonly kind: 'forbidden'; readonly boundary: Points; readonly side: 'above' | 'below' }
  | { readonly kind: 'mark'; readonly frequencyHz: number; readonly level: number; readonly mark: 'over' | 'inside' }
  | Ribbon;

/** A stretch of this item's pane joined with the stretch of another pane where it lands. */
export interface Ribbon {
  readonly kind: 'ribbon';
  readonly lowHz: number;
  readonly highHz: number;
  readonly landsPane: string;
  readonly landsLowHz: number;
  readonly landsHighHz: number;
  /** Turned round by the fold: its low end lands on the high end. The ribbon then has a twist. */
  readonly inverted: boolean;
  /** 0 … 1: how near it comes to doing harm. */
  readonly strength: number;
}

/** A text beside a point; it is moved, or left out, so that none overlap. */
export interface Label {
  readonly text: string;
  readonly frequencyHz: number;
  readonly level: number;
  /** Where it goes if there is room. */
  readonly prefer: 'above' | 'below' | 'left' | 'right' | 'ribbon';
  /** Higher is placed first. */
  readonly priority: number;
}

/** The plot's data as a table: one row an item or a figure. Curves are listed point by point from the items themselves. */
export interface Table {
  readonly caption: string;
  readonly columns: readonly Column[];
  readonly rows: readonly Row[];
}

/** A column; numbers in it are in `unit`. */
export interface Column {
  readonly title: string;
  readonly unit: 'Hz' | 'dBc' | LevelUnit | null;
}

/** A row, with the item whose data it holds. */
export interface Row {
  readonly item: string | null;
  readonly cells: readonly (string | number | null)[];
}
