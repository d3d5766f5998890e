import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { TestProject } from 'vitest/node';
import { createMigrator } from '../../../server/migrations/migrate';
import { openDatabase } from '../../../server/models/database';
import { seedDemo } from '../../../server/services/demo/seed-demo';
import { shipGallery } from '../../../server/services/strips/ship-gallery';

declare module 'vitest' {
  interface ProvidedContext {
    /** A migrated and seeded SQLite file, to be copied. */
    templateDatabase: string;
  }
}

/** When the template was seeded. */
export const seededAt = new Date('2026-01-05T09:00:00.000Z');

/** Migrates and seeds one SQLite file for all server tests; each test works on a copy. */
export default async function makeTemplate(project: TestProject): Promise<() => void> {
  const directory = mkdtempSync(join(tmpdir(), 'paceloom-template-'));
  const file = join(directory, 'template.sqlite');
  const database = await openDatabase(file);
  await createMigrator(database.sequelize).up();
  await seedDemo(database, seededAt);
  await shipGallery(database, seededAt);
  await database.sequelize.query('PRAGMA journal_mode = DELETE');
  await database.close();
  project.provide('templateDatabase', file);
  return () => rmSync(directory, { recursive: true, force: true });
}
