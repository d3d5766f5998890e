import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { QueryTypes, type Transaction } from 'sequelize';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { createMigrator, migrations } from '../../server/migrations/migrate';
import { openDatabase, type Database } from '../../server/models/database';

let directory: string;
let database: Database;
beforeEach(async () => {
  directory = mkdtempSync(join(tmpdir(), 'paceloom-migrations-'));
  database = await openDatabase(join(directory, 'test.sqlite'));
});
afterEach(async () => {
  await database.close();
  rmSync(directory, { recursive: true, force: true });
});

interface SchemaRow {
  type: string;
  name: string;
  sql: string | null;
}

async function schema(): Promise<SchemaRow[]> {
  return database.sequelize.query<SchemaRow>(
    `SELECT type, name, sql FROM sqlite_schema WHERE name NOT LIKE 'sqlite_%' AND name <> 'migrations' ORDER BY name`,
    { type: QueryTypes.SELECT },
  );
}

describe('the history', () => {
  it('goes up, down to nothing, and up to the same again', async () => {
    const migrator = createMigrator(database.sequelize);
    await migrator.up();
    const first = await schema();
    expect(first.filter((one) => one.type === 'table').map((one) => one.name)).toEqual([
      'departments',
      'export_jobs',
      'sessions',
      'strip_tags',
      'strips',
      'users',
    ]);
    await migrator.down({ to: 0 });
    expect(await schema()).toEqual([]);
    await migrator.up();
    expect(await schema()).toEqual(first);
  });

  it('goes each step down and up alone', async () => {
    const migrator = createMigrator(database.sequelize);
    await migrator.up();
    const whole = await schema();
    for (let steps = 1; steps <= migrations.length; steps++) {
      await migrator.down({ step: steps });
      await migrator.up();
      expect(await schema()).toEqual(whole);
    }
  });

  it('is in order of time, and says when it has nothing to do', async () => {
    const names = migrations.map((one) => one.name);
    expect(names).toEqual([...names].sort());
    const migrator = createMigrator(database.sequelize);
    expect((await migrator.up()).map((one) => one.name)).toEqual(names);
    expect(await migrator.up()).toEqual([]);
  });
});

describe('the database', () => {
  beforeEach(async () => {
    await createMigrator(database.sequelize).up();
  });

  async function pragma(name: string, transaction?: Transaction): Promise<unknown> {
    const [row] = await database.sequelize.query<Record<string, unknown>>(`PRAGMA ${name}`, {
      type: QueryTypes.SELECT,
      transaction,
    });
    return Object.values(row)[0];
  }

  it('writes ahead, and enforces foreign keys and waits for locks on every connection', async () => {
    expect(await pragma('journal_mode')).toBe('wal');
    expect(await pragma('foreign_keys')).toBe(1);
    expect(await pragma('busy_timeout')).toBe(5000);
    await database.sequelize.transaction(async (transaction) => {
      expect(await pragma('foreign_keys', transaction)).toBe(1);
      expect(await pragma('busy_timeout', transaction)).toBe(5000);
    });
  });

  it('takes no session of a person who is not there, and no unknown role', async () => {
    const session = { id: 's', userId: 'nobody', createdAt: '2026', expiresAt: '2027' };
    await expect(database.sessions.create(session)).rejects.toThrow(/FOREIGN KEY/);
    await database.departments.create({ id: 'd', organisation: 'o', name: 'n' });
    const user = { id: 'u', departmentId: 'd', name: 'n', email: 'e', passwordHash: 'h', createdAt: '2026' };
    const role = 'owner' as 'educator';
    await expect(database.users.create({ ...user, role })).rejects.toMatchObject({
      parent: { message: expect.stringContaining('CHECK') as string },
    });
  });
});
