import type { Migration } from './migration';

/** The engine that a strip was last saved with; whatever was saved before this was drawn by 1.0.0. */
export const stripEngine: Migration = {
  name: '2026-12-01-1230-strip-engine',
  async up({ sequelize }) {
    await sequelize.query("ALTER TABLE strips ADD COLUMN engine_version TEXT NOT NULL DEFAULT '1.0.0'");
  },
  async down({ sequelize }) {
    await sequelize.query('ALTER TABLE strips DROP COLUMN engine_version');
  },
};
