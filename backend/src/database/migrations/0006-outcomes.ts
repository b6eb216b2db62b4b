import { sqlMigration } from './migration.js';

export const outcomes = sqlMigration(
  '0006-outcomes',
  `
  CREATE TABLE outcomes (
    id uuid PRIMARY KEY,
    client_id uuid NOT NULL UNIQUE,
    visit_id uuid NOT NULL UNIQUE REFERENCES visits (id),
    kind text NOT NULL CHECK (kind IN ('pass', 'fail', 'not-ready', 'no-access')),
    reason text,
    note text,
    made_at timestamptz NOT NULL,
    received_at timestamptz NOT NULL,
    by_person uuid NOT NULL REFERENCES persons (id),
    CHECK ((kind NOT IN ('not-ready', 'no-access')) OR reason IS NOT NULL),
    CHECK (kind <> 'not-ready' OR reason IN ('not-up', 'down-overnight', 'wrong-method', 'covered-early')),
    CHECK (kind <> 'no-access' OR reason IN ('locked', 'site-closed', 'hazard', 'permit-not-on-site')),
    CHECK (kind <> 'pass' OR reason IS NULL)
  );

  CREATE TABLE outcome_systems (
    id uuid PRIMARY KEY,
    outcome_id uuid NOT NULL REFERENCES outcomes (id),
    unit_number integer NOT NULL,
    system text NOT NULL CHECK (system IN ('dwv', 'water')),
    answer text NOT NULL CHECK (answer IN ('pass', 'fail', 'not-seen')),
    needle text CHECK (needle IN ('fell', 'stayed', 'jumped', 'was-open')),
    pressure_psi double precision,
    level_in double precision,
    note text,
    UNIQUE (outcome_id, unit_number, system)
  );

  CREATE TABLE outcome_work (
    id uuid PRIMARY KEY,
    outcome_id uuid NOT NULL REFERENCES outcomes (id),
    point_code text NOT NULL,
    is_looked_at boolean NOT NULL,
    UNIQUE (outcome_id, point_code)
  );

  CREATE TABLE corrections (
    id uuid PRIMARY KEY,
    client_id uuid NOT NULL UNIQUE,
    lot_id uuid NOT NULL REFERENCES lots (id),
    visit_id uuid NOT NULL REFERENCES visits (id),
    unit_number integer NOT NULL,
    stage_code text NOT NULL,
    number integer NOT NULL CHECK (number > 0),
    subject text NOT NULL CHECK (subject IN ('dwv', 'water', 'work')),
    point_code text,
    text text NOT NULL,
    place jsonb NOT NULL,
    floor text,
    room text,
    severity text NOT NULL CHECK (severity IN ('fix-before-cover', 'fix-before-final', 'note')),
    section text,
    state text NOT NULL CHECK (state IN ('open', 'fixed', 'accepted')),
    version integer NOT NULL DEFAULT 0,
    opened_at timestamptz NOT NULL,
    opened_by uuid NOT NULL REFERENCES persons (id),
    fixed_at timestamptz,
    fixed_by uuid REFERENCES persons (id),
    fix_note text,
    reopened_why text,
    accepted_at timestamptz,
    accepted_by uuid REFERENCES persons (id),
    UNIQUE (lot_id, number),
    CHECK (state <> 'fixed' OR fixed_at IS NOT NULL),
    CHECK ((state = 'accepted') = (accepted_at IS NOT NULL))
  );
  CREATE INDEX corrections_visit ON corrections (visit_id);
  CREATE INDEX corrections_open ON corrections (lot_id) WHERE state <> 'accepted';

  -- Plumbing of one lot, unit and stage, computed again whenever a fact below it changes.
  CREATE TABLE clearances (
    lot_id uuid NOT NULL REFERENCES lots (id),
    unit_number integer NOT NULL,
    stage_code text NOT NULL,
    state text NOT NULL CHECK (state IN ('clear', 'put-back-due', 'corrections-open', 'awaiting-visit', 'under-test', 'not-tested')),
    since timestamptz NOT NULL,
    PRIMARY KEY (lot_id, unit_number, stage_code),
    FOREIGN KEY (lot_id, unit_number) REFERENCES lot_units (lot_id, number)
  );
  CREATE INDEX clearances_state ON clearances (stage_code, state);
  `,
  `DROP TABLE clearances, corrections, outcome_work, outcome_systems, outcomes;`,
);
