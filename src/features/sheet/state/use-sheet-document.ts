import { useDeferredValue, useMemo, useState } from 'react';
import { sheetLengthProblem, longestSheetsS } from '../../../../shared/api/sheets';
import type { Strip } from '../../../../shared/api/strips';
import { printedDay } from '../../../../shared/paper/dates';
import { longestDrawnS } from '../../../../shared/paper/layout';
import type { SheetDocument, SheetSubject } from '../../../../shared/paper/pages/sheet-document';
import { layoutSheetPages } from '../../../../shared/paper/pages/sheet-pages';
import type { PageSetup } from '../../../../shared/parameters/page-setup';
import { useRecordings } from './use-recordings';

export interface SheetPreview {
  /** null until the first strip is rendered. */
  document: SheetDocument | null;
  /** Strips still being rendered. */
  waiting: number;
  /** Why the document cannot be made, in a sentence. */
  problem: string | null;
}

const noStrips: readonly Strip[] = [];

function tooLongWords(strips: readonly Strip[]): string | null {
  const problem = sheetLengthProblem(strips.map(({ parameters }) => parameters.durationS));
  if (!problem) return null;
  const { tooLong, durationS } = problem;
  return tooLong === 'together'
    ? `The strips last ${durationS} s together; one document holds at most ${longestSheetsS} s.`
    : `“${strips[tooLong].title}” lasts ${durationS} s; sheets draw strips of at most ${longestDrawnS} s.`;
}

/** The pages of the strips as they would be printed today; those that are rendered already, in their order. */
export function useSheetDocument(
  strips: readonly Strip[],
  wantedSetup: PageSetup,
  organisation: string,
): SheetPreview {
  const [madeOn] = useState(() => printedDay(new Date()));
  const tooLong = tooLongWords(strips);
  const rendered = useRecordings(tooLong === null ? strips : noStrips);
  // The options answer at once, however long the pages take.
  const setup = useDeferredValue(wantedSetup);
  const document = useMemo(() => {
    const subjects = rendered.flatMap((one, i): SheetSubject[] => {
      if (!one || 'failed' in one) return [];
      const { title, teachingPoint } = strips[i];
      return [{ strip: one.recording, title, questionTitle: `Strip ${i + 1}`, teachingPoint }];
    });
    return subjects.length === 0 ? null : layoutSheetPages(subjects, setup, { madeOn, organisation });
  }, [rendered, strips, setup, madeOn, organisation]);
  const failed = rendered.find((one) => one && 'failed' in one);
  return {
    document,
    waiting: rendered.filter((one) => one === undefined).length,
    problem:
      tooLong ?? (failed && 'failed' in failed ? `A strip could not be rendered. ${failed.failed}` : null),
  };
}
