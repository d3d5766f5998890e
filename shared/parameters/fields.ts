import { z } from 'zod';

/**
 * Building blocks of the strip schema. Every number carries its unit, range, usual range and label as data
 * (zod metadata), so that messages, editor fields and documentation are drawn from one place.
 */

export interface NumberFieldMeta {
  kind: 'number';
  label: string;
  unit: string;
  min: number;
  max: number;
  integer?: boolean;
  nullable?: boolean;
  /** What null means, in a few words. */
  emptyWords?: string;
  /** What practice usually sets; shown as a band on the ruler. */
  usual?: readonly [number, number];
  help: string;
}

export interface ChoiceFieldMeta {
  kind: 'choice';
  label: string;
  /** Value to label, in the order shown. */
  options: Readonly<Record<string, string>>;
  help: string;
}

export interface TextFieldMeta {
  kind: 'text';
  label: string;
  maxLength: number;
  help: string;
}

/** On or off. */
export interface FlagFieldMeta {
  kind: 'flag';
  label: string;
  help: string;
}

export type FieldMeta = NumberFieldMeta | ChoiceFieldMeta | TextFieldMeta | FlagFieldMeta;

type NumberSpec = Omit<NumberFieldMeta, 'kind'>;

/** A finite number within its range. */
function boundedNumber(spec: NumberSpec) {
  const number = z.number().min(spec.min).max(spec.max);
  return spec.integer ? number.int() : number;
}

/** A number with a default. */
export function numberField(defaultValue: number, spec: NumberSpec) {
  return boundedNumber(spec)
    .meta({ field: { kind: 'number', ...spec } satisfies NumberFieldMeta })
    .default(defaultValue);
}

/** A number that may be null, where null means "decided by the engine"; null by default. */
export function nullableNumberField(spec: NumberSpec) {
  return boundedNumber(spec)
    .nullable()
    .meta({ field: { kind: 'number', nullable: true, ...spec } satisfies NumberFieldMeta })
    .default(null);
}

/** A number whose default depends on something else and is filled in later. */
export function dependentNumberField(spec: NumberSpec) {
  return boundedNumber(spec)
    .meta({ field: { kind: 'number', ...spec } satisfies NumberFieldMeta })
    .optional();
}

/** True or false. */
export function flagField(defaultValue: boolean, spec: Omit<FlagFieldMeta, 'kind'>) {
  return z
    .boolean()
    .meta({ field: { kind: 'flag', ...spec } satisfies FlagFieldMeta })
    .default(defaultValue);
}

/** One of a few named values. */
export function choiceField<const T extends Record<string, string>>(
  options: T,
  defaultValue: keyof T & string,
  spec: { label: string; help: string },
) {
  const values = Object.keys(options) as [keyof T & string, ...(keyof T & string)[]];
  return z
    .enum(values)
    .meta({ field: { kind: 'choice', options, ...spec } satisfies ChoiceFieldMeta })
    .default(defaultValue as never);
}

/** Free text up to a length; empty by default. */
export function textField(spec: Omit<TextFieldMeta, 'kind'>) {
  return z
    .string()
    .max(spec.maxLength)
    .meta({ field: { kind: 'text', ...spec } satisfies TextFieldMeta })
    .default('');
}

/** An object that refuses unknown keys and fills itself from `{}`. */
export function section<T extends z.ZodRawShape>(shape: T) {
  return z.strictObject(shape).prefault({} as never);
}
