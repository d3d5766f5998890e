import { z } from 'zod';
import { choiceField, numberField, section } from './fields';

/** Pairs of electrodes that can be exchanged (LD-40 to LD-46). */
const reversals = {
  none: 'None',
  'RA-LA': 'RA and LA',
  'RA-LL': 'RA and LL',
  'LA-LL': 'LA and LL',
  'RA-RL': 'RA and RL',
  'LA-RL': 'LA and RL',
  'V1-V2': 'V1 and V2',
  'V1-V3': 'V1 and V3',
  'V2-V3': 'V2 and V3',
  'V3-V4': 'V3 and V4',
  'V4-V5': 'V4 and V5',
  'V5-V6': 'V5 and V6',
} as const;
export type ElectrodeReversal = keyof typeof reversals;

/** What enters at the electrodes beside the heart. */
export const disturbanceSchema = section({
  baselineWanderMv: numberField(0, {
    label: 'Baseline wander',
    unit: 'mV',
    min: 0,
    max: 2,
    usual: [0, 0.3],
    help: 'Slow drift with breathing, peak to peak at an electrode.',
  }),
  mainsMv: numberField(0, {
    label: 'Mains hum',
    unit: 'mV',
    min: 0,
    max: 1,
    usual: [0, 0.1],
    help: 'Amplitude of mains interference at an electrode.',
  }),
  mainsHz: z
    .literal([50, 60])
    .meta({
      field: {
        kind: 'choice',
        label: 'Mains frequency',
        options: { 50: '50 Hz', 60: '60 Hz' },
        help: 'Frequency of the local supply.',
      },
    })
    .default(50),
  muscleMv: numberField(0, {
    label: 'Muscle noise',
    unit: 'mV',
    min: 0,
    max: 1,
    usual: [0, 0.05],
    help: 'Root-mean-square size of muscle activity at an electrode.',
  }),
  motionPerMinute: numberField(0, {
    label: 'Electrode movements',
    unit: '/min',
    min: 0,
    max: 30,
    usual: [0, 4],
    help: 'Sudden swings of the baseline at one electrode, at random times.',
  }),
  electrodeReversal: choiceField(reversals, 'none', {
    label: 'Electrodes exchanged',
    help: 'Two electrodes on each other’s place.',
  }),
});
