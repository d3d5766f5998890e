import { readKeptParameters } from './kept-parameters';
import { createStrip, getStrip, type StripDependencies } from './keep-strips';
import { courseGroupIdSchema } from '../../../shared/api/strips';
import type { StripRecord } from '../../models/strip-records';
import type { Account } from '../session/account';

const longestTitle = 120;

/** Cut to the length a title may have, not through the middle of a character. */
function copyTitle(title: string): string {
  return `Copy of ${title}`
    .slice(0, longestTitle)
    .replace(/[\uD800-\uDBFF]$/, '')
    .trimEnd();
}

/** A private copy of a strip the account may see, at version 1, owned by the account. */
export async function duplicateStrip(
  dependencies: StripDependencies,
  account: Account,
  id: string,
  title: string | undefined,
): Promise<StripRecord> {
  const original = await getStrip(dependencies.database, account, id);
  const group = courseGroupIdSchema.safeParse(original.groupId);
  return createStrip(dependencies, account, {
    title: title ?? copyTitle(original.title),
    teachingPoint: original.teachingPoint,
    tags: original.tags,
    group: group.success ? group.data : null,
    visibility: 'private',
    parameters: readKeptParameters(original),
  });
}
