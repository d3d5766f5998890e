import { educationCaution, syntheticCaution } from './cautions';
import { textBlock, type TextBlock } from './text-block';
import { textStyles } from './text-styles';

/** Above the cautions where notes stand over them, mm. */
const belowNotesMm = 1;

/** Notes on the paper, then the two cautions that every sheet carries. */
export function layoutFooter(notes: readonly string[], widthMm: number): TextBlock {
  return textBlock([
    { text: notes.join(' '), style: textStyles.note, widthMm },
    {
      text: syntheticCaution,
      style: textStyles.caution,
      widthMm,
      gapAboveMm: notes.length > 0 ? belowNotesMm : 0,
    },
    { text: educationCaution, style: textStyles.education, widthMm },
  ]);
}
