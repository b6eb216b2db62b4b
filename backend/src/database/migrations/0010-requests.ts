import { sqlMigration } from './migration.js';

export const requests = sqlMigration(
  '0010-requests',
  `
  -- The first answer to a write, kept so that a retried request gets it again.
  CREATE TABLE idempotent_answers (
    person_id uuid NOT NULL REFERENCES persons (id),
    route text NOT NULL,
    key text NOT NULL,
    body_hash text NOT NULL,
    answer jsonb,
    created_at timestamptz NOT NULL,
    PRIMARY KEY (person_id, route, key)
  );
  CREATE INDEX idempotent_answers_age ON idempotent_answers (created_at);

  -- Large socket payloads on their way between server processes (@socket.io/postgres-adapter).
  CREATE TABLE socket_io_attachments (
    id bigserial UNIQUE,
    created_at timestamptz DEFAULT now(),
    payload bytea
  );
  `,
  `DROP TABLE socket_io_attachments, idempotent_answers;`,
);
