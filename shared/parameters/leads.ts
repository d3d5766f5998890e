import { choiceField, nullableNumberField, numberField, section } from './fields';

interface LeadDefaults {
  amplitudeV: number;
  pulseWidthMs: number;
  captureThresholdV: number;
  sensitivityMv: number;
  signalMv: number;
}

/** The electrical fields that every pacing lead has. Defaults: timing-cycles rules; usual ranges: common practice, no source. */
function leadFields(
  defaults: LeadDefaults,
  usual: { signalMv: readonly [number, number]; sensitivityMv: readonly [number, number] },
) {
  return {
    polarity: choiceField({ bipolar: 'Bipolar', unipolar: 'Unipolar' }, 'bipolar', {
      label: 'Polarity',
      help: 'A unipolar stimulus returns through the body and leaves a much larger spike.',
    }),
    amplitudeV: numberField(defaults.amplitudeV, {
      label: 'Output',
      unit: 'V',
      min: 0,
      max: 10,
      usual: [2, 3.5],
      help: 'Stimulus amplitude; usually at least twice the capture threshold.',
    }),
    pulseWidthMs: numberField(defaults.pulseWidthMs, {
      label: 'Pulse width',
      unit: 'ms',
      min: 0.05,
      max: 2,
      usual: [0.3, 0.5],
      help: 'A narrower pulse needs more volts to capture (strength–duration curve).',
    }),
    captureThresholdV: numberField(defaults.captureThresholdV, {
      label: 'Capture threshold',
      unit: 'V',
      min: 0.1,
      max: 10,
      usual: [0.4, 1.5],
      help: 'Least output that captures rested muscle at 0.4 ms.',
    }),
    sensitivityMv: numberField(defaults.sensitivityMv, {
      label: 'Sensitivity',
      unit: 'mV',
      min: 0.1,
      max: 20,
      usual: usual.sensitivityMv,
      help: 'Signals of at least this size are sensed; a smaller number senses more.',
    }),
    signalMv: numberField(defaults.signalMv, {
      label: 'Intracardiac signal',
      unit: 'mV',
      min: 0,
      max: 30,
      usual: usual.signalMv,
      help: 'Size of the electrogram at this lead.',
    }),
    surfaceSpikeMv: nullableNumberField({
      label: 'Surface spike',
      emptyWords: 'from output and polarity',
      unit: 'mV',
      min: 0,
      max: 50,
      help: 'Size of the spike on the body surface; empty: from output and polarity.',
    }),
  };
}

export const atrialLeadSchema = section({
  site: choiceField({ appendage: 'Appendage', septum: 'Septum', lateral: 'Lateral wall' }, 'appendage', {
    label: 'Site',
    help: 'Where in the right atrium the lead sits; decides the shape of the paced P wave.',
  }),
  ...leadFields(
    { amplitudeV: 2.5, pulseWidthMs: 0.4, captureThresholdV: 0.75, sensitivityMv: 0.5, signalMv: 3 },
    { signalMv: [1.5, 5], sensitivityMv: [0.3, 1] },
  ),
});

export const rightVentricularLeadSchema = section({
  site: choiceField(
    {
      apex: 'Apex',
      septum: 'Septum',
      outflow: 'Outflow tract',
      his: 'His bundle',
      leftBundle: 'Left bundle area',
    },
    'apex',
    { label: 'Site', help: 'Where in the right ventricle or conduction system the lead sits.' },
  ),
  ...leadFields(
    { amplitudeV: 2.5, pulseWidthMs: 0.4, captureThresholdV: 0.75, sensitivityMv: 2.5, signalMv: 10 },
    { signalMv: [5, 15], sensitivityMv: [2, 3] },
  ),
});

export const leftVentricularLeadSchema = section({
  site: choiceField(
    { lateral: 'Lateral', posterolateral: 'Posterolateral', anterolateral: 'Anterolateral' },
    'posterolateral',
    { label: 'Site', help: 'Where on the left ventricle the lead sits.' },
  ),
  ...leadFields(
    { amplitudeV: 3, pulseWidthMs: 0.5, captureThresholdV: 1.25, sensitivityMv: 2.5, signalMv: 10 },
    { signalMv: [5, 15], sensitivityMv: [2, 3] },
  ),
});
