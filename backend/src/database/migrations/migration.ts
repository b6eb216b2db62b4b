import type { Sequelize } from 'sequelize';

/** One numbered step of the schema. Never edited once merged: a change is a new step. */
export interface Migration {
  readonly name: string;
  up(db: Sequelize): Promise<void>;
  down(db: Sequelize): Promise<void>;
}

/** A step made of SQL statements, run in one transaction. */
export function sqlMigration(name: string, up: string, down: string): Migration {
  const run = (sql: string) => async (db: Sequelize) => {
    await db.transaction(async (transaction) => {
      await db.query(sql, { transaction });
    });
  };
  return { name, up: run(up), down: run(down) };
}
