import { QueryTypes, type Sequelize } from 'sequelize';

/**
 * Empties every table, the ledger too: for the demo alone, and only as the owner of the schema, since the application's role cannot. The
 * guard of the ledger is lifted inside one transaction and stands again when it ends.
 */
export async function emptyDatabase(owner: Sequelize): Promise<void> {
  await owner.transaction(async (transaction) => {
    const tables = await owner.query<{ tablename: string }>(
      "SELECT tablename FROM pg_tables WHERE schemaname = 'public' AND tablename <> 'schema_steps'",
      { type: QueryTypes.SELECT, transaction },
    );
    const names = tables.map(({ tablename }) => `"${tablename}"`).join(', ');
    await owner.query('ALTER TABLE ledger_entries DISABLE TRIGGER ledger_append_only', { transaction });
    await owner.query(`TRUNCATE ${names} RESTART IDENTITY CASCADE`, { transaction });
    await owner.query('ALTER TABLE ledger_entries ENABLE TRIGGER ledger_append_only', { transaction });
  });
}
