import { randomUUID } from 'node:crypto';
import type { Transaction } from 'sequelize';
import type { CreateStrip, UpdateStrip } from '../../../shared/api/strips';
import { notFound } from '../../errors';
import type { Database } from '../../models/database';
import { contentColumns, readStrips, writeTags, type StripRecord } from '../../models/strip-records';
import type { Account } from '../session/account';
import { mustDelete, mustEdit, seen } from './access';

export interface StripDependencies {
  database: Database;
  now: () => Date;
}

/** Content as it is stored: one title, in the strip and in its parameters. */
function contentOf(input: CreateStrip | UpdateStrip) {
  const { title, teachingPoint, tags, group, visibility, parameters } = input;
  return {
    title,
    teachingPoint,
    tags,
    groupId: group,
    visibility,
    parameters: { ...parameters, title },
  };
}

async function reread(database: Database, id: string, transaction: Transaction): Promise<StripRecord> {
  const [strip] = await readStrips(database, [id], transaction);
  return strip;
}

/** A strip the account may see; throws `notFound`. */
export async function getStrip(database: Database, account: Account, id: string): Promise<StripRecord> {
  const [strip] = await readStrips(database, [id]);
  return seen(account, strip);
}

/** Keeps a new strip under the account's name. */
export async function createStrip(
  { database, now }: StripDependencies,
  account: Account,
  input: CreateStrip,
): Promise<StripRecord> {
  const id = randomUUID();
  const at = now().toISOString();
  return database.write(async (transaction) => {
    await database.strips.create(
      {
        id,
        ownerId: account.userId,
        departmentId: account.departmentId,
        ...contentColumns(contentOf(input)),
        version: 1,
        createdAt: at,
        updatedAt: at,
      },
      { transaction },
    );
    await writeTags(database, id, input.tags, transaction);
    return reread(database, id, transaction);
  });
}

export type UpdateOutcome = { stale: false; strip: StripRecord } | { stale: true; current: StripRecord };

/**
 * Saves a strip if nobody saved it since `input.version`; otherwise changes nothing and gives the strip as it
 * stands. Throws `notFound` and `notAllowed`.
 */
export async function updateStrip(
  { database, now }: StripDependencies,
  account: Account,
  id: string,
  input: UpdateStrip,
): Promise<UpdateOutcome> {
  return database.write(async (transaction) => {
    const [found] = await readStrips(database, [id], transaction);
    const current = seen(account, found);
    mustEdit(account, current);
    if (current.version !== input.version) return { stale: true, current };
    if (input.visibility !== current.visibility) mustDelete(account, current);
    await database.strips.update(
      {
        ...contentColumns(contentOf(input)),
        version: current.version + 1,
        updatedAt: now().toISOString(),
      },
      { where: { id, version: input.version }, transaction },
    );
    await writeTags(database, id, input.tags, transaction);
    return { stale: false, strip: await reread(database, id, transaction) };
  });
}

/** Deletes a strip so that `restoreStrip` can bring it back as it was. */
export async function deleteStrip(
  { database, now }: StripDependencies,
  account: Account,
  id: string,
): Promise<void> {
  await database.write(async (transaction) => {
    const [found] = await readStrips(database, [id], transaction);
    mustDelete(account, seen(account, found));
    await database.strips.update({ deletedAt: now().toISOString() }, { where: { id }, transaction });
  });
}

/** Undoes `deleteStrip`; a strip that was not deleted stays as it is. For those who may delete it. */
export async function restoreStrip(
  { database }: StripDependencies,
  account: Account,
  id: string,
): Promise<StripRecord> {
  return database.write(async (transaction) => {
    const [found] = await readStrips(database, [id], transaction);
    if (!found) throw notFound('strip');
    mustDelete(account, seen(account, { ...found, deletedAt: null }));
    await database.strips.update({ deletedAt: null }, { where: { id }, transaction });
    return reread(database, id, transaction);
  });
}
