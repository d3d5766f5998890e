import { createHash } from 'node:crypto';
import type { Transaction } from 'sequelize';
import type { ImportAnalysis, LookedAtPreset } from '../../../shared/api/preset-files';
import type { PresetFile } from '../../../shared/formats/preset-file';
import type { Database } from '../../models/database';
import type { StripRecord } from '../../models/strip-records';
import type { Account } from '../session/account';
import { matchPresets, type MatchedPreset } from './match-presets';
import { contentStamp, knownGroup } from './preset-content';

function keeperOf(strip: StripRecord, account: Account): 'me' | 'department' | 'gallery' {
  if (strip.owner === null) return 'gallery';
  return strip.owner.id === account.userId ? 'me' : 'department';
}

function lookedAt({ preset, match }: MatchedPreset, index: number, account: Account): LookedAtPreset {
  return {
    number: index + 1,
    title: preset.title,
    status: match === null ? 'new' : match.sameContent ? 'same' : 'changed',
    match: match && {
      id: match.strip.id,
      title: match.strip.title,
      keptBy: keeperOf(match.strip, account),
      replaceable: match.replaceable,
    },
    groupUnknown: preset.group !== null && knownGroup(preset.group) === null,
  };
}

/** Changes whenever the file, a strip that it is matched with, or what may be done with that does. */
function tokenOf(matched: readonly MatchedPreset[]): string {
  const parts = matched.map(({ preset, match }) => [
    preset.presetId,
    preset.engineVersion,
    contentStamp(preset),
    match && [match.strip.id, match.strip.version, match.replaceable],
  ]);
  return createHash('sha256').update(JSON.stringify(parts)).digest('hex');
}

/** What a file would do to the library as it is now; changes nothing. */
export async function lookAtPresets(
  database: Database,
  account: Account,
  file: PresetFile,
  transaction?: Transaction,
): Promise<{ matched: MatchedPreset[]; analysis: ImportAnalysis }> {
  const matched = await matchPresets(database, account, file.strips, transaction);
  const analysis = {
    fileVersion: file.fileVersion,
    upgrades: [...file.upgrades],
    presets: matched.map((one, index) => lookedAt(one, index, account)),
    token: tokenOf(matched),
  };
  return { matched, analysis };
}
