import { sqlMigration } from './migration.js';

export const notices = sqlMigration(
  '0009-notices',
  `
  -- What happened, written in the transaction of the change itself. Expanded into notices and deliveries afterwards.
  CREATE TABLE outbox_events (
    id uuid PRIMARY KEY,
    position bigserial UNIQUE,
    kind text NOT NULL,
    lot_id uuid REFERENCES lots (id),
    visit_id uuid REFERENCES visits (id),
    actor_id uuid REFERENCES persons (id),
    payload jsonb NOT NULL,
    at timestamptz NOT NULL,
    is_muted boolean NOT NULL DEFAULT false,
    processed_at timestamptz,
    attempts integer NOT NULL DEFAULT 0,
    next_attempt_at timestamptz NOT NULL,
    last_error text
  );
  CREATE INDEX outbox_events_due ON outbox_events (next_attempt_at) WHERE processed_at IS NULL;

  CREATE TABLE notices (
    id uuid PRIMARY KEY,
    event_id uuid NOT NULL REFERENCES outbox_events (id),
    person_id uuid NOT NULL REFERENCES persons (id),
    kind text NOT NULL,
    params jsonb NOT NULL,
    lot_id uuid REFERENCES lots (id),
    visit_id uuid REFERENCES visits (id),
    at timestamptz NOT NULL,
    read_at timestamptz,
    -- one message per notice
    UNIQUE (event_id, person_id)
  );
  CREATE INDEX notices_person ON notices (person_id, at DESC);
  CREATE INDEX notices_unread ON notices (person_id) WHERE read_at IS NULL;

  CREATE TABLE deliveries (
    id uuid PRIMARY KEY,
    event_id uuid NOT NULL REFERENCES outbox_events (id),
    notice_id uuid REFERENCES notices (id),
    person_id uuid REFERENCES persons (id),
    channel text NOT NULL CHECK (channel IN ('email')),
    kind text NOT NULL,
    address text NOT NULL,
    -- kept in order per calendar entry: the visit, or null
    order_key text,
    position bigserial,
    message_id text NOT NULL UNIQUE,
    payload jsonb NOT NULL,
    state text NOT NULL CHECK (state IN ('waiting', 'sent', 'given-up', 'dropped')),
    attempts integer NOT NULL DEFAULT 0,
    next_attempt_at timestamptz NOT NULL,
    claimed_until timestamptz,
    last_error text,
    created_at timestamptz NOT NULL,
    sent_at timestamptz,
    UNIQUE (event_id, address, channel)
  );
  CREATE INDEX deliveries_due ON deliveries (next_attempt_at) WHERE state = 'waiting';
  CREATE INDEX deliveries_order ON deliveries (order_key, position) WHERE state = 'waiting';
  `,
  `DROP TABLE deliveries, notices, outbox_events;`,
);
