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
    const guard = async (what: 'DISABLE' | 'ENABLE') => {
      for (const table of ['ledger_entries', 'ledger_anchors', 'ledger_anchor_heads'])
        await owner.query(`ALTER TABLE ${table} ${what} TRIGGER ledger_append_only`, { transaction });
    };
    await guard('DISABLE');
    await owner.query(`TRUNCATE ${names} RESTART IDENTITY CASCADE`, { transaction });
    await guard('ENABLE');
  });
}
