import type { SheetParameters } from '../parameters/strip-parameters';
import { cssPxToMm } from './paper-scale';

/**
 * Colours, weights and type of everything drawn on paper. The numbers are the project's own design tokens;
 * sizes given there in CSS pixels are turned into millimetres at 96 px per inch.
 */

export type GridTint = SheetParameters['gridTint'];

/** Lines every 1 mm, lines every 5 mm, and the ground below them. */
export const gridColours = {
  rose: { minor: '#f8e8e2', major: '#efc9bf', ground: '#fffbf8' },
  sand: { minor: '#f3ead8', major: '#dfcca8', ground: '#fffdf7' },
  sage: { minor: '#e5eee3', major: '#bfd3bd', ground: '#fbfdf9' },
  slate: { minor: '#e6ebef', major: '#c0ccd6', ground: '#fbfcfd' },
  grey: { minor: '#ebebe9', major: '#c6c6c3', ground: '#ffffff' },
} as const satisfies Record<GridTint, { minor: string; major: string; ground: string }>;

/** Colours outside the grid. `ink3` is for captions beside a grid, never on one. */
export const inkColours = {
  page: '#ffffff',
  ink: '#1f2a37',
  ink2: '#46515e',
  ink3: '#5d6672',
  edge: '#867b68',
  ruleStrong: '#cbc0ac',
  copper: '#b4532a',
  copperDark: '#8f3f1d',
} as const;

type GridPart = keyof (typeof gridColours)[GridTint];

/** Name of a colour: an ink, or `tint.part` of a grid. */
export type PaperColour = keyof typeof inkColours | `${GridTint}.${GridPart}`;

/** `#rrggbb` of a named colour. */
export function colourValue(colour: PaperColour): string {
  if (colour in inkColours) return inkColours[colour as keyof typeof inkColours];
  const [tint, part] = colour.split('.') as [GridTint, GridPart];
  return gridColours[tint][part];
}

/** Line weights on paper, mm. */
export const lineWeightsMm = {
  trace: 0.34,
  calibration: 0.3,
  gridMajor: 0.18,
  gridMinor: 0.08,
  leadChange: 0.3,
  ladderConduction: 0.4,
  ladderStimulus: 0.5,
  marker: 0.4,
  ladderSign: 0.3,
  ladderLane: 0.15,
  ladderHatch: 0.12,
  annotation: 0.25,
  writingLine: 0.2,
} as const;

/** A size of type with its line height, mm. `caption` is the smallest and 9 pt high. */
export interface TypeSize {
  sizeMm: number;
  lineMm: number;
}

function typeSize(sizePx: number, linePx: number): TypeSize {
  return { sizeMm: cssPxToMm(sizePx), lineMm: cssPxToMm(linePx) };
}

export const typeSizes = {
  caption: typeSize(12, 16),
  dense: typeSize(13, 18),
  section: typeSize(15, 20),
  heading: typeSize(17, 22),
  title: typeSize(22, 28),
  poster: typeSize(40, 46),
} as const;

/** Letter spacing of titles, em. */
export const titleTrackingEm = -0.012;

/** Height of a capital over the size of the type: IBM Plex Sans and Mono, OS/2 table, sCapHeight 698 of 1000. */
export const capHeightEm = 0.698;
