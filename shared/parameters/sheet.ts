import { z } from 'zod';
import { choiceField, flagField, section } from './fields';

/** The twelve leads in the order in which everything lists them. */
export const leadNames = ['I', 'II', 'III', 'aVR', 'aVL', 'aVF', 'V1', 'V2', 'V3', 'V4', 'V5', 'V6'] as const;
export type LeadName = (typeof leadNames)[number];

/** How the strip lies on paper; it never changes a sample. */
export const sheetSchema = section({
  layout: choiceField(
    {
      single: 'One lead',
      stacked: 'Chosen leads',
      '3x4': '3 × 4',
      '3x4+1': '3 × 4 + 1',
      '3x4+3': '3 × 4 + 3',
      '6x2': '6 × 2',
      '12x1': '12 × 1',
    },
    'stacked',
    { label: 'Layout', help: 'How the leads are laid out on paper.' },
  ),
  leads: z
    .array(z.enum(leadNames))
    .min(1)
    .max(12)
    .refine((leads) => new Set(leads).size === leads.length, {
      params: { allowed: 'each lead at most once' },
      message: 'names a lead twice',
    })
    .default(['II', 'V1']),
  speedMmPerS: z.literal([25, 50]).default(25),
  gainMmPerMv: z.literal([5, 10, 20]).default(10),
  gridTint: choiceField({ rose: 'Rose', sand: 'Sand', sage: 'Sage', slate: 'Slate', grey: 'Grey' }, 'rose', {
    label: 'Grid tint',
    help: 'Colour of the millimetre grid.',
  }),
  ladder: flagField(false, {
    label: 'Ladder on sheets',
    help: 'Draws the ladder diagram under each line of a sheet. It tells the answer.',
  }),
  stimulusMarkers: flagField(false, {
    label: 'Markers on sheets',
    help: 'Draws, below the grid, where the recorder found a stimulus; it can err.',
  }),
});
