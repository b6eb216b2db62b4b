import { sqlMigration } from './migration.js';

export const threads = sqlMigration(
  '0007-threads',
  `
  CREATE TABLE comments (
    id uuid PRIMARY KEY,
    client_id uuid NOT NULL UNIQUE,
    lot_id uuid NOT NULL REFERENCES lots (id),
    text text NOT NULL CHECK (length(text) BETWEEN 1 AND 4000),
    on_kind text CHECK (on_kind IN ('visit', 'correction', 'hold')),
    on_id uuid,
    author_id uuid NOT NULL REFERENCES persons (id),
    author_role text,
    made_at timestamptz NOT NULL,
    received_at timestamptz NOT NULL,
    CHECK ((on_kind IS NULL) = (on_id IS NULL))
  );
  CREATE INDEX comments_lot ON comments (lot_id, made_at, id);
  `,
  `DROP TABLE comments;`,
);
