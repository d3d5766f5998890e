import { bandLimits, bandwidthNames, type Bandwidth } from '../../../../shared/parameters/recorder';
import { FieldFrame } from '../../../components/field-frame';
import { NumberField } from '../../../components/number-field';
import { Segments } from '../../../components/segments';
import { SelectField } from '../../../components/select-field';
import { parseQuantity } from '../../../lib/parse-quantity';
import type { ParametersEditor } from '../state/use-parameters';
import { FieldGrid, FieldSection } from './field-section';
import { ParameterField } from './parameter-field';
import { sheetSection } from './sections';

interface GroupProps {
  editor: ParametersEditor;
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

/** The recorder's band and samples, and how the strip lies on a sheet. */
export function RecorderFields({ editor }: GroupProps) {
  const { recorder } = editor.parameters;
  const errorAt = (path: string) => (editor.refusal?.path === path ? editor.refusal.words : undefined);
  return (
    <>
      <FieldGrid>
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
        <ParameterField editor={editor} path="recorder.stimulusMarker" />
      </FieldGrid>
      <FieldSection editor={editor} section={sheetSection} />
    </>
  );
}
