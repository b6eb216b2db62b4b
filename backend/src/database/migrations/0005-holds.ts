import { sqlMigration } from './migration.js';

export const holds = sqlMigration(
  '0005-holds',
  `
  CREATE TABLE holds (
    id uuid PRIMARY KEY,
    client_id uuid NOT NULL UNIQUE,
    lot_id uuid NOT NULL REFERENCES lots (id),
    unit_number integer NOT NULL,
    stage_code text NOT NULL,
    system text NOT NULL CHECK (system IN ('dwv', 'water')),
    ordinal integer NOT NULL CHECK (ordinal > 0),
    plumber_id uuid NOT NULL REFERENCES organizations (id),
    method text NOT NULL CHECK (method IN ('stack-to-roof', 'attic-cut', 'laundry-box', 'laundry-riser', 'standpipe', 'sectional', 'air', 'gauge')),
    medium text NOT NULL CHECK (medium IN ('water', 'water-topped-with-air', 'air')),
    gauge jsonb,
    tape jsonb,
    fill_level_ft double precision,
    minimum_psi double precision CHECK (minimum_psi > 0),
    ceiling_psi double precision CHECK (ceiling_psi > 0),
    settle_minutes integer NOT NULL DEFAULT 0 CHECK (settle_minutes >= 0),
    state text NOT NULL CHECK (state IN ('standing', 'ended')),
    supersedes_id uuid REFERENCES holds (id),
    started_by uuid NOT NULL REFERENCES persons (id),
    started_at timestamptz NOT NULL,
    received_at timestamptz NOT NULL,
    ended_by uuid REFERENCES persons (id),
    ended_at timestamptz,
    end_reason text CHECK (end_reason IN ('taken-down', 'lost', 'superseded', 'handed-over')),
    end_note text,
    FOREIGN KEY (lot_id, unit_number) REFERENCES lot_units (lot_id, number),
    UNIQUE (lot_id, unit_number, stage_code, system, ordinal),
    CHECK ((state = 'ended') = (ended_at IS NOT NULL AND end_reason IS NOT NULL)),
    CHECK ((system = 'water') = (method = 'gauge'))
  );
  CREATE UNIQUE INDEX holds_one_standing ON holds (lot_id, unit_number, stage_code, system) WHERE state = 'standing';
  CREATE INDEX holds_plumber ON holds (plumber_id);

  CREATE TABLE readings (
    id uuid PRIMARY KEY,
    client_id uuid NOT NULL UNIQUE,
    hold_id uuid NOT NULL REFERENCES holds (id),
    -- when it was made by the phone's clock, corrected; and when it reached us
    made_at timestamptz NOT NULL,
    received_at timestamptz NOT NULL,
    pressure_psi double precision CHECK (pressure_psi >= 0),
    level_in double precision CHECK (level_in >= 0),
    temperature_f double precision CHECK (temperature_f > -459.67),
    gauge_valve text CHECK (gauge_valve IN ('open', 'shut')),
    note text,
    by_person uuid NOT NULL REFERENCES persons (id),
    by_role text NOT NULL CHECK (by_role IN ('plumber', 'helper', 'superintendent', 'inspector')),
    struck_at timestamptz,
    struck_by uuid REFERENCES persons (id),
    struck_why text,
    CHECK (num_nonnulls(pressure_psi, level_in) = 1),
    CHECK ((pressure_psi IS NULL) = (gauge_valve IS NULL)),
    CHECK ((struck_at IS NULL) = (struck_why IS NULL))
  );
  CREATE INDEX readings_hold ON readings (hold_id, made_at);

  -- Readings are never edited: struck with a reason, once, and kept.
  CREATE FUNCTION readings_guard() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    IF TG_OP = 'DELETE' THEN
      RAISE EXCEPTION 'a reading is kept' USING ERRCODE = 'integrity_constraint_violation';
    END IF;
    IF OLD.struck_at IS NOT NULL OR NEW.struck_at IS NULL OR
      ROW (NEW.id, NEW.client_id, NEW.hold_id, NEW.made_at, NEW.received_at, NEW.pressure_psi, NEW.level_in, NEW.temperature_f,
           NEW.gauge_valve, NEW.note, NEW.by_person, NEW.by_role)
      IS DISTINCT FROM
      ROW (OLD.id, OLD.client_id, OLD.hold_id, OLD.made_at, OLD.received_at, OLD.pressure_psi, OLD.level_in, OLD.temperature_f,
           OLD.gauge_valve, OLD.note, OLD.by_person, OLD.by_role) THEN
      RAISE EXCEPTION 'a reading is never edited, only struck' USING ERRCODE = 'integrity_constraint_violation';
    END IF;
    RETURN NEW;
  END $$;
  CREATE TRIGGER readings_guard BEFORE UPDATE OR DELETE ON readings FOR EACH ROW EXECUTE FUNCTION readings_guard();

  CREATE TABLE test_ups (
    id uuid PRIMARY KEY,
    client_id uuid NOT NULL UNIQUE,
    visit_id uuid NOT NULL REFERENCES visits (id),
    said_by uuid NOT NULL REFERENCES persons (id),
    said_at timestamptz NOT NULL,
    received_at timestamptz NOT NULL,
    -- the last counted reading of every required system at that moment
    reading_ids uuid[] NOT NULL CHECK (cardinality(reading_ids) > 0),
    ended_at timestamptz,
    ended_by uuid REFERENCES persons (id),
    end_note text
  );
  CREATE UNIQUE INDEX test_ups_one_standing ON test_ups (visit_id) WHERE ended_at IS NULL;
  `,
  `DROP TABLE test_ups, readings, holds; DROP FUNCTION readings_guard();`,
);
