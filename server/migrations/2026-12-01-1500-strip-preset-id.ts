import type { Migration } from './migration';

/**
 * The id under which a strip came in a preset file, so that the same file is recognised when it comes again. Not
 * unique: two people may import one file, each for themselves.
 */
export const stripPresetId: Migration = {
  name: '2026-12-01-1500-strip-preset-id',
  async up({ sequelize }) {
    await sequelize.query('ALTER TABLE strips ADD COLUMN preset_id TEXT');
    await sequelize.query('CREATE INDEX strips_preset_id ON strips (preset_id)');
  },
  async down({ sequelize }) {
    await sequelize.query('DROP INDEX strips_preset_id');
    await sequelize.query('ALTER TABLE strips DROP COLUMN preset_id');
  },
};
