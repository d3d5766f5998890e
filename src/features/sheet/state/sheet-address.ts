import { stripIdSchema } from '../../../../shared/api/strip-id';
import { mostSheetStrips } from '../../../../shared/api/sheets';
import { pageSetupSchema, type PageSetup } from '../../../../shared/parameters/page-setup';

/** What the address of a sheet says besides its first strip. */
export interface SheetAddress {
  /** The strips after the first, in order. */
  others: string[];
  /** Options that were chosen; the rest is as the first strip has it, or as usual. */
  chosen: Partial<PageSetup>;
  /** The page on the desk, from 1. */
  page: number;
}

const fields = pageSetupSchema.unwrap().shape;
const keys = Object.keys(fields) as (keyof PageSetup)[];

/** How null stands in the address; only the chest gain can be null, and follows the limb leads then. */
const nullWord = 'limb';

function write(value: PageSetup[keyof PageSetup]): string {
  if (value === null) return nullWord;
  if (typeof value === 'boolean') return value ? 'on' : 'off';
  return Array.isArray(value) ? value.join('.') : String(value);
}

/** What a text may stand for; the field takes the first that it allows. */
function meanings(text: string): unknown[] {
  const number = text.trim() === '' ? Number.NaN : Number(text);
  const flag = { on: true, off: false }[text];
  return [text, number, flag, text === nullWord ? null : undefined, text.split('.')].filter(
    (meaning) => meaning !== undefined,
  );
}

function readOption(key: keyof PageSetup, text: string | null): unknown {
  if (text === null) return undefined;
  for (const meaning of meanings(text)) {
    const result = fields[key].safeParse(meaning);
    if (result.success) return result.data;
  }
  return undefined;
}

/** Reads the address; what cannot be read counts as not given. */
export function readSheetAddress(first: string, search: URLSearchParams): SheetAddress {
  const ids = search.getAll('and').filter((id) => stripIdSchema.safeParse(id).success);
  const others = [...new Set(ids)].filter((id) => id !== first).slice(0, mostSheetStrips - 1);
  const options = keys.map((key) => [key, readOption(key, search.get(key))] as const);
  const page = Number(search.get('page'));
  return {
    others,
    chosen: Object.fromEntries(options.filter(([, value]) => value !== undefined)),
    page: Number.isInteger(page) && page > 0 ? page : 1,
  };
}

/** The search part of the address of a sheet. */
export function writeSheetAddress({ others, chosen, page }: SheetAddress): URLSearchParams {
  const search = new URLSearchParams();
  for (const id of others) search.append('and', id);
  for (const key of keys) {
    const value = chosen[key];
    if (value !== undefined) search.set(key, write(value));
  }
  if (page > 1) search.set('page', String(page));
  return search;
}
