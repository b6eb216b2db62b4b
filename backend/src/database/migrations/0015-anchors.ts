import { sqlMigration } from './migration.js';

export const anchors = sqlMigration(
  '0015-anchors',
  `
  -- Once a day: the hash over every chain head that moved since the anchor before, and over that anchor. So the newest one stands for all
  -- chains. What is named in an anchor cannot be cut off a chain without being missed.
  CREATE TABLE ledger_anchors (
    day date PRIMARY KEY,
    at timestamptz NOT NULL,
    chains integer NOT NULL CHECK (chains >= 0),
    previous_hash text NOT NULL CHECK (length(previous_hash) = 64),
    hash text NOT NULL UNIQUE CHECK (length(hash) = 64)
  );
  CREATE TABLE ledger_anchor_heads (
    day date NOT NULL REFERENCES ledger_anchors (day) DEFERRABLE INITIALLY DEFERRED,
    scope text NOT NULL,
    sequence integer NOT NULL CHECK (sequence >= 0),
    hash text NOT NULL CHECK (length(hash) = 64),
    PRIMARY KEY (scope, day)
  );
  CREATE INDEX ledger_anchor_heads_day ON ledger_anchor_heads (day);

  CREATE TRIGGER ledger_append_only BEFORE UPDATE OR DELETE OR TRUNCATE ON ledger_anchors
    FOR EACH STATEMENT EXECUTE FUNCTION ledger_append_only();
  CREATE TRIGGER ledger_append_only BEFORE UPDATE OR DELETE OR TRUNCATE ON ledger_anchor_heads
    FOR EACH STATEMENT EXECUTE FUNCTION ledger_append_only();
  `,
  `DROP TABLE ledger_anchor_heads, ledger_anchors;`,
);
