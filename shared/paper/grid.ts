import type { LineItem, RectItem } from './drawing';
import { largeBoxMm, smallBoxMm } from './paper-scale';
import { lineWeightsMm, type GridTint } from './tokens';

export interface GridArea {
  xMm: number;
  yMm: number;
  /** Multiple of 5 mm, so that a heavy line closes every edge. */
  widthMm: number;
  /** Multiple of 5 mm. */
  heightMm: number;
}

function gridLine(area: GridArea, tint: GridTint, offsetMm: number, vertical: boolean): LineItem {
  const heavy = offsetMm % largeBoxMm === 0;
  const right = area.xMm + area.widthMm;
  const bottom = area.yMm + area.heightMm;
  const x = area.xMm + offsetMm;
  const y = area.yMm + offsetMm;
  return {
    kind: 'line',
    role: heavy ? 'gridMajor' : 'gridMinor',
    ...(vertical
      ? { x1Mm: x, y1Mm: area.yMm, x2Mm: x, y2Mm: bottom }
      : { x1Mm: area.xMm, y1Mm: y, x2Mm: right, y2Mm: y }),
    colour: heavy ? `${tint}.major` : `${tint}.minor`,
    weightMm: heavy ? lineWeightsMm.gridMajor : lineWeightsMm.gridMinor,
  };
}

/**
 * The ground, then every 1 mm line that is not a 5 mm line, then the 5 mm lines; first and last lie on the
 * edges. Throws RangeError when the area is not a whole number of large boxes.
 */
export function gridItems(area: GridArea, tint: GridTint): (RectItem | LineItem)[] {
  if (area.widthMm % largeBoxMm !== 0 || area.heightMm % largeBoxMm !== 0) {
    throw new RangeError(`A grid of ${area.widthMm} × ${area.heightMm} mm is not whole large boxes`);
  }
  const lines: LineItem[] = [];
  for (let x = 0; x <= area.widthMm; x += smallBoxMm) lines.push(gridLine(area, tint, x, true));
  for (let y = 0; y <= area.heightMm; y += smallBoxMm) lines.push(gridLine(area, tint, y, false));
  return [
    { kind: 'rect', role: 'ground', ...area, fill: `${tint}.ground` },
    ...lines.filter((line) => line.role === 'gridMinor'),
    ...lines.filter((line) => line.role === 'gridMajor'),
  ];
}
