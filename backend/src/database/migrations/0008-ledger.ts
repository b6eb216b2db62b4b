import { sqlMigration } from './migration.js';

export const ledger = sqlMigration(
  '0008-ledger',
  `
  CREATE TABLE ledger_entries (
    scope text NOT NULL,
    sequence integer NOT NULL CHECK (sequence > 0),
    lot_id uuid REFERENCES lots (id),
    at timestamptz NOT NULL,
    kind text NOT NULL,
    actor_id uuid REFERENCES persons (id),
    actor_role text,
    payload jsonb NOT NULL,
    previous_hash text NOT NULL CHECK (length(previous_hash) = 64),
    hash text NOT NULL CHECK (length(hash) = 64),
    PRIMARY KEY (scope, sequence)
  );
  CREATE INDEX ledger_entries_lot ON ledger_entries (lot_id, sequence) WHERE lot_id IS NOT NULL;

  -- The newest entry of every chain: what a writer locks, and what shows a cut tail.
  CREATE TABLE ledger_heads (
    scope text PRIMARY KEY,
    sequence integer NOT NULL,
    hash text NOT NULL
  );

  -- Append only, whoever asks. The application's role has no right to update, delete or truncate either.
  CREATE FUNCTION ledger_append_only() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    RAISE EXCEPTION 'the ledger is append-only' USING ERRCODE = 'integrity_constraint_violation';
  END $$;
  CREATE TRIGGER ledger_append_only BEFORE UPDATE OR DELETE OR TRUNCATE ON ledger_entries
    FOR EACH STATEMENT EXECUTE FUNCTION ledger_append_only();
  `,
  `DROP TABLE ledger_heads, ledger_entries; DROP FUNCTION ledger_append_only();`,
);
