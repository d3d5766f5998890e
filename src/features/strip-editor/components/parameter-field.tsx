import { NumberField } from '../../../components/number-field';
import { Segments } from '../../../components/segments';
import { SelectField } from '../../../components/select-field';
import { FieldFrame } from '../../../components/field-frame';
import { parseQuantity } from '../state/parse-quantity';
import { parameterMeta, parameterValue, type ParameterPath } from '../state/parameter-paths';
import type { ParametersEditor } from '../state/use-parameters';

interface ParameterFieldProps {
  editor: ParametersEditor;
  path: ParameterPath;
  /** A related limit, drawn across the ruler. */
  marker?: { value: number; label: string };
  /** What stands in the field when the value is null. */
  emptyWords?: string;
}

/** As many choices as fit side by side; more become a list. */
const mostSegments = 3;

/** A field for one parameter: label, unit, range, usual range and help come from the schema. */
export function ParameterField({ editor, path, marker, emptyWords }: ParameterFieldProps) {
  const meta = parameterMeta(path);
  const value = parameterValue(editor.parameters, path);
  const error = editor.refusal?.path === path ? editor.refusal.words : undefined;
  if (meta.kind === 'text') return null;
  if (meta.kind === 'number') {
    return (
      <NumberField
        label={meta.label}
        unit={meta.unit}
        value={value as number | null}
        min={meta.min}
        max={meta.max}
        integer={meta.integer}
        usual={meta.usual}
        help={meta.help}
        nullable={meta.nullable}
        emptyWords={emptyWords}
        marker={marker}
        error={error}
        parse={(text) => parseQuantity(text, meta.unit)}
        onChange={(next) => editor.set(path, next, true)}
        onCommit={editor.settle}
      />
    );
  }
  const options = Object.entries(meta.options).map(([option, label]) => ({ value: option, label }));
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
