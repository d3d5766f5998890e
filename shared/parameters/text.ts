import { z } from 'zod';
import type { TextFieldMeta } from './fields';

type TextSpec = Omit<TextFieldMeta, 'kind'>;

/** Characters no field of ours may hold: everything below the space but tab and line breaks, and DEL. */
const forbidden = [...Array(32).keys(), 127].filter((code) => code !== 9 && code !== 10 && code !== 13);
const forbiddenCodes = new Set(forbidden);

/** Whether a text is free of control characters (tab and line breaks are allowed). */
export function isPlainText(text: string): boolean {
  for (let i = 0; i < text.length; i++) if (forbiddenCodes.has(text.charCodeAt(i))) return false;
  return true;
}

/** Why a text with control characters is refused; for `refine`. */
export const plainTextRule = {
  params: { allowed: 'text without control characters' },
  message: 'holds control characters',
};

/** Trimmed text of at most `maxLength` characters, without control characters; may be empty. */
export function plainText(spec: TextSpec) {
  return z
    .string()
    .trim()
    .max(spec.maxLength)
    .refine(isPlainText, plainTextRule)
    .meta({ field: { kind: 'text', ...spec } satisfies TextFieldMeta });
}

/** As `plainText`, but at least one character that is not a space. */
export function requiredText(spec: TextSpec) {
  return plainText(spec).refine((text) => text.length > 0, {
    params: { allowed: `1 to ${spec.maxLength} characters` },
    message: `${spec.label} is empty`,
  });
}

/**
 * Text folded for finding and comparing: lower case, accents off, compatibility forms resolved. `Überleitung`
 * and `uberleitung` fold alike.
 */
export function foldText(text: string): string {
  return text.normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase();
}
