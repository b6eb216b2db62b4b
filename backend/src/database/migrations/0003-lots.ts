import { sqlMigration } from './migration.js';

export const lots = sqlMigration(
  '0003-lots',
  `
  CREATE TABLE tracts (
    id uuid PRIMARY KEY,
    builder_id uuid NOT NULL REFERENCES organizations (id),
    name text NOT NULL,
    plat jsonb,
    created_at timestamptz NOT NULL,
    UNIQUE (builder_id, name)
  );

  CREATE TABLE lots (
    id uuid PRIMARY KEY,
    builder_id uuid NOT NULL REFERENCES organizations (id),
    plumber_id uuid REFERENCES organizations (id),
    department_id uuid REFERENCES departments (id),
    tract_id uuid REFERENCES tracts (id),
    number text NOT NULL,
    address text NOT NULL,
    latitude double precision CHECK (latitude BETWEEN -90 AND 90),
    longitude double precision CHECK (longitude BETWEEN -180 AND 180),
    permit_number text,
    permit_status text NOT NULL DEFAULT 'not-applied' CHECK (permit_status IN ('not-applied', 'applied', 'issued', 'expired')),
    permit_holder text,
    may_plumber_request boolean NOT NULL DEFAULT false,
    cover_date date,
    gate_code text,
    contact_name text,
    contact_phone text,
    hazards text,
    created_at timestamptz NOT NULL,
    CHECK ((latitude IS NULL) = (longitude IS NULL))
  );
  CREATE UNIQUE INDEX lots_number_in_tract ON lots (tract_id, number) WHERE tract_id IS NOT NULL;
  CREATE UNIQUE INDEX lots_address_without_tract ON lots (builder_id, address) WHERE tract_id IS NULL;
  CREATE INDEX lots_builder ON lots (builder_id);
  CREATE INDEX lots_plumber ON lots (plumber_id);
  CREATE INDEX lots_department ON lots (department_id);
  CREATE INDEX lots_permit ON lots (lower(permit_number) text_pattern_ops);
  CREATE INDEX lots_address ON lots (lower(address) text_pattern_ops);

  CREATE TABLE lot_units (
    id uuid PRIMARY KEY,
    lot_id uuid NOT NULL REFERENCES lots (id),
    number integer NOT NULL CHECK (number BETWEEN 1 AND 12),
    label text NOT NULL,
    geometry jsonb,
    UNIQUE (lot_id, number)
  );

  -- A party is attached only with its consent; an attached one stands on the lot itself (lots.plumber_id, lots.department_id).
  CREATE TABLE lot_consents (
    id uuid PRIMARY KEY,
    lot_id uuid NOT NULL REFERENCES lots (id),
    kind text NOT NULL CHECK (kind IN ('builder', 'plumber', 'department')),
    organization_id uuid NOT NULL REFERENCES organizations (id),
    asked_by uuid REFERENCES persons (id),
    asked_at timestamptz NOT NULL,
    answered_by uuid REFERENCES persons (id),
    answered_at timestamptz,
    is_joining boolean,
    why text,
    CHECK ((answered_at IS NULL) = (is_joining IS NULL))
  );
  CREATE UNIQUE INDEX lot_consents_one_open ON lot_consents (lot_id, kind) WHERE answered_at IS NULL;
  CREATE INDEX lot_consents_organization ON lot_consents (organization_id) WHERE answered_at IS NULL;
  `,
  `DROP TABLE lot_consents, lot_units, lots, tracts;`,
);
