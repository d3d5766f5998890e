import { fieldMeta, schemaAt } from '../../../../shared/parameters/allowed';
import type { FieldMeta } from '../../../../shared/parameters/fields';
import { problemLine, type Problem } from '../../../../shared/errors';
import { pacesBothVentricles } from '../../../../shared/parameters/pacing';
import { readStripParameters } from '../../../../shared/parameters/parse';
import { stripParametersSchema, type StripParameters } from '../../../../shared/parameters/strip-parameters';

/** Dotted path of one parameter. */
export type ParameterPath = string;

type Tree = { [key: string]: unknown };

/** Label, unit, range and help of a parameter, from the schema itself. Throws for a path that does not exist. */
export function parameterMeta(path: ParameterPath): FieldMeta {
  const schema = schemaAt(stripParametersSchema, path.split('.'));
  const meta = schema && fieldMeta(schema);
  if (!meta) throw new Error(`no parameter at ${path}`);
  return meta;
}

export function parameterValue(parameters: StripParameters, path: ParameterPath): unknown {
  return path.split('.').reduce<unknown>((value, key) => (value as Tree)[key], parameters);
}

function withValue(tree: Tree, [key, ...rest]: string[], value: unknown): Tree {
  return { ...tree, [key]: rest.length === 0 ? value : withValue(tree[key] as Tree, rest, value) };
}

/** What must change with a mode: both ventricles exactly when it has the fifth letter V. */
function chambersFor(parameters: StripParameters): 'right' | 'left' | 'both' {
  const { mode, ventricularChambers } = parameters.pacing;
  if (pacesBothVentricles(mode)) return 'both';
  return ventricularChambers === 'both' ? 'right' : ventricularChambers;
}

export type ParameterChange =
  { ok: true; parameters: StripParameters } | { ok: false; path: ParameterPath; words: string };

function refusalWords({ path, value, allowed }: Problem, changed: ParameterPath): string {
  if (path === changed) return `${value} does not fit here. Allowed: ${allowed}.`;
  return `This does not go with ${path.split('.').at(-1)}: ${problemLine({ path, value, allowed })}`;
}

/** Parameters with one value changed, or why they cannot be. */
export function changeParameter(
  parameters: StripParameters,
  path: ParameterPath,
  value: unknown,
): ParameterChange {
  let changed = withValue(parameters as unknown as Tree, path.split('.'), value);
  if (path === 'pacing.mode') {
    const chambers = chambersFor(changed as unknown as StripParameters);
    changed = withValue(changed, ['pacing', 'ventricularChambers'], chambers);
  }
  const result = readStripParameters(changed);
  if (result.ok) return { ok: true, parameters: result.parameters };
  return { ok: false, path, words: refusalWords(result.problems[0], path) };
}
