import type { SheetParameters } from '../parameters/strip-parameters';
import { bandwidthLabel } from './bandwidth-label';
import type { PaperStrip } from './paper-strip';
import { textItem, textWidthMm, type TextStyle } from './text';
import { baselineMm, textBlock, type TextBlock } from './text-block';
import { textStyles } from './text-styles';

/** Written where a strip has no title. */
export const untitled = 'Untitled strip';

/** Least distance between texts at the two ends of a line, mm. */
const betweenMm = 8;
/** Above settings that are set below the title, mm. */
const aboveSettingsMm = 1;

/** Speed, gain and bandwidth as a recorder prints them: `25 mm/s 10 mm/mV 0.05–150 Hz`. */
export function settingsLabel(strip: PaperStrip, sheet: SheetParameters): string {
  const scale = `${sheet.speedMmPerS} mm/s ${sheet.gainMmPerMv} mm/mV`;
  return `${scale} ${bandwidthLabel(strip.parameters.recorder)}`;
}

/** What is needed to make the same strip again: `500 samples/s, 5 µV, seed 1, engine 0.1.0`. */
export function provenanceLabel(strip: PaperStrip): string {
  const { seed, recorder } = strip.parameters;
  const sampling = `${strip.sampleRateHz} samples/s, ${recorder.resolutionUv} µV`;
  return `${sampling}, seed ${seed}, engine ${strip.engineVersion}`;
}

export interface HeaderTexts {
  title: string;
  /** Under the title; none when empty. */
  subtitle: string;
  settings: string;
  /** Under the settings; none when empty. */
  provenance: string;
}

export interface HeaderStyles {
  title: TextStyle;
  subtitle: TextStyle;
}

/**
 * Title and subtitle on the left, settings and provenance on the right of the same lines where the title leaves
 * room on one line; otherwise all below each other.
 */
export function layoutHeader(texts: HeaderTexts, styles: HeaderStyles, widthMm: number): TextBlock {
  const { settings, provenance } = textStyles;
  const settingsWidthMm = textWidthMm(texts.settings, settings);
  const provenanceWidthMm = textWidthMm(texts.provenance, provenance);
  const titleRoomMm = widthMm - settingsWidthMm - betweenMm;
  const title = { text: texts.title, style: styles.title };
  const subtitle = { text: texts.subtitle, style: styles.subtitle };
  if (textWidthMm(texts.title, styles.title) > titleRoomMm) {
    return textBlock([
      { ...title, widthMm },
      { ...subtitle, widthMm },
      { text: texts.settings, style: settings, widthMm, gapAboveMm: aboveSettingsMm },
      { text: texts.provenance, style: provenance, widthMm },
    ]);
  }
  const subtitleRoomMm = texts.provenance === '' ? widthMm : widthMm - provenanceWidthMm - betweenMm;
  const left = textBlock([
    { ...title, widthMm: titleRoomMm },
    { ...subtitle, widthMm: subtitleRoomMm },
  ]);
  const right = [textItem(texts.settings, settings, widthMm, baselineMm(0, styles.title), 'end')];
  if (texts.provenance === '') return { items: [...left.items, ...right], heightMm: left.heightMm };
  const secondBaselineMm = baselineMm(styles.title.size.lineMm, styles.subtitle);
  right.push(textItem(texts.provenance, provenance, widthMm, secondBaselineMm, 'end'));
  const twoLinesMm = styles.title.size.lineMm + styles.subtitle.size.lineMm;
  return { items: [...left.items, ...right], heightMm: Math.max(left.heightMm, twoLinesMm) };
}
