import { sqlMigration } from './migration.js';

export const handovers = sqlMigration(
  '0014-handovers',
  `
  -- An asking to take the place of another: the one replaced stays until the one asked agrees.
  ALTER TABLE lot_consents
    ADD COLUMN replaces_id uuid REFERENCES organizations (id),
    ADD CONSTRAINT lot_consents_replaces CHECK (replaces_id IS NULL OR (replaces_id <> organization_id AND kind <> 'department'));

  -- Who was on a lot until it was handed over. They read what there was until then, under the name the lot had then, and nothing later.
  CREATE TABLE lot_past_parties (
    id uuid PRIMARY KEY,
    lot_id uuid NOT NULL REFERENCES lots (id),
    kind text NOT NULL CHECK (kind IN ('builder', 'plumber')),
    organization_id uuid NOT NULL REFERENCES organizations (id),
    replaced_by_id uuid NOT NULL REFERENCES organizations (id),
    until timestamptz NOT NULL,
    -- the last entry of the lot's ledger they may read
    until_sequence integer NOT NULL CHECK (until_sequence > 0),
    lot_number text NOT NULL,
    tract_name text,
    address text NOT NULL,
    CHECK (organization_id <> replaced_by_id)
  );
  CREATE INDEX lot_past_parties_organization ON lot_past_parties (organization_id, until);
  CREATE INDEX lot_past_parties_lot ON lot_past_parties (lot_id);
  `,
  `
  DROP TABLE lot_past_parties;
  ALTER TABLE lot_consents DROP CONSTRAINT lot_consents_replaces, DROP COLUMN replaces_id;
  `,
);
