import { Sequelize, Transaction } from 'sequelize';
import sqlite3 from 'sqlite3';
import { defineModels, type Models } from './models';

/** How long a connection waits for another's write to end before it gives up, ms. */
const busyTimeoutMs = 5000;

/** Sequelize opens a connection for each transaction; each needs its own busy timeout. */
class PatientDatabase extends sqlite3.Database {
  constructor(filename: string, mode: number, callback: (error: Error | null) => void) {
    super(filename, mode, callback);
    this.configure('busyTimeout', busyTimeoutMs);
  }
}

export interface Database extends Models {
  sequelize: Sequelize;
  /**
   * Runs a transaction that holds the write lock from its start, so that what it reads stays true until it ends.
   * Those of one process run one after another: waiting for SQLite's lock blocks a thread of Node's small pool,
   * and a few who wait would keep the one who holds the lock from ever getting a thread.
   */
  write<Result>(work: (transaction: Transaction) => Promise<Result>): Promise<Result>;
  close(): Promise<void>;
}

function createWriter(sequelize: Sequelize): Database['write'] {
  let last: Promise<unknown> = Promise.resolve();
  return (work) => {
    const run = () => sequelize.transaction({ type: Transaction.TYPES.IMMEDIATE }, work);
    const result = last.then(run, run);
    last = result.catch(() => undefined);
    return result;
  };
}

/** Opens the SQLite file (made when it is not there) in write-ahead mode with foreign keys enforced. */
export async function openDatabase(file: string): Promise<Database> {
  const sequelize = new Sequelize({
    dialect: 'sqlite',
    storage: file,
    dialectModule: { ...sqlite3, Database: PatientDatabase },
    logging: false,
    define: { timestamps: false, underscored: true },
  });
  await sequelize.query('PRAGMA journal_mode = WAL');
  return {
    sequelize,
    ...defineModels(sequelize),
    write: createWriter(sequelize),
    close: () => sequelize.close(),
  };
}
