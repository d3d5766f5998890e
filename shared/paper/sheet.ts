import type { SheetParameters } from '../parameters/strip-parameters';
import { syntheticCaution } from './cautions';
import type { Drawing } from './drawing';
import { layoutFooter } from './footer';
import type { GridArea } from './grid';
import { layoutHeader, provenanceLabel, settingsLabel, untitled } from './header';
import { usualLineS } from './layout';
import { layoutPanel, movePanel } from './panel';
import type { PaperStrip } from './paper-strip';
import type { PlacedSegment } from './placed-segment';
import { placeBlock } from './text-block';
import { textStyles } from './text-styles';

/** Free paper around a sheet, mm. A 10 s line at 25 mm/s makes it 294 mm wide: A4 landscape at true scale. */
export const marginMm = 12;
/** The gridded paper is at least this wide, mm: room for the cautions beside a very short strip. */
const leastPaperWidthMm = 140;
/** Between header and grid, and grid and footer, mm. */
const headerGapMm = 4;
const footerGapMm = 3;

export interface SheetOptions {
  /** Instead of the strip's own title. */
  title?: string;
  /** A sentence under the title, such as the teaching point; none by default. */
  subtitle?: string;
  /** Longest line of paper in seconds; longer strips go on below. 10 by default. */
  lineS?: number;
}

/** A strip's sheet, with the places that calipers, ladders and tests need. */
export interface StripSheet extends Drawing {
  grid: GridArea;
  segments: PlacedSegment[];
}

/**
 * Lays one strip on a sheet: header (title, speed, gain, bandwidth, provenance), gridded paper with
 * calibration pulses, lead names and traces, footer (notes and cautions). True scale, never fitted: the sheet
 * is as wide as a line of its time needs and as high as its rows need. Events are not drawn: a sheet shows what
 * a recorder would. Throws RangeError for a strip that is empty or uneven.
 */
export function layoutStripSheet(
  strip: PaperStrip,
  sheet: SheetParameters,
  options: SheetOptions = {},
): StripSheet {
  const title = options.title ?? (strip.parameters.title || untitled);
  const settings = settingsLabel(strip, sheet);
  const loosePanel = layoutPanel(strip, sheet, {
    leastWidthMm: leastPaperWidthMm,
    lineS: options.lineS ?? usualLineS,
  });
  const { widthMm } = loosePanel.area;
  const header = layoutHeader(
    { title, subtitle: options.subtitle ?? '', settings, provenance: provenanceLabel(strip) },
    { title: textStyles.title, subtitle: textStyles.subtitle },
    widthMm,
  );
  // Whole millimetres, so that the grid falls on whole pixels at 254 dpi.
  const panelTopMm = Math.ceil(marginMm + header.heightMm + headerGapMm);
  const panel = movePanel(loosePanel, marginMm, panelTopMm);
  const footerTopMm = panelTopMm + panel.area.heightMm + footerGapMm;
  const footer = layoutFooter(panel.notes, widthMm);
  const size = {
    widthMm: widthMm + 2 * marginMm,
    heightMm: Math.ceil(footerTopMm + footer.heightMm + marginMm),
  };
  return {
    ...size,
    title,
    description: `${syntheticCaution}. ${settings}.`,
    items: [
      { kind: 'rect', role: 'page', xMm: 0, yMm: 0, ...size, fill: 'page' },
      ...placeBlock(header, marginMm, marginMm),
      ...panel.items,
      ...placeBlock(footer, marginMm, footerTopMm),
    ],
    grid: panel.area,
    segments: panel.segments,
  };
}
