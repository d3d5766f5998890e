import type { Reading } from '../../engine/reading/reading';
import type { Drawing } from '../drawing';
import type { GridArea } from '../grid';
import type { PaperStrip } from '../paper-strip';
import type { PlacedSegment } from '../placed-segment';

/** A strip to be printed, with the words that go with it. */
export interface SheetSubject {
  /** Every `StripRecording` is one. Answer sheets need `events` and `reading`. */
  strip: PaperStrip & { reading?: Pick<Reading, 'beats' | 'findings'> };
  /** On plain and answer sheets. */
  title: string;
  /** On question sheets, where the title would tell the answer: `Strip 1`, numbered within the document. */
  questionTitle: string;
  /** On answer sheets; none when empty. */
  teachingPoint: string;
}

/** When a document was made, and for whom. */
export interface SheetMade {
  /** As printed: `1 December 2026`; empty prints none. */
  madeOn: string;
  /** Printed under the title; empty prints none. */
  organisation: string;
}

export type SheetKind = 'plain' | 'question' | 'answer';

/** The gridded paper of one line of a strip, with the places that previews and tests need. */
export interface PlacedSystem {
  /** Index of the strip among the document's subjects. */
  subject: number;
  grid: GridArea;
  segments: PlacedSegment[];
}

/** One side of paper, exactly as large as the paper. */
export interface SheetPage extends Drawing {
  kind: SheetKind;
  /** For lists of pages: `Strip 1: answer`, `Strips 1 to 3: question`. Never tells the answer. */
  label: string;
  systems: PlacedSystem[];
}

export interface SheetDocument {
  /** For file metadata; tells no answer when there is a question sheet among the pages. */
  title: string;
  pages: SheetPage[];
  /** What was shortened, wrapped, cut or drawn across, in sentences; each names its strip. Empty when nothing was. */
  notes: string[];
}
