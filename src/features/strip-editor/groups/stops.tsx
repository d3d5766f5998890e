import { bandwidthLabel } from '../../../../shared/paper/bandwidth-label';
import { pacesBothVentricles } from '../../../../shared/parameters/pacing-mode';
import type {
  PacingParameters,
  PatientParameters,
  StripParameters,
} from '../../../../shared/parameters/strip-parameters';
import type { ParametersEditor } from '../state/use-parameters';
import { FieldSections } from './field-section';
import { LeadFields } from './lead-fields';
import { PacingFields } from './pacing-fields';
import { RecorderFields } from './recorder-fields';
import { disturbanceSections, patientSections, waveformSections } from './sections';

interface GroupProps {
  editor: ParametersEditor;
}

export interface Stop {
  id: string;
  title: string;
  /** Two lines of current values. */
  lines(parameters: StripParameters): [string, string];
  Fields: (props: GroupProps) => React.JSX.Element;
}

const atriaWords = ({ atrialRhythm, atrialRateBpm }: PatientParameters): string =>
  ({
    sinus: `Sinus ${atrialRateBpm} /min`,
    arrest: 'Atrial arrest',
    tachycardia: `Tachycardia ${atrialRateBpm} /min`,
    flutter: `Flutter ${atrialRateBpm} /min`,
    fibrillation: 'Fibrillation',
  })[atrialRhythm];

const conductionWords = ({ avConduction, prIntervalMs }: PatientParameters): string =>
  ({
    intact: `PR ${prIntervalMs} ms`,
    wenckebach: 'Wenckebach',
    mobitzTwo: 'Mobitz II',
    twoToOne: '2:1',
    complete: 'Complete block',
  })[avConduction];

function focusWords(patient: PatientParameters): string {
  const premature = patient.prematureVentricularPerMinute + patient.prematureAtrialPerMinute;
  if (premature > 0) return 'premature beats';
  return patient.escapeSite === 'none' ? 'no escape' : `${patient.escapeSite} ${patient.escapeRateBpm} /min`;
}

const sourceWords: Record<PacingParameters['source'], string> = {
  none: 'No pacemaker',
  implanted: 'Implanted',
  transvenous: 'Transvenous',
  transcutaneous: 'Transcutaneous',
};

function pacingLines({ pacing }: StripParameters): [string, string] {
  if (pacing.source === 'none') return ['No pacemaker', ''];
  const { mode, lowerRateBpm, upperTrackingRateBpm } = pacing;
  if (pacing.source !== 'implanted')
    return [`${sourceWords[pacing.source]}, ${mode}`, `${lowerRateBpm} /min`];
  if (pacing.magnetApplied) return [`${mode} under a magnet`, `${pacing.magnetRateBpm} /min`];
  const tracks = mode.startsWith('DDD') || mode.startsWith('VDD');
  const rates = tracks ? `${lowerRateBpm}–${upperTrackingRateBpm} /min` : `${lowerRateBpm} /min`;
  const delays = tracks ? `AV ${pacing.pacedAvDelayMs} / ${pacing.sensedAvDelayMs} ms` : '';
  return [`${mode}, ${rates}`, delays];
}

function leadLines({ pacing }: StripParameters): [string, string] {
  const faults = pacing.faults.length === 0 ? '' : `${pacing.faults.length} set under faults`;
  switch (pacing.source) {
    case 'none':
      return ['No lead', ''];
    case 'transvenous':
      return [`${pacing.transvenous.outputMa} mA, ${pacing.transvenous.sensitivityMv} mV`, faults];
    case 'transcutaneous':
      return [`${pacing.transcutaneous.currentMa} mA, ${pacing.transcutaneous.pulseWidthMs} ms`, faults];
    case 'implanted': {
      const { rightVentricularLead: right, leftVentricularLead: left, atrialLead: atrium } = pacing;
      if (pacing.mode.startsWith('A'))
        return [`RA ${atrium.amplitudeV} V at ${atrium.pulseWidthMs} ms`, faults];
      const second = pacesBothVentricles(pacing.mode)
        ? `LV ${left.amplitudeV} V`
        : pacing.mode.startsWith('D')
          ? `RA ${atrium.amplitudeV} V`
          : '';
      return [`RV ${right.amplitudeV} V at ${right.pulseWidthMs} ms`, faults || second];
    }
  }
}

/** The six groups in the order in which the impulse travels. */
export const stops: readonly Stop[] = [
  {
    id: 'patient',
    title: 'Patient',
    lines: ({ patient }) => [atriaWords(patient), `${conductionWords(patient)}, ${focusWords(patient)}`],
    Fields: ({ editor }) => <FieldSections editor={editor} sections={patientSections} />,
  },
  { id: 'pacing', title: 'Pacing', lines: pacingLines, Fields: PacingFields },
  { id: 'leads', title: 'Leads and capture', lines: leadLines, Fields: LeadFields },
  {
    id: 'waveform',
    title: 'Waveform',
    lines: ({ waveform }) => [
      waveform.qrsDurationMs === null ? 'QRS from heart model' : `QRS ${waveform.qrsDurationMs} ms`,
      `QTc ${waveform.qtcMs} ms`,
    ],
    Fields: ({ editor }) => <FieldSections editor={editor} sections={waveformSections} />,
  },
  {
    id: 'disturbance',
    title: 'Disturbance',
    lines: ({ disturbance }) => [
      `Wander ${disturbance.baselineWanderMv} mV`,
      disturbance.electrodeReversal === 'none'
        ? `Muscle ${disturbance.muscleMv}, mains ${disturbance.mainsMv} mV`
        : `${disturbance.electrodeReversal.replace('-', ' and ')} exchanged`,
    ],
    Fields: ({ editor }) => <FieldSections editor={editor} sections={disturbanceSections} />,
  },
  {
    id: 'recorder',
    title: 'Recorder',
    lines: ({ recorder }) => [
      bandwidthLabel(recorder),
      `${recorder.sampleRateHz} samples/s, ${recorder.resolutionUv} µV`,
    ],
    Fields: RecorderFields,
  },
];
