import type { TextStyle } from './text';
import { titleTrackingEm, typeSizes } from './tokens';

/** The styles of every text on a sheet, after the project's type scale. */
export const textStyles = {
  posterTitle: {
    role: 'title',
    family: 'sans',
    weight: 600,
    size: typeSizes.poster,
    trackingEm: titleTrackingEm,
    colour: 'ink',
  },
  posterSubtitle: { role: 'caption', family: 'sans', weight: 400, size: typeSizes.heading, colour: 'ink2' },
  title: {
    role: 'title',
    family: 'sans',
    weight: 600,
    size: typeSizes.title,
    trackingEm: titleTrackingEm,
    colour: 'ink',
  },
  cardTitle: { role: 'title', family: 'sans', weight: 600, size: typeSizes.heading, colour: 'ink' },
  subtitle: { role: 'caption', family: 'sans', weight: 400, size: typeSizes.dense, colour: 'ink2' },
  settings: { role: 'settings', family: 'mono', weight: 400, size: typeSizes.caption, colour: 'ink2' },
  provenance: { role: 'provenance', family: 'sans', weight: 400, size: typeSizes.caption, colour: 'ink3' },
  leadName: { role: 'leadName', family: 'sans', weight: 600, size: typeSizes.section, colour: 'ink' },
  lineTime: { role: 'lineTime', family: 'sans', weight: 400, size: typeSizes.caption, colour: 'ink2' },
  ladderName: { role: 'ladder', family: 'sans', weight: 400, size: typeSizes.caption, colour: 'ink2' },
  ladderLetter: { role: 'ladder', family: 'sans', weight: 500, size: typeSizes.caption, colour: 'ink' },
  ladderWindow: { role: 'ladder', family: 'sans', weight: 400, size: typeSizes.caption, colour: 'ink2' },
  markerName: { role: 'marker', family: 'sans', weight: 400, size: typeSizes.caption, colour: 'ink2' },
  caution: { role: 'caution', family: 'sans', weight: 500, size: typeSizes.caption, colour: 'ink' },
  education: { role: 'caution', family: 'sans', weight: 400, size: typeSizes.caption, colour: 'ink2' },
  note: { role: 'note', family: 'sans', weight: 400, size: typeSizes.caption, colour: 'ink2' },
  stimulusName: {
    role: 'annotation',
    family: 'sans',
    weight: 500,
    size: typeSizes.caption,
    colour: 'copperDark',
  },
  interval: { role: 'annotation', family: 'sans', weight: 500, size: typeSizes.caption, colour: 'ink' },
  teachingPoint: { role: 'reading', family: 'sans', weight: 500, size: typeSizes.dense, colour: 'ink' },
  reading: { role: 'reading', family: 'sans', weight: 400, size: typeSizes.dense, colour: 'ink' },
  answerLine: { role: 'answerLine', family: 'sans', weight: 400, size: typeSizes.dense, colour: 'ink2' },
  sheetKind: { role: 'sheetKind', family: 'sans', weight: 500, size: typeSizes.caption, colour: 'ink2' },
} as const satisfies Record<string, TextStyle>;
