import { useEffect } from 'react';
import { longestExportS } from '../../../../../shared/api/exports';
import {
  exportFormats,
  exportFormatWords,
  type ExportFormat,
} from '../../../../../shared/formats/export-format';
import { playbackCaution } from '../../../../../shared/formats/wav';
import { Checkbox } from '../../../../components/checkbox';
import { Notice } from '../../../../components/notice';
import { NumberField } from '../../../../components/number-field';
import { parseQuantity } from '../../../../lib/parse-quantity';
import { durationWords } from '../../../../lib/quantity-words';

export interface DownloadChoice {
  formats: readonly ExportFormat[];
  bundle: boolean;
  durationS: number;
}

interface DownloadFormProps {
  choice: DownloadChoice;
  sampleRateHz: number;
  /** Why the length was refused. */
  durationError?: string;
  onChange(choice: DownloadChoice): void;
}

/** Formats with what they hold, the archive, the length. */
export function DownloadForm({ choice, sampleRateHz, durationError, onChange }: DownloadFormProps) {
  // Loaded beforehand, so that a length typed with its unit is read before the button is pressed.
  useEffect(() => void import('../../../../lib/quantity-math'), []);
  const { formats, bundle, durationS } = choice;
  const several = formats.length > 1;
  const toggle = (format: ExportFormat, chosen: boolean): void =>
    onChange({
      ...choice,
      formats: exportFormats.filter((one) => (one === format ? chosen : formats.includes(one))),
    });
  const longestS = longestExportS(sampleRateHz);
  return (
    <div className="mt-4 flex flex-col gap-4">
      <fieldset>
        <legend className="mb-1 text-body font-medium">Formats</legend>
        <div className="max-h-64 overflow-auto border-y border-rule-strong px-1 py-1">
          {exportFormats.map((format) => (
            <Checkbox
              key={format}
              label={exportFormatWords[format].label}
              help={exportFormatWords[format].holds}
              checked={formats.includes(format)}
              onChange={(chosen) => toggle(format, chosen)}
            />
          ))}
        </div>
      </fieldset>
      {formats.includes('wav') && (
        <Notice kind="amber" title="WAV can drive hardware.">
          {playbackCaution}
        </Notice>
      )}
      <div className="px-1">
        <Checkbox
          label="One ZIP archive"
          help={
            several
              ? 'Several formats always come as one archive, with a manifest and checksums.'
              : 'With a manifest and checksums. A format of several files comes as one in any case.'
          }
          checked={several || bundle}
          disabled={several}
          onChange={(next) => onChange({ ...choice, bundle: next })}
        />
      </div>
      <NumberField
        label="Length"
        unit="s"
        value={durationS}
        min={1}
        max={longestS}
        help={`At ${sampleRateHz} samples/s at most ${durationWords(longestS)}. The strip itself keeps its length.`}
        error={durationError}
        parse={(text) => parseQuantity(text, 's')}
        onChange={(next) => next !== null && onChange({ ...choice, durationS: next })}
        onCommit={() => undefined}
      />
    </div>
  );
}
