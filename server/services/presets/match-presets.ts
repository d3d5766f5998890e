import type { Transaction } from 'sequelize';
import type { FiledPreset } from '../../../shared/formats/preset-file';
import type { Database } from '../../models/database';
import { whereOf } from '../../models/strip-filter';
import { selectPresetCandidates } from '../../models/strip-queries';
import { readStrips, type StripRecord } from '../../models/strip-records';
import type { Account } from '../session/account';
import { canEdit } from '../strips/access';
import { contentOfStrip, contentStamp, knownGroup } from './preset-content';

/** A preset of a file, and the strip of the library that it is; null when it is new. */
export interface MatchedPreset {
  preset: FiledPreset;
  match: { strip: StripRecord; sameContent: boolean; replaceable: boolean } | null;
}

interface Candidate {
  strip: StripRecord;
  stamp: string;
  replaceable: boolean;
  own: boolean;
}

const everything = { search: '', tags: [], keptBy: 'everyone' } as const;

async function candidatesFor(
  database: Database,
  account: Account,
  presets: readonly FiledPreset[],
  transaction?: Transaction,
): Promise<Candidate[]> {
  const where = whereOf(account, everything);
  const ids = await selectPresetCandidates(database.sequelize, where, presets, transaction);
  const strips = await readStrips(database, ids, transaction);
  return strips.map((strip) => ({
    strip,
    stamp: contentStamp(contentOfStrip(strip)),
    replaceable: canEdit(account, strip),
    own: strip.owner?.id === account.userId,
  }));
}

/** First the same preset where it may be changed, then the same content, then the same preset elsewhere. */
function rank(hasId: boolean, { replaceable }: Candidate): number {
  if (hasId && replaceable) return 0;
  return hasId ? 2 : 1;
}

function matchOf(
  preset: FiledPreset,
  candidates: readonly Candidate[],
  taken: ReadonlySet<string>,
): MatchedPreset['match'] {
  const stamp = contentStamp({ ...preset, group: knownGroup(preset.group) });
  const hasId = ({ strip }: Candidate): boolean =>
    preset.presetId !== null && (strip.id === preset.presetId || strip.presetId === preset.presetId);
  const [best] = candidates
    .filter((one) => one.stamp === stamp || (hasId(one) && !taken.has(one.strip.id)))
    .sort(
      (a, b) =>
        rank(hasId(a), a) - rank(hasId(b), b) ||
        Number(b.own) - Number(a.own) ||
        Number(b.replaceable) - Number(a.replaceable) ||
        (a.strip.updatedAt < b.strip.updatedAt ? 1 : -1),
    );
  if (!best) return null;
  return { strip: best.strip, sameContent: best.stamp === stamp, replaceable: best.replaceable };
}

/**
 * Finds each preset in what the account may see: by the id it travels under, or by its content. Two presets of a file
 * are never the same strip unless their content is.
 */
export async function matchPresets(
  database: Database,
  account: Account,
  presets: readonly FiledPreset[],
  transaction?: Transaction,
): Promise<MatchedPreset[]> {
  const candidates = await candidatesFor(database, account, presets, transaction);
  const taken = new Set<string>();
  return presets.map((preset) => {
    const match = matchOf(preset, candidates, taken);
    if (match) taken.add(match.strip.id);
    return { preset, match };
  });
}
