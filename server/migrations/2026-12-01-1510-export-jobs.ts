import type { Migration } from './migration';

/**
 * Exports as jobs. The parameters are kept with the job, so that it can run again whatever becomes of the strip;
 * `strip_id` only says where it came from. `duration_s` is theirs too: short exports do not wait behind long ones. `attempts` counts starts: a job that takes the server down with it is not
 * started for ever. The file lies beside the database under the job's id.
 */
export const exportJobs: Migration = {
  name: '2026-12-01-1510-export-jobs',
  async up({ sequelize }) {
    await sequelize.query(`
      CREATE TABLE export_jobs (
        id TEXT PRIMARY KEY,
        owner_id TEXT NOT NULL REFERENCES users (id) ON DELETE CASCADE,
        strip_id TEXT,
        title TEXT NOT NULL,
        parameters TEXT NOT NULL CHECK (json_valid(parameters)),
        formats TEXT NOT NULL CHECK (json_valid(formats)),
        duration_s REAL NOT NULL,
        bundle INTEGER NOT NULL CHECK (bundle IN (0, 1)),
        state TEXT NOT NULL CHECK (state IN ('waiting', 'running', 'done', 'failed', 'cancelled')),
        attempts INTEGER NOT NULL DEFAULT 0,
        failure TEXT,
        warnings TEXT NOT NULL DEFAULT '[]' CHECK (json_valid(warnings)),
        ending TEXT,
        media_type TEXT,
        bytes INTEGER,
        created_at TEXT NOT NULL,
        finished_at TEXT,
        removed_at TEXT,
        CHECK ((state = 'done') = (bytes IS NOT NULL)),
        CHECK ((state = 'failed') = (failure IS NOT NULL))
      ) STRICT`);
    await sequelize.query('CREATE INDEX export_jobs_owner_id ON export_jobs (owner_id, created_at)');
    await sequelize.query('CREATE INDEX export_jobs_state ON export_jobs (state, created_at)');
  },
  async down({ sequelize }) {
    await sequelize.query('DROP TABLE export_jobs');
  },
};
