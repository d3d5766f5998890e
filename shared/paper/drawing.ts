import type { PaperColour } from './tokens';

/**
 * A drawing is a list of strokes and labels in millimetres, x to the right and y down from the top left
 * corner, in painting order. Whoever paints it (SVG, canvas, PDF) decides nothing but how.
 */

/** What an item is for; painters may treat roles differently (a canvas snaps grid lines to pixels). */
export type DrawingRole =
  | 'page'
  | 'ground'
  | 'gridMinor'
  | 'gridMajor'
  | 'calibration'
  | 'leadChange'
  | 'trace'
  | 'leadName'
  | 'lineTime'
  | 'ladder'
  | 'marker'
  | 'title'
  | 'caption'
  | 'settings'
  | 'provenance'
  | 'caution'
  | 'note'
  | 'annotation'
  | 'reading'
  | 'answerLine'
  | 'sheetKind'
  | 'scaleBar';

export interface PolylineItem {
  kind: 'polyline';
  role: DrawingRole;
  /** x0, y0, x1, y1, … in mm; at least two points. */
  pointsMm: Float64Array;
  colour: PaperColour;
  weightMm: number;
}

export interface LineItem {
  kind: 'line';
  role: DrawingRole;
  x1Mm: number;
  y1Mm: number;
  x2Mm: number;
  y2Mm: number;
  colour: PaperColour;
  weightMm: number;
  /** Length of a dash and of the gap after it; solid without. */
  dashMm?: readonly [number, number];
}

export interface RectItem {
  kind: 'rect';
  role: DrawingRole;
  xMm: number;
  yMm: number;
  widthMm: number;
  heightMm: number;
  fill: PaperColour;
}

export interface CircleItem {
  kind: 'circle';
  role: DrawingRole;
  cxMm: number;
  cyMm: number;
  radiusMm: number;
  fill: PaperColour | null;
  stroke: PaperColour | null;
  weightMm: number;
}

/** A closed shape. */
export interface PolygonItem {
  kind: 'polygon';
  role: DrawingRole;
  /** x0, y0, x1, y1, … in mm; at least three points. */
  pointsMm: Float64Array;
  fill: PaperColour | null;
  stroke: PaperColour | null;
  weightMm: number;
}

export type TextAnchor = 'start' | 'middle' | 'end';
export type FontFamily = 'sans' | 'mono';
export type FontWeight = 400 | 500 | 600;

export interface TextItem {
  kind: 'text';
  role: DrawingRole;
  text: string;
  /** Where the text starts, has its middle or ends, by `anchor`. */
  xMm: number;
  /** Baseline. */
  yMm: number;
  anchor: TextAnchor;
  family: FontFamily;
  weight: FontWeight;
  sizeMm: number;
  /** 0 when absent. */
  trackingEm?: number;
  colour: PaperColour;
}

export type DrawingItem = PolylineItem | LineItem | RectItem | CircleItem | PolygonItem | TextItem;

export interface Drawing {
  widthMm: number;
  heightMm: number;
  /** For the file's metadata and for people who cannot see the drawing. */
  title: string;
  description: string;
  items: DrawingItem[];
}

/** The item moved by (dxMm, dyMm). */
export function moveItem(item: DrawingItem, dxMm: number, dyMm: number): DrawingItem {
  switch (item.kind) {
    case 'polyline':
    case 'polygon':
      return { ...item, pointsMm: item.pointsMm.map((value, i) => value + (i % 2 === 0 ? dxMm : dyMm)) };
    case 'line':
      return {
        ...item,
        x1Mm: item.x1Mm + dxMm,
        y1Mm: item.y1Mm + dyMm,
        x2Mm: item.x2Mm + dxMm,
        y2Mm: item.y2Mm + dyMm,
      };
    case 'circle':
      return { ...item, cxMm: item.cxMm + dxMm, cyMm: item.cyMm + dyMm };
    case 'rect':
    case 'text':
      return { ...item, xMm: item.xMm + dxMm, yMm: item.yMm + dyMm };
  }
}
