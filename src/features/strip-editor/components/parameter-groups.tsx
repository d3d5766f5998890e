import { useState, type ReactNode } from 'react';
import { bandLimits, bandwidthNames, type Bandwidth } from '../../../../shared/parameters/recorder';
import { thresholdV } from '../../../../shared/engine/rhythm/capture';
import { FieldFrame } from '../../../components/field-frame';
import { Segments } from '../../../components/segments';
import { SelectField } from '../../../components/select-field';
import { Tabs } from '../../../components/tabs';
import { NumberField } from '../../../components/number-field';
import { parseQuantity } from '../state/parse-quantity';
import type { ParametersEditor } from '../state/use-parameters';
import { ParameterField } from './parameter-field';
import { StrengthDuration } from './strength-duration';

interface GroupProps {
  editor: ParametersEditor;
}

function Fields({ children }: { children: ReactNode }) {
  return <div className="grid gap-x-9 gap-y-5 tablet:grid-cols-2 wide:grid-cols-3">{children}</div>;
}

export function PatientFields({ editor }: GroupProps) {
  return (
    <Fields>
      <ParameterField editor={editor} path="patient.atrialRhythm" />
      <ParameterField editor={editor} path="patient.atrialRateBpm" />
      <ParameterField editor={editor} path="patient.rateVariabilityPercent" />
      <ParameterField editor={editor} path="patient.avConduction" />
      <ParameterField editor={editor} path="patient.prIntervalMs" />
      <ParameterField editor={editor} path="patient.bundleBranchBlock" />
      <ParameterField editor={editor} path="patient.escapeSite" />
      <ParameterField editor={editor} path="patient.escapeRateBpm" />
      <ParameterField editor={editor} path="patient.respiratoryRateBpm" />
    </Fields>
  );
}

export function PacingFields({ editor }: GroupProps) {
  return (
    <Fields>
      <ParameterField editor={editor} path="pacing.source" />
      <ParameterField editor={editor} path="pacing.mode" />
      <ParameterField editor={editor} path="pacing.ventricularChambers" />
      <ParameterField editor={editor} path="pacing.lowerRateBpm" />
      <ParameterField editor={editor} path="pacing.upperTrackingRateBpm" />
      <ParameterField editor={editor} path="pacing.interventricularDelayMs" />
      <ParameterField editor={editor} path="pacing.pacedAvDelayMs" />
      <ParameterField editor={editor} path="pacing.sensedAvDelayMs" />
      <ParameterField editor={editor} path="pacing.pvarpMs" />
      <ParameterField editor={editor} path="pacing.ventricularRefractoryMs" />
      <ParameterField editor={editor} path="pacing.ventricularBlankingMs" />
      <ParameterField editor={editor} path="pacing.hisCapture" />
    </Fields>
  );
}

const leadTabs = [
  { value: 'rightVentricularLead', label: 'Right ventricle' },
  { value: 'atrialLead', label: 'Right atrium' },
  { value: 'leftVentricularLead', label: 'Left ventricle' },
] as const;
type LeadKey = (typeof leadTabs)[number]['value'];

export function LeadFields({ editor }: GroupProps) {
  const [key, setKey] = useState<LeadKey>('rightVentricularLead');
  const lead = editor.parameters.pacing[key];
  const threshold = thresholdV(lead.captureThresholdV, lead.pulseWidthMs);
  const senses = key !== 'leftVentricularLead';
  return (
    <Tabs accent="copper" label="Leads" value={key} options={leadTabs} onChange={setKey}>
      <div className="grid gap-9 pt-4 wide:grid-cols-[2fr_1fr]">
        <div className="grid content-start gap-x-9 gap-y-5 tablet:grid-cols-2">
          <ParameterField editor={editor} path={`pacing.${key}.site`} />
          <ParameterField editor={editor} path={`pacing.${key}.polarity`} />
          <ParameterField
            editor={editor}
            path={`pacing.${key}.amplitudeV`}
            marker={{ value: threshold, label: 'Dotted: capture threshold at this pulse width.' }}
          />
          <ParameterField editor={editor} path={`pacing.${key}.pulseWidthMs`} />
          <ParameterField editor={editor} path={`pacing.${key}.captureThresholdV`} />
          {senses && (
            <ParameterField
              editor={editor}
              path={`pacing.${key}.sensitivityMv`}
              marker={{ value: lead.signalMv, label: 'Dotted: the signal at this lead.' }}
            />
          )}
          {senses && <ParameterField editor={editor} path={`pacing.${key}.signalMv`} />}
          <ParameterField
            editor={editor}
            path={`pacing.${key}.surfaceSpikeMv`}
            emptyWords="from output and polarity"
          />
        </div>
        <StrengthDuration lead={lead} />
      </div>
    </Tabs>
  );
}

