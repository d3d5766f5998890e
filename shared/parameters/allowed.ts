import { z } from 'zod';
import type { FieldMeta, NumberFieldMeta } from './fields';

/** Schemas that only wrap another one. */
function unwrapOnce(schema: z.ZodType): z.ZodType | null {
  if (
    schema instanceof z.ZodDefault ||
    schema instanceof z.ZodPrefault ||
    schema instanceof z.ZodNullable ||
    schema instanceof z.ZodOptional
  ) {
    return schema.unwrap() as z.ZodType;
  }
  if (schema instanceof z.ZodPipe) return schema.in as z.ZodType;
  return null;
}

/** The innermost schema: the object, union, array or leaf that a field really is. */
export function unwrap(schema: z.ZodType): z.ZodType {
  let inner: z.ZodType = schema;
  for (let next = unwrapOnce(inner); next; next = unwrapOnce(inner)) inner = next;
  return inner;
}

/** Field metadata of a schema, found on any of its layers; null when it has none. */
export function fieldMeta(schema: z.ZodType): FieldMeta | null {
  for (let layer: z.ZodType | null = schema; layer; layer = unwrapOnce(layer)) {
    const meta = layer.meta()?.field as FieldMeta | undefined;
    if (meta) return meta;
  }
  return null;
}

/** The schema at a path, or null when the path leads nowhere. Array indices are numbers or digits. */
export function schemaAt(root: z.ZodType, path: readonly PropertyKey[]): z.ZodType | null {
  let schema: z.ZodType | null = root;
  for (const key of path) {
    if (!schema) return null;
    schema = childSchema(unwrap(schema), key);
  }
  return schema;
}

function childSchema(schema: z.ZodType, key: PropertyKey): z.ZodType | null {
  if (schema instanceof z.ZodObject) {
    const shape = schema.shape as Record<string, z.ZodType>;
    return Object.hasOwn(shape, key) ? shape[key as string] : null;
  }
  if (schema instanceof z.ZodArray) return schema.element as z.ZodType;
  if (schema instanceof z.ZodUnion) {
    for (const option of schema.options) {
      const child = childSchema(unwrap(option as z.ZodType), key);
      if (child) return child;
    }
  }
  return null;
}

function numberRange(meta: NumberFieldMeta): string {
  const unit = meta.unit ? ` ${meta.unit}` : '';
  const kind = meta.integer ? 'whole number ' : '';
  return `${meta.nullable ? 'null or ' : ''}${kind}${meta.min} to ${meta.max}${unit}`;
}

/** `a list of 1 to 4`, as far as its length is bounded. */
function listWords(list: z.ZodArray): string {
  let [least, most] = [0, Infinity];
  for (const check of list.def.checks ?? []) {
    if (check instanceof z.core.$ZodCheckMinLength) least = check._zod.def.minimum;
    if (check instanceof z.core.$ZodCheckMaxLength) most = check._zod.def.maximum;
  }
  if (least === 0 && most === Infinity) return 'a list';
  if (most === Infinity) return `a list of at least ${least}`;
  return least === 0 ? `a list of at most ${most}` : `a list of ${least} to ${most}`;
}

/** In words, what a schema accepts: range with unit, list of values, or list of keys. */
export function allowedWords(schema: z.ZodType): string {
  const meta = fieldMeta(schema);
  if (meta?.kind === 'number') return numberRange(meta);
  if (meta?.kind === 'text') return `text of at most ${meta.maxLength} characters`;
  if (meta?.kind === 'flag') return 'true or false';
  const inner = unwrap(schema);
  if (inner instanceof z.ZodEnum) return `one of ${inner.options.join(', ')}`;
  if (inner instanceof z.ZodLiteral) {
    const values = [...inner.values];
    return values.length === 1 ? String(values[0]) : `one of ${values.join(', ')}`;
  }
  if (inner instanceof z.ZodUnion)
    return inner.options.map((one) => allowedWords(one as z.ZodType)).join('; or ');
  if (inner instanceof z.ZodObject) return `an object with the keys ${Object.keys(inner.shape).join(', ')}`;
  if (inner instanceof z.ZodArray)
    return `${listWords(inner)}, each ${allowedWords(inner.element as z.ZodType)}`;
  return 'a value of the documented kind';
}
