import type { bandwidthNames } from '../../../../shared/parameters/recorder';
import { bandLimits, type Bandwidth } from '../../../../shared/parameters/recorder';
import { readStripParameters } from '../../../../shared/parameters/parse';
import type { RecorderParameters } from '../../../../shared/parameters/strip-parameters';
import {
  usualZeroPhaseHz,
  zeroPhaseLimitsHz,
  type BenchSetting,
} from '../../../../shared/recorder-bench/bench-setting';
import { problemLine } from '../../../../shared/errors';
import { useState } from 'react';
import { Button } from '../../../components/button';
import { FieldError } from '../../../components/field-frame';
import { NumberField } from '../../../components/number-field';
import { SelectField } from '../../../components/select-field';
import { parseQuantity } from '../../../lib/parse-quantity';
import { seriesLooks } from '../state/series';

type Choice = (typeof bandwidthNames)[number] | 'custom' | 'zeroPhase' | 'pointSampled';

const choices: readonly { value: Choice; label: string }[] = [
  { value: 'monitor', label: 'Monitor, 0.5–40 Hz' },
  { value: 'slowWave', label: 'Slow-wave, 0.05–40 Hz' },
  { value: 'diagnostic', label: 'Diagnostic, 0.05–150 Hz' },
  { value: 'unfiltered', label: 'Unfiltered' },
  { value: 'custom', label: 'Own limits' },
  { value: 'zeroPhase', label: 'Zero-phase low-cut (offline only)' },
  { value: 'pointSampled', label: 'Sampled without a band-limit' },
];
const notches = ['0', '50', '60'].map((value) => ({
  value,
  label: value === '0' ? 'No notch' : `${value} Hz notch`,
}));
const rates = ['250', '500', '1000', '2000'].map((value) => ({ value, label: `${value} /s` }));
const steps = ['1', '2.5', '5', '10'].map((value) => ({ value, label: `${value} µV steps` }));

function choiceOf(setting: BenchSetting): Choice {
  if (setting.kind !== 'recorder') return setting.kind;
  const { bandwidth } = setting.recorder;
  return typeof bandwidth === 'string' ? bandwidth : 'custom';
}

const usualLimits = { lowHz: 0.67, highHz: 100 } as const;

function bandwidthFor(choice: Choice, current: Bandwidth): Bandwidth {
  if (choice === 'zeroPhase' || choice === 'pointSampled') return 'diagnostic';
  return choice === 'custom' ? { ...(bandLimits(current) ?? usualLimits) } : choice;
}

interface SettingCardProps {
  setting: BenchSetting;
  index: number;
  onChange(setting: BenchSetting): void;
  /** null: there must be two. */
  onRemove: (() => void) | null;
}