export function WaveformFields({ editor }: GroupProps) {
  return (
    <Fields>
      <ParameterField editor={editor} path="waveform.pAmplitudeMv" />
      <ParameterField editor={editor} path="waveform.pDurationMs" />
      <ParameterField editor={editor} path="waveform.qrsDurationMs" emptyWords="as the heart model gives" />
      <ParameterField editor={editor} path="waveform.qrsScale" />
      <ParameterField editor={editor} path="waveform.axisRotationDeg" />
      <ParameterField editor={editor} path="waveform.tScale" />
      <ParameterField editor={editor} path="waveform.qtcMs" />
    </Fields>
  );
}

export function DisturbanceFields({ editor }: GroupProps) {
  return (
    <Fields>
      <ParameterField editor={editor} path="disturbance.baselineWanderMv" />
      <ParameterField editor={editor} path="disturbance.mainsMv" />
      <ParameterField editor={editor} path="disturbance.mainsHz" />
      <ParameterField editor={editor} path="disturbance.muscleMv" />
      <ParameterField editor={editor} path="disturbance.motionPerMinute" />
      <ParameterField editor={editor} path="seed" />
    </Fields>
  );
}

const bandwidthWords: Record<(typeof bandwidthNames)[number], string> = {
  monitor: 'Monitor, 0.5–40 Hz',
  diagnostic: 'Diagnostic, 0.05–150 Hz',
  slowWave: 'Slow-wave, 0.05–40 Hz',
  unfiltered: 'Unfiltered',
};
const bandwidthOptions = [
  ...bandwidthNames.map((name) => ({ value: name as string, label: bandwidthWords[name] })),
  { value: 'custom', label: 'Own limits' },
];

function LimitField({ editor, which }: GroupProps & { which: 'lowHz' | 'highHz' }) {
  const { bandwidth } = editor.parameters.recorder;
  if (typeof bandwidth === 'string') return null;
  const path = `recorder.bandwidth.${which}`;
  const low = which === 'lowHz';
  return (
    <NumberField
      label={low ? 'Low limit' : 'High limit'}
      unit="Hz"
      value={bandwidth[which]}
      min={low ? 0.01 : 10}
      max={low ? 10 : 500}
      usual={low ? [0.05, 0.67] : [40, 150]}
      help={low ? 'First-order high-pass, −3 dB here.' : 'Fourth-order low-pass, −3 dB here.'}
      error={editor.refusal?.path === path ? editor.refusal.words : undefined}
      parse={(text) => parseQuantity(text, 'Hz')}
      onChange={(value) => editor.set(path, value, true)}
      onCommit={editor.settle}
    />
  );
}

function BandwidthField({ editor }: GroupProps) {
  const { bandwidth } = editor.parameters.recorder;
  const set = (next: string): void => {
    const limits = bandLimits(bandwidth) ?? { lowHz: 0.05, highHz: 150 };
    editor.set('recorder.bandwidth', next === 'custom' ? { ...limits } : (next as Bandwidth));
  };
  return (
    <FieldFrame
      label="Bandwidth"
      help="What the recorder lets through; decides whether a spike is seen."
      error={editor.refusal?.path === 'recorder.bandwidth' ? editor.refusal.words : undefined}
    >
      <SelectField
        label="Bandwidth"
        value={(typeof bandwidth === 'string' ? bandwidth : 'custom') as string}
        options={bandwidthOptions}
        onChange={set}
      />
    </FieldFrame>
  );
}

const rateOptions = [250, 500, 1000, 2000].map((rate) => ({ value: String(rate), label: String(rate) }));
const notchOptions = [
  { value: '0', label: 'Off' },
  { value: '50', label: '50 Hz' },
  { value: '60', label: '60 Hz' },
];

export function RecorderFields({ editor }: GroupProps) {
  const { recorder } = editor.parameters;
  const errorAt = (path: string) => (editor.refusal?.path === path ? editor.refusal.words : undefined);
  return (
    <Fields>
      <BandwidthField editor={editor} />
      <LimitField editor={editor} which="lowHz" />
      <LimitField editor={editor} which="highHz" />
      <FieldFrame label="Mains notch" help="Cuts a narrow band at the mains frequency; rings after a QRS.">
        <Segments
          label="Mains notch"
          value={String(recorder.mainsNotchHz)}
          options={notchOptions}
          onChange={(value) => editor.set('recorder.mainsNotchHz', Number(value))}
        />
      </FieldFrame>
      <FieldFrame
        label="Samples per second"
        help="A high limit needs a rate of at least 2.5 times as much."
        error={errorAt('recorder.sampleRateHz')}
      >
        <Segments
          label="Samples per second"
          value={String(recorder.sampleRateHz)}
          options={rateOptions}
          onChange={(value) => editor.set('recorder.sampleRateHz', Number(value))}
        />
      </FieldFrame>
      <ParameterField editor={editor} path="recorder.resolutionUv" />
    </Fields>
  );
}
