import type { QueryInterface } from 'sequelize';

/** One step of the database's history. Frozen once merged; imports nothing of the application. */
export interface Migration {
  /** Sorts by time. */
  name: string;
  up(database: QueryInterface): Promise<void>;
  down(database: QueryInterface): Promise<void>;
}
