import { randomUUID } from 'node:crypto';
import type { Transaction } from 'sequelize';
import type { ImportChoice, ImportDecision, ImportResult } from '../../../shared/api/preset-files';
import type { Visibility } from '../../../shared/api/strips';
import type { FiledPreset, PresetFile } from '../../../shared/formats/preset-file';
import { staleImport } from '../../errors';
import type { Database } from '../../models/database';
import { contentColumns, writeTags, type StripContent } from '../../models/strip-records';
import type { Account } from '../session/account';
import type { StripDependencies } from '../strips/keep-strips';
import { lookAtPresets } from './look-at-presets';
import type { MatchedPreset } from './match-presets';
import { knownGroup } from './preset-content';

/** One import while its transaction runs. */
interface Import {
  database: Database;
  account: Account;
  at: string;
  transaction: Transaction;
}

function contentOf(preset: FiledPreset, visibility: Visibility): StripContent {
  const { title, teachingPoint, tags, group, parameters, engineVersion } = preset;
  return { title, teachingPoint, tags, groupId: knownGroup(group), visibility, parameters, engineVersion };
}

/** A strip of one's own; only the first of a preset carries its id, a second one is a preset of its own. */
async function add(running: Import, preset: FiledPreset, presetId: string | null): Promise<string> {
  const { database, account, at, transaction } = running;
  const id = randomUUID();
  await database.strips.create(
    {
      id,
      ownerId: account.userId,
      departmentId: account.departmentId,
      ...contentColumns(contentOf(preset, 'private')),
      presetId,
      version: 1,
      createdAt: at,
      updatedAt: at,
    },
    { transaction },
  );
  await writeTags(database, id, preset.tags, transaction);
  return id;
}

/** The strip's content becomes the preset's; whose it is and who sees it stays. */
async function replace(
  running: Import,
  preset: FiledPreset,
  { strip }: NonNullable<MatchedPreset['match']>,
): Promise<void> {
  const { database, at, transaction } = running;
  await database.strips.update(
    { ...contentColumns(contentOf(preset, strip.visibility)), version: strip.version + 1, updatedAt: at },
    { where: { id: strip.id }, transaction },
  );
  await writeTags(database, strip.id, preset.tags, transaction);
}

async function importOne(
  running: Import,
  { preset, match }: MatchedPreset,
  choice: ImportChoice,
  result: ImportResult,
): Promise<void> {
  const { title } = preset;
  if (match === null) result.added.push({ id: await add(running, preset, preset.presetId), title });
  else if (choice === 'keepBoth') result.added.push({ id: await add(running, preset, null), title });
  else if (choice === 'skip' || match.sameContent) result.skipped++;
  else if (!match.replaceable) result.notReplaceable.push({ id: match.strip.id, title: match.strip.title });
  else {
    await replace(running, preset, match);
    result.replaced.push({ id: match.strip.id, title });
  }
}

/**
 * Imports every preset of a file by a decision, all of them or none. Throws `staleImport`, and then changes nothing,
 * when the library is no longer as it was when the decision was made.
 */
export async function importPresets(
  { database, now }: StripDependencies,
  account: Account,
  file: PresetFile,
  decision: ImportDecision,
): Promise<ImportResult> {
  const choices = new Map(decision.exceptions.map(({ number, choice }) => [number, choice]));
  return database.write(async (transaction) => {
    const { matched, analysis } = await lookAtPresets(database, account, file, transaction);
    if (analysis.token !== decision.token) throw staleImport(analysis);
    const running: Import = { database, account, at: now().toISOString(), transaction };
    const result: ImportResult = { added: [], replaced: [], skipped: 0, notReplaceable: [] };
    for (const [index, one] of matched.entries()) {
      await importOne(running, one, choices.get(index + 1) ?? decision.choice, result);
    }
    return result;
  });
}
