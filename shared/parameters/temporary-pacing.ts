import { numberField, section } from './fields';

/** A temporary transvenous lead in the right ventricle (ranges: PP-48, PP-49). */
export const transvenousSchema = section({
  outputMa: numberField(5, {
    label: 'Output',
    unit: 'mA',
    min: 0,
    max: 25,
    usual: [2, 10],
    help: 'Turn it down until capture is lost, up until it is regained: that is the threshold.',
  }),
  captureThresholdMa: numberField(1, {
    label: 'Capture threshold',
    unit: 'mA',
    min: 0.1,
    max: 25,
    usual: [0.3, 2],
    help: 'Least output that captures.',
  }),
  sensitivityMv: numberField(2, {
    label: 'Sensitivity',
    unit: 'mV',
    min: 0.1,
    max: 20,
    usual: [1, 5],
    help: 'Signals of at least this size are sensed; a smaller number senses more.',
  }),
});

/** Pads on the chest (PP-40 to PP-46). */
export const transcutaneousSchema = section({
  currentMa: numberField(80, {
    label: 'Current',
    unit: 'mA',
    min: 0,
    max: 200,
    usual: [50, 120],
    help: 'Raised until electrical and mechanical capture; confirm with a pulse.',
  }),
  captureThresholdMa: numberField(60, {
    label: 'Capture threshold',
    unit: 'mA',
    min: 10,
    max: 200,
    usual: [40, 100],
    help: 'Least current that captures with a 20 ms pulse.',
  }),
  pulseWidthMs: numberField(20, {
    label: 'Pulse width',
    unit: 'ms',
    min: 5,
    max: 40,
    usual: [20, 40],
    help: 'A narrower pulse needs more current.',
  }),
  artefactMv: numberField(5, {
    label: 'Artefact',
    unit: 'mV',
    min: 0,
    max: 20,
    usual: [2, 10],
    help: 'Size of the stimulus on the trace; it can hide or imitate a QRS.',
  }),
});