/** One setting: its kind, limits where they are its own, notch, rate and step. */
function SettingCard({ setting, index, onChange, onRemove }: SettingCardProps) {
  const [refusal, setRefusal] = useState<string | null>(null);
  const { recorder } = setting;
  const apply = (next: BenchSetting): void => {
    const read = readStripParameters({ recorder: next.recorder });
    setRefusal(read.ok ? null : read.problems.map(problemLine).join(' '));
    if (read.ok) onChange({ ...next, recorder: read.parameters.recorder });
  };
  const set = (change: Partial<RecorderParameters>): void =>
    apply({ ...setting, recorder: { ...recorder, ...change } });
  const choose = (choice: Choice): void => {
    const next = { ...recorder, bandwidth: bandwidthFor(choice, recorder.bandwidth) };
    if (choice === 'zeroPhase') apply({ kind: 'zeroPhase', lowHz: usualZeroPhaseHz, recorder: next });
    else apply({ kind: choice === 'pointSampled' ? 'pointSampled' : 'recorder', recorder: next });
  };
  const limits = typeof recorder.bandwidth === 'string' ? null : recorder.bandwidth;
  const label = `Setting ${index + 1}`;
  return (
    <div role="group" aria-label={label} className="min-w-0 border-t-2 border-rule-strong pt-2.5">
      <div className="flex items-center gap-2">
        <svg width="28" height="8" aria-hidden="true" className="shrink-0">
          <line
            x1="0"
            x2="28"
            y1="4"
            y2="4"
            stroke={seriesLooks[index].colour}
            strokeWidth="2.5"
            strokeDasharray={seriesLooks[index].dash}
          />
        </svg>
        <SelectField small label={label} value={choiceOf(setting)} options={choices} onChange={choose} />
        {onRemove && (
          <Button
            kind="quiet"
            small
            className="ml-auto"
            onClick={onRemove}
            aria-label={`Remove setting ${index + 1}`}
          >
            Remove
          </Button>
        )}
      </div>
      <div className="mt-2 flex flex-wrap gap-1.5">
        <SelectField
          small
          label={`${label}: mains notch`}
          value={String(recorder.mainsNotchHz)}
          options={notches}
          onChange={(value) => set({ mainsNotchHz: Number(value) as 0 | 50 | 60 })}
        />
        <SelectField
          small
          label={`${label}: samples a second`}
          value={String(recorder.sampleRateHz)}
          options={rates}
          onChange={(value) => set({ sampleRateHz: Number(value) as RecorderParameters['sampleRateHz'] })}
        />
        <SelectField
          small
          label={`${label}: resolution`}
          value={String(recorder.resolutionUv)}
          options={
            steps.some(({ value }) => value === String(recorder.resolutionUv))
              ? steps
              : [
                  ...steps,
                  { value: String(recorder.resolutionUv), label: `${recorder.resolutionUv} µV steps` },
                ]
          }
          onChange={(value) => set({ resolutionUv: Number(value) })}
        />
      </div>
      {limits && (
        <div className="mt-3 grid gap-3">
          {(['lowHz', 'highHz'] as const).map((which) => (
            <NumberField
              key={which}
              label={which === 'lowHz' ? 'Low limit' : 'High limit'}
              unit="Hz"
              value={limits[which]}
              min={which === 'lowHz' ? 0.01 : 10}
              max={which === 'lowHz' ? 10 : 500}
              usual={which === 'lowHz' ? [0.05, 0.67] : [40, 150]}
              parse={(text) => parseQuantity(text, 'Hz')}
              onChange={(value) => value !== null && set({ bandwidth: { ...limits, [which]: value } })}
              onCommit={() => undefined}
            />
          ))}
        </div>
      )}
      {setting.kind === 'zeroPhase' && (
        <div className="mt-3">
          <NumberField
            label="Low limit, both ways"
            unit="Hz"
            value={setting.lowHz}
            {...zeroPhaseLimitsHz}
            usual={[0.05, usualZeroPhaseHz]}
            help="Runs over the finished recording: no monitor at the bedside can do this."
            parse={(text) => parseQuantity(text, 'Hz')}
            onChange={(value) => value !== null && apply({ ...setting, lowHz: value })}
            onCommit={() => undefined}
          />
        </div>
      )}
      {refusal && <FieldError>{refusal}</FieldError>}
    </div>
  );
}

interface SettingsRowProps {
  settings: readonly BenchSetting[];
  fewest: number;
  onChange(settings: BenchSetting[]): void;
}

/** Two to four settings side by side, in the order of the traces. */
export function SettingsRow({ settings, fewest, onChange }: SettingsRowProps) {
  return (
    <div className="grid gap-x-6 gap-y-4 tablet:grid-cols-2 wide:grid-cols-4">
      {settings.map((setting, index) => (
        <SettingCard
          key={index}
          setting={setting}
          index={index}
          onChange={(next) => onChange(settings.map((one, i) => (i === index ? next : one)))}
          onRemove={settings.length > fewest ? () => onChange(settings.filter((_, i) => i !== index)) : null}
        />
      ))}
    </div>
  );
}
