import type { Migration } from './migration';

/**
 * Colleges' departments, their people, and who is signed in where. Sessions are rows, so that signing out ends
 * one for good and a restart of the server ends none. Times are ISO 8601 text in UTC, which sorts as it reads.
 */
export const people: Migration = {
  name: '2026-12-01-0900-people',
  async up({ sequelize }) {
    await sequelize.query(`
      CREATE TABLE departments (
        id TEXT PRIMARY KEY,
        organisation TEXT NOT NULL,
        name TEXT NOT NULL,
        UNIQUE (organisation, name)
      ) STRICT`);
    await sequelize.query(`
      CREATE TABLE users (
        id TEXT PRIMARY KEY,
        department_id TEXT NOT NULL REFERENCES departments (id),
        name TEXT NOT NULL,
        email TEXT NOT NULL UNIQUE COLLATE NOCASE,
        role TEXT NOT NULL CHECK (role IN ('educator', 'technician', 'learner', 'administrator')),
        password_hash TEXT NOT NULL,
        is_demo INTEGER NOT NULL DEFAULT 0 CHECK (is_demo IN (0, 1)),
        created_at TEXT NOT NULL
      ) STRICT`);
    await sequelize.query(`
      CREATE TABLE sessions (
        id TEXT PRIMARY KEY,
        user_id TEXT NOT NULL REFERENCES users (id) ON DELETE CASCADE,
        created_at TEXT NOT NULL,
        expires_at TEXT NOT NULL
      ) STRICT`);
    await sequelize.query('CREATE INDEX sessions_expires_at ON sessions (expires_at)');
    await sequelize.query('CREATE INDEX sessions_user_id ON sessions (user_id)');
  },
  async down({ sequelize }) {
    await sequelize.query('DROP TABLE sessions');
    await sequelize.query('DROP TABLE users');
    await sequelize.query('DROP TABLE departments');
  },
};
