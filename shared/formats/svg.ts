import type {
  CircleItem,
  Drawing,
  DrawingItem,
  FontFamily,
  LineItem,
  PolygonItem,
  PolylineItem,
  RectItem,
  TextItem,
} from '../paper/drawing';
import { colourValue } from '../paper/tokens';

const fontStacks: Readonly<Record<FontFamily, string>> = {
  sans: "'IBM Plex Sans', Helvetica, Arial, sans-serif",
  mono: "'IBM Plex Mono', Menlo, Consolas, monospace",
};

/** Characters that XML 1.0 does not allow even when escaped (section 2.2), and lone surrogates. */
const forbiddenInXml = /[^\t\n\r\u{20}-\u{D7FF}\u{E000}-\u{FFFD}\u{10000}-\u{10FFFF}]/gu;

/** Text without the characters that XML cannot hold. */
export function allowedInXml(text: string): string {
  return text.replace(forbiddenInXml, '');
}

/** Text for XML content or a quoted attribute. */
export function escapeXml(text: string): string {
  return allowedInXml(text)
    .replace(/&/gu, '&amp;')
    .replace(/</gu, '&lt;')
    .replace(/>/gu, '&gt;')
    .replace(/"/gu, '&quot;');
}

/** A length to the micrometre, as short as it can be written. */
function number(valueMm: number): string {
  return String(Math.round(valueMm * 1000) / 1000);
}

/** Whole hundredths as a number, without the leading zero. */
function hundredths(value: number): string {
  return String(value / 100).replace(/^(-?)0\./u, '$1.');
}

/** Steps from point to point in hundredths of a millimetre; rounding does not add up along the line. */
function polylinePath({ pointsMm }: PolylineItem | PolygonItem): string {
  let x = Math.round(pointsMm[0] * 100);
  let y = Math.round(pointsMm[1] * 100);
  let path = `M${hundredths(x)} ${hundredths(y)}l`;
  for (let i = 2; i < pointsMm.length; i += 2) {
    const nextX = Math.round(pointsMm[i] * 100);
    const nextY = Math.round(pointsMm[i + 1] * 100);
    const dy = hundredths(nextY - y);
    path += `${i > 2 ? ' ' : ''}${hundredths(nextX - x)}${dy.startsWith('-') ? '' : ' '}${dy}`;
    x = nextX;
    y = nextY;
  }
  return path;
}

function linePath(line: LineItem): string {
  const start = `M${number(line.x1Mm)} ${number(line.y1Mm)}`;
  if (line.x1Mm === line.x2Mm) return `${start}V${number(line.y2Mm)}`;
  if (line.y1Mm === line.y2Mm) return `${start}H${number(line.x2Mm)}`;
  return `${start}L${number(line.x2Mm)} ${number(line.y2Mm)}`;
}

/** Stroke attributes of a line or polyline; items with the same ones share a path. */
function strokeOf(item: LineItem | PolylineItem): string {
  const stroke = `fill="none" stroke="${colourValue(item.colour)}" stroke-width="${number(item.weightMm)}"`;
  if (item.kind === 'polyline') return `${stroke} stroke-linejoin="round" stroke-linecap="round"`;
  return item.dashMm ? `${stroke} stroke-dasharray="${item.dashMm.map(number).join(' ')}"` : stroke;
}

function textElement(item: TextItem): string {
  const anchor = item.anchor === 'start' ? '' : ` text-anchor="${item.anchor}"`;
  const tracking = item.trackingEm ? ` letter-spacing="${number(item.trackingEm * item.sizeMm)}"` : '';
  return (
    `<text x="${number(item.xMm)}" y="${number(item.yMm)}"${anchor} font-family="${fontStacks[item.family]}"` +
    ` font-weight="${item.weight}" font-size="${number(item.sizeMm)}"${tracking}` +
    ` fill="${colourValue(item.colour)}">${escapeXml(item.text)}</text>`
  );
}

/** Fill and stroke of a closed shape. */
function paintOf({ fill, stroke, weightMm }: CircleItem | PolygonItem): string {
  const outline = stroke ? ` stroke="${colourValue(stroke)}" stroke-width="${number(weightMm)}"` : '';
  return `fill="${fill ? colourValue(fill) : 'none'}"${outline}`;
}

function rectElement(item: RectItem): string {
  const place = `x="${number(item.xMm)}" y="${number(item.yMm)}"`;
  const size = `width="${number(item.widthMm)}" height="${number(item.heightMm)}"`;
  return `<rect ${place} ${size} fill="${colourValue(item.fill)}"/>`;
}

/** Any item that is an element of its own. */
function element(item: Exclude<DrawingItem, LineItem>): string {
  switch (item.kind) {
    case 'polyline':
      return `<path ${strokeOf(item)} d="${polylinePath(item)}"/>`;
    case 'polygon':
      return `<path ${paintOf(item)} d="${polylinePath(item)}z"/>`;
    case 'circle':
      return `<circle cx="${number(item.cxMm)}" cy="${number(item.cyMm)}" r="${number(item.radiusMm)}" ${paintOf(item)}/>`;
    case 'text':
      return textElement(item);
    case 'rect':
      return rectElement(item);
  }
}

/** Elements in painting order. Neighbouring lines of one stroke become one path; each polyline keeps its own. */
function elements(items: readonly DrawingItem[]): string[] {
  const out: string[] = [];
  let openStroke = '';
  let openPath = '';
  const closePath = () => {
    if (openPath !== '') out.push(`<path ${openStroke} d="${openPath}"/>`);
    openPath = '';
  };
  for (const item of items) {
    if (item.kind === 'line') {
      const stroke = strokeOf(item);
      if (stroke !== openStroke) closePath();
      openStroke = stroke;
      openPath += linePath(item);
      continue;
    }
    closePath();
    out.push(element(item));
  }
  closePath();
  return out;
}

/**
 * A drawing as SVG 1.1 at true size: width and height in mm and one user unit to the
 * millimetre. Lines and labels to 1 µm, traces to 10 µm. Fonts are named; a file for others carries them too (`server/exports/svg-fonts.ts`). Same drawing, same text.
 */
export function drawingToSvg(drawing: Drawing): string {
  const width = number(drawing.widthMm);
  const height = number(drawing.heightMm);
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" width="${width}mm" height="${height}mm"` +
      ` viewBox="0 0 ${width} ${height}" role="img">`,
    `<title>${escapeXml(drawing.title)}</title>`,
    `<desc>${escapeXml(drawing.description)}</desc>`,
    ...elements(drawing.items),
    '</svg>',
    '',
  ].join('\n');
}
