import { choiceApplies, parameterApplies } from '../../../../shared/parameters/applies';
import { usualRange } from '../../../../shared/parameters/usual-range';
import { NumberField } from '../../../components/number-field';
import { Segments } from '../../../components/segments';
import { SelectField } from '../../../components/select-field';
import { FieldFrame } from '../../../components/field-frame';
import { parseQuantity } from '../../../lib/parse-quantity';
import { parameterMeta, parameterValue, type ParameterPath } from '../state/parameter-paths';
import type { ParametersEditor } from '../state/use-parameters';

interface ParameterFieldProps {
  editor: ParametersEditor;
  path: ParameterPath;
  /** A related limit, drawn across the ruler. */
  marker?: { value: number; label: string };
  /** A tighter limit than the schema's, such as the end of the strip. */
  max?: number;
}

/** As many choices as fit side by side; more become a list. */
const mostSegments = 3;

const flagOptions = [
  { value: 'false', label: 'Off' },
  { value: 'true', label: 'On' },
] as const;

/** What is chosen, and the choices that go with the other parameters. */
function choicesOf(
  { parameters }: ParametersEditor,
  path: ParameterPath,
  options: Record<string, string>,
  value: string,
) {
  return Object.entries(options)
    .filter(([option]) => option === value || choiceApplies(parameters, path, option))
    .map(([option, label]) => ({ value: option, label }));
}

/**
 * A field for one parameter: label, unit, range, usual range and help come from the schema. Nothing where the parameter
 * does not act on this strip.
 */
export function ParameterField({ editor, path, marker, max }: ParameterFieldProps) {
  const meta = parameterMeta(path);
  const value = parameterValue(editor.parameters, path);
  const error = editor.refusal?.path === path ? editor.refusal.words : undefined;
  if (meta.kind === 'text' || !parameterApplies(editor.parameters, path)) return null;
  if (meta.kind === 'number') {
    return (
      <NumberField
        label={meta.label}
        unit={meta.unit}
        value={value as number | null}
        min={meta.min}
        max={max ?? meta.max}
        integer={meta.integer}
        usual={usualRange(editor.parameters, path) ?? meta.usual}
        help={meta.help}
        nullable={meta.nullable}
        emptyWords={meta.emptyWords}
        marker={marker}
        error={error}
        parse={(text) => parseQuantity(text, meta.unit)}
        onChange={(next) => editor.set(path, next, true)}
        onCommit={editor.settle}
      />
    );
  }
  if (meta.kind === 'flag') {
    return (
      <FieldFrame label={meta.label} help={meta.help} error={error}>
        <Segments
          label={meta.label}
          value={String(value)}
          options={flagOptions}
          onChange={(next) => editor.set(path, next === 'true')}
        />
      </FieldFrame>
    );
  }
  const options = choicesOf(editor, path, meta.options, String(value));
  const set = (next: string): void => editor.set(path, typeof value === 'number' ? Number(next) : next);
  const long = options.reduce((length, option) => length + option.label.length, 0) > 34;
  return (
    <FieldFrame label={meta.label} help={meta.help} error={error}>
      {options.length > mostSegments || long ? (
        <SelectField label={meta.label} value={String(value)} options={options} onChange={set} />
      ) : (
        <Segments label={meta.label} value={String(value)} options={options} onChange={set} />
      )}
    </FieldFrame>
  );
}
