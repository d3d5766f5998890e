import { z } from 'zod';
import { choiceField, flagField, numberField, section, textField } from './fields';
import { sheetSchema } from './sheet';
import type { SheetParameters } from './strip-parameters';

const { layout, leads, speedMmPerS, gainMmPerMv, gridTint } = sheetSchema.unwrap().shape;

/**
 * How strips are printed: the paper, the layout on it, and what question and answer sheets carry. It never changes a
 * sample, and nothing is ever scaled to fit.
 */
export const pageSetupSchema = section({
  paper: choiceField({ a4: 'A4', letter: 'Letter' }, 'a4', {
    label: 'Paper',
    help: 'A4 is 210 × 297 mm (ISO 216), Letter 8.5 × 11 in (ANSI/ASME Y14.1).',
  }),
  orientation: choiceField({ landscape: 'Landscape', portrait: 'Portrait' }, 'landscape', {
    label: 'Orientation',
    help: 'Landscape A4 holds ten seconds at 25 mm/s.',
  }),
  layout,
  leads,
  leadOrder: choiceField({ usual: 'Usual', cabrera: 'Cabrera' }, 'usual', {
    label: 'Limb leads in',
    help: 'Cabrera order goes round the frontal plane: aVL, I, −aVR, II, aVF, III.',
  }),
  speedMmPerS,
  gainMmPerMv,
  /** Gain of V1 to V6; null is that of the limb leads. */
  chestGainMmPerMv: z.literal([5, 10, 20]).nullable().default(null),
  gridTint,
  /** Sheets in this order for every strip or page of strips. */
  sheets: choiceField(
    { plain: 'One sheet', question: 'Question', answer: 'Answer', both: 'Question and answer' },
    'both',
    { label: 'Sheets', help: 'A question sheet hides what the answer sheet tells.' },
  ),
  cohort: textField({ label: 'Cohort', maxLength: 80, help: 'Printed under the title; empty prints none.' }),
  stimulusMarkers: flagField(false, {
    label: 'Stimulus markers',
    help: 'Below the grid, where the recorder found a stimulus; of strips whose stimulus marker is on.',
  }),
  nameLine: flagField(true, {
    label: 'Line for a name',
    help: 'A blank line for the learner’s name and the date.',
  }),
  answerLines: numberField(4, {
    label: 'Lines for answers',
    unit: '',
    min: 0,
    max: 8,
    integer: true,
    help: 'Blank lines under each strip of a question sheet.',
  }),
  stimuliNamed: flagField(true, {
    label: 'Stimuli named',
    help: 'On the answer sheet, names every kind of stimulus where it first appears.',
  }),
  intervals: flagField(true, {
    label: 'Intervals drawn',
    help: 'On the answer sheet, draws AV, VV and escape intervals in ms.',
  }),
  ladder: flagField(true, { label: 'Ladder', help: 'On the answer sheet, draws the ladder diagram.' }),
  reading: flagField(true, {
    label: 'Reading in words',
    help: 'On the answer sheet, writes what is true of the strip.',
  }),
});
export type PageSetup = z.output<typeof pageSetupSchema>;

/** The setup that prints a strip as its own sheet parameters say; everything else as by default. */
export function pageSetupOf(sheet: SheetParameters): PageSetup {
  const { layout, leads, speedMmPerS, gainMmPerMv, gridTint, stimulusMarkers } = sheet;
  return pageSetupSchema.parse({ layout, leads, speedMmPerS, gainMmPerMv, gridTint, stimulusMarkers });
}
