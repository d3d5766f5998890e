import { createHash } from 'node:crypto';
import { Op, type Transaction } from 'sequelize';
import { engineVersion } from '../../../shared/engine/engine-version';
import { gallery, presetParameters } from '../../../shared/gallery/gallery';
import type { GalleryPreset } from '../../../shared/gallery/gallery-preset';
import type { Database } from '../../models/database';
import { contentColumns, writeTags, type StripContent } from '../../models/strip-records';

function contentOf(preset: GalleryPreset): StripContent {
  const { title, teachingPoint, tags, group } = preset;
  const parameters = presetParameters(preset);
  return { title, teachingPoint, tags, groupId: group, visibility: 'department', parameters };
}

/** Changes whenever a preset, its place in the course or the engine that draws it does. */
function stampOf(content: StripContent, position: number): string {
  return createHash('sha256')
    .update(JSON.stringify([engineVersion, position, content]))
    .digest('hex');
}

async function shipPreset(
  database: Database,
  preset: GalleryPreset,
  coursePosition: number,
  at: string,
  transaction: Transaction,
): Promise<void> {
  const content = contentOf(preset);
  const shippedStamp = stampOf(content, coursePosition);
  const row = await database.strips.findByPk(preset.id, { transaction });
  if (row?.shippedStamp === shippedStamp && row.deletedAt === null) return;
  const columns = {
    ...contentColumns(content),
    coursePosition,
    shippedStamp,
    updatedAt: at,
    deletedAt: null,
  };
  if (row) await row.update({ ...columns, version: row.version + 1 }, { transaction });
  else {
    const owner = { ownerId: null, departmentId: null };
    await database.strips.create(
      { id: preset.id, ...owner, ...columns, version: 1, createdAt: at },
      { transaction },
    );
  }
  await writeTags(database, preset.id, content.tags, transaction);
}

/**
 * Brings the shipped presets in the database up to what this version of the product ships: new ones added,
 * changed ones updated, dropped ones hidden. What is as shipped is not touched.
 */
export async function shipGallery(database: Database, now: Date): Promise<void> {
  const at = now.toISOString();
  await database.write(async (transaction) => {
    for (const [position, preset] of gallery.entries()) {
      await shipPreset(database, preset, position, at, transaction);
    }
    await database.strips.update(
      { deletedAt: at },
      {
        where: {
          ownerId: null,
          deletedAt: null,
          id: { [Op.notIn]: gallery.map((preset) => preset.id) },
        },
        transaction,
      },
    );
  });
}
