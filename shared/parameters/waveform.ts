import { nullableNumberField, numberField, section } from './fields';

/** Shape of P, QRS and T beyond what the heart model gives by itself. */
export const waveformSchema = section({
  pAmplitudeMv: numberField(0.12, {
    label: 'P amplitude',
    unit: 'mV',
    min: 0,
    max: 0.5,
    usual: [0.05, 0.25],
    help: 'Height of a sinus P wave in lead II; other P waves scale with it.',
  }),
  pDurationMs: numberField(118, {
    label: 'P duration',
    unit: 'ms',
    min: 60,
    max: 180,
    usual: [80, 120],
    help: 'Length of a sinus P wave; other P waves scale with it.',
  }),
  qrsDurationMs: nullableNumberField({
    label: 'QRS duration',
    emptyWords: 'as the heart model gives',
    unit: 'ms',
    min: 70,
    max: 240,
    usual: [80, 180],
    help: 'Empty: as the heart model gives. Otherwise conduction is slowed or quickened until it fits.',
  }),
  qrsScale: numberField(1, {
    label: 'QRS scale',
    unit: '×',
    min: 0.2,
    max: 3,
    usual: [0.7, 1.4],
    help: 'Multiplies the whole ventricular complex.',
  }),
  axisRotationDeg: numberField(0, {
    label: 'Axis rotation',
    unit: '°',
    min: -180,
    max: 180,
    usual: [-30, 30],
    help: 'Turns the ventricular vector in the frontal plane; positive is clockwise, to the right.',
  }),
  tScale: numberField(1, {
    label: 'T scale',
    unit: '×',
    min: 0,
    max: 3,
    usual: [0.7, 1.4],
    help: 'Multiplies repolarization, leaving depolarization alone.',
  }),
  qtcMs: numberField(420, {
    label: 'QTc',
    unit: 'ms',
    min: 300,
    max: 600,
    usual: [380, 450],
    help: 'Corrected QT of a conducted beat; a paced QT lengthens by itself.',
  }),
});
