import { withValueAt } from '../../../../shared/parameters/assign-path';
import { fieldMeta, schemaAt } from '../../../../shared/parameters/allowed';
import type { FieldMeta } from '../../../../shared/parameters/fields';
import { problemLine, type Problem } from '../../../../shared/errors';
import { readStripParameters } from '../../../../shared/parameters/parse';
import { stripParametersSchema, type StripParameters } from '../../../../shared/parameters/strip-parameters';
import { withConsequences } from './consequences';

/** Dotted path of one parameter; a number in it is an index. */
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
  const changed = withValueAt(parameters, path.split('.'), value) as StripParameters;
  const result = readStripParameters(withConsequences(changed, path));
  if (result.ok) return { ok: true, parameters: result.parameters };
  return { ok: false, path, words: refusalWords(result.problems[0], path) };
}
