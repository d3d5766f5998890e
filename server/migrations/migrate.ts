import type { Sequelize } from 'sequelize';
import { SequelizeStorage, Umzug } from 'umzug';
import { people } from './2026-12-01-0900-people';
import { strips } from './2026-12-01-0910-strips';
import { stripEngine } from './2026-12-01-1230-strip-engine';
import { stripPresetId } from './2026-12-01-1500-strip-preset-id';
import { exportJobs } from './2026-12-01-1510-export-jobs';
import type { Migration } from './migration';

/** The whole history, oldest first. Listed, not globbed, so that the built server carries it. */
export const migrations: readonly Migration[] = [people, strips, stripEngine, stripPresetId, exportJobs];

/** Runs the history up or down on a database. */
export function createMigrator(sequelize: Sequelize) {
  const context = sequelize.getQueryInterface();
  return new Umzug({
    migrations: migrations.map(({ name, up, down }) => ({
      name,
      up: () => up(context),
      down: () => down(context),
    })),
    storage: new SequelizeStorage({ sequelize, modelName: 'migrations', tableName: 'migrations' }),
    logger: undefined,
  });
}
