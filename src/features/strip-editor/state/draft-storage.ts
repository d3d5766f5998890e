import { readStripParameters } from '../../../../shared/parameters/parse';
import type { StripParameters } from '../../../../shared/parameters/strip-parameters';

/** What is kept of unsaved work: per tab, so that two tabs do not overwrite each other's. */
export interface StoredDraft {
  parameters: StripParameters;
  /** The saved version that it was made from; 0 for a strip that was never saved. */
  version: number;
}

const keyOf = (stripId: string | null): string => `paceloom.draft.${stripId ?? 'new'}`;

/** Keeps a draft through a reload; a browser that keeps nothing (private mode, full) is no error. */
export function storeDraft(stripId: string | null, draft: StoredDraft): void {
  try {
    sessionStorage.setItem(keyOf(stripId), JSON.stringify(draft));
  } catch {
    // The draft is still on the page; only a reload would lose it.
  }
}

export function dropDraft(stripId: string | null): void {
  try {
    sessionStorage.removeItem(keyOf(stripId));
  } catch {
    // Nothing was kept.
  }
}

/** The draft kept for a strip; null when there is none or it no longer fits the schema. */
export function readDraft(stripId: string | null): StoredDraft | null {
  try {
    const stored = JSON.parse(sessionStorage.getItem(keyOf(stripId)) ?? 'null') as StoredDraft | null;
    if (stored === null) return null;
    const result = readStripParameters(stored.parameters);
    return result.ok ? { parameters: result.parameters, version: Number(stored.version) || 0 } : null;
  } catch {
    return null;
  }
}
