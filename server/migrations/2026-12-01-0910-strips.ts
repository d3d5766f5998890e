import type { Migration } from './migration';

/**
 * Saved strips. Shipped presets have no owner and no department. `search_text` and `title_key` are folded to
 * lower case without accents, since SQLite folds ASCII only. A deleted strip keeps its row, so that deleting
 * can be undone. Tags are rows of their own, so that filters and counts are plain SQL.
 */
export const strips: Migration = {
  name: '2026-12-01-0910-strips',
  async up({ sequelize }) {
    await sequelize.query(`
      CREATE TABLE strips (
        id TEXT PRIMARY KEY,
        owner_id TEXT REFERENCES users (id),
        department_id TEXT REFERENCES departments (id),
        visibility TEXT NOT NULL CHECK (visibility IN ('private', 'department')),
        title TEXT NOT NULL,
        title_key TEXT NOT NULL,
        teaching_point TEXT NOT NULL,
        group_id TEXT,
        course_position INTEGER,
        parameters TEXT NOT NULL CHECK (json_valid(parameters)),
        search_text TEXT NOT NULL,
        version INTEGER NOT NULL CHECK (version >= 1),
        shipped_stamp TEXT,
        created_at TEXT NOT NULL,
        updated_at TEXT NOT NULL,
        deleted_at TEXT,
        CHECK ((owner_id IS NULL) = (department_id IS NULL)),
        CHECK ((owner_id IS NULL) = (shipped_stamp IS NOT NULL))
      ) STRICT`);
    await sequelize.query('CREATE INDEX strips_owner_id ON strips (owner_id)');
    await sequelize.query('CREATE INDEX strips_department_id ON strips (department_id)');
    await sequelize.query(`
      CREATE TABLE strip_tags (
        strip_id TEXT NOT NULL REFERENCES strips (id) ON DELETE CASCADE,
        position INTEGER NOT NULL,
        tag TEXT NOT NULL,
        tag_key TEXT NOT NULL,
        PRIMARY KEY (strip_id, tag_key)
      ) STRICT`);
    await sequelize.query('CREATE INDEX strip_tags_tag_key ON strip_tags (tag_key)');
  },
  async down({ sequelize }) {
    await sequelize.query('DROP TABLE strip_tags');
    await sequelize.query('DROP TABLE strips');
  },
};
