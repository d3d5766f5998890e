import type { ImportAnalysis, ImportChoice, LookedAtPreset } from '../../../../shared/api/preset-files';
import { FieldFrame } from '../../../components/field-frame';
import { Notice } from '../../../components/notice';
import { Segments } from '../../../components/segments';
import { SelectField } from '../../../components/select-field';
import { analysisWords, presetWords, type ImportChoices } from './import-plan';

const choiceOptions = [
  { value: 'skip', label: 'Skip' },
  { value: 'keepBoth', label: 'Keep both' },
  { value: 'replace', label: 'Replace' },
] as const satisfies { value: ImportChoice; label: string }[];

const choiceHelp: Readonly<Record<ImportChoice, string>> = {
  skip: 'What is here stays as it is.',
  keepBoth: 'The file’s presets come in beside it, as strips of your own.',
  replace: 'What is here takes the file’s content; whose it is and who sees it stays.',
};

interface PresetRowProps {
  preset: LookedAtPreset;
  choices: ImportChoices;
  onChoose(choice: ImportChoice): void;
}

function PresetRow({ preset, choices, onChoose }: PresetRowProps) {
  return (
    <li className="flex items-center justify-between gap-3 border-b border-rule py-2 last:border-b-0">
      <span className="min-w-0">
        <span className="block font-medium break-words">{preset.title}</span>
        <span className="block text-caption text-ink-3">
          {presetWords(preset)}
          {preset.groupUnknown && '. Its group is not in this course: kept outside it'}
        </span>
      </span>
      {preset.match && (
        <SelectField
          small
          label={`What to do with ${preset.title}`}
          value={choices.single[preset.number] ?? choices.all}
          options={choiceOptions}
          onChange={onChoose}
        />
      )}
    </li>
  );
}

interface ImportAnalysisViewProps {
  analysis: ImportAnalysis;
  choices: ImportChoices;
  onChange(choices: ImportChoices): void;
}

/** What a file holds, and the choice for what is here already: for all, or preset by preset. */
export function ImportAnalysisView({ analysis, choices, onChange }: ImportAnalysisViewProps) {
  const known = analysis.presets.some(({ match }) => match !== null);
  return (
    <div className="mt-3 flex flex-col gap-4">
      <p className="text-body text-ink-2">{analysisWords(analysis)}</p>
      {analysis.upgrades.length > 0 && (
        <Notice kind="teal" title="An older file, brought up to date.">
          {analysis.upgrades.join(' ')}
        </Notice>
      )}
      {known && (
        <FieldFrame label="What is here already" help={choiceHelp[choices.all]}>
          <Segments
            label="What is here already"
            value={choices.all}
            options={choiceOptions}
            onChange={(all) => onChange({ all, single: {} })}
          />
        </FieldFrame>
      )}
      <ul
        aria-label="Presets of the file"
        tabIndex={0}
        className="max-h-56 overflow-auto border-y border-rule-strong pr-1 text-body"
      >
        {analysis.presets.map((preset) => (
          <PresetRow
            key={preset.number}
            preset={preset}
            choices={choices}
            onChoose={(choice) =>
              onChange({ ...choices, single: { ...choices.single, [preset.number]: choice } })
            }
          />
        ))}
      </ul>
    </div>
  );
}
