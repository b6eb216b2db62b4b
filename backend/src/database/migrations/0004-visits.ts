import { sqlMigration } from './migration.js';

export const visits = sqlMigration(
  '0004-visits',
  `
  CREATE TABLE visits (
    id uuid PRIMARY KEY,
    lot_id uuid NOT NULL REFERENCES lots (id),
    department_id uuid NOT NULL REFERENCES departments (id),
    rule_card_id uuid NOT NULL REFERENCES rule_cards (id),
    stage_code text NOT NULL,
    unit_numbers integer[] NOT NULL CHECK (cardinality(unit_numbers) > 0),
    state text NOT NULL CHECK (state IN ('requested', 'booked', 'ready', 'underway', 'closed', 'declined', 'withdrawn', 'freed')),
    version integer NOT NULL DEFAULT 0,
    window_date date NOT NULL,
    window_label text NOT NULL,
    "window" tstzrange NOT NULL,
    -- place in the window, 1 to its room; held while the visit is planned
    place integer CHECK (place > 0),
    inspector_id uuid REFERENCES persons (id),
    planned tstzrange,
    requested_by uuid NOT NULL REFERENCES persons (id),
    requesting_side text NOT NULL CHECK (requesting_side IN ('builder', 'plumber', 'desk')),
    caller_name text,
    requested_at timestamptz NOT NULL,
    needed_by timestamptz,
    note text,
    has_first_place boolean NOT NULL DEFAULT false,
    is_retest boolean NOT NULL DEFAULT false,
    ready_at timestamptz,
    begun_at timestamptz,
    begun_by uuid REFERENCES persons (id),
    begun_from text CHECK (begun_from IN ('booked', 'ready')),
    ended_at timestamptz,
    end_reason text,
    end_note text,
    calendar_uid uuid NOT NULL UNIQUE,
    calendar_sequence integer NOT NULL DEFAULT 0 CHECK (calendar_sequence >= 0),
    created_at timestamptz NOT NULL,
    CHECK (NOT isempty("window")),
    -- every booked visit has an inspector, a planned span and a place
    CONSTRAINT visits_planned_whole CHECK (state NOT IN ('booked', 'ready', 'underway')
      OR (inspector_id IS NOT NULL AND planned IS NOT NULL AND place IS NOT NULL)),
    CONSTRAINT visits_underway_begun CHECK (state <> 'underway' OR (begun_at IS NOT NULL AND begun_from IS NOT NULL)),
    -- planned spans of one inspector never overlap
    CONSTRAINT visits_inspector_once EXCLUDE USING gist (inspector_id WITH =, planned WITH &&)
      WHERE (state IN ('booked', 'ready', 'underway')) DEFERRABLE INITIALLY IMMEDIATE,
    -- one open visit per lot, unit set and stage: no unit stands in two
    CONSTRAINT visits_one_open EXCLUDE USING gist (lot_id WITH =, stage_code WITH =, unit_numbers gist__int_ops WITH &&)
      WHERE (state IN ('requested', 'booked', 'ready', 'underway'))
  );
  -- the last room of a window is taken once
  CREATE UNIQUE INDEX visits_one_place ON visits (department_id, window_date, window_label, place)
    WHERE state IN ('booked', 'ready', 'underway');
  CREATE INDEX visits_lot ON visits (lot_id, requested_at);
  CREATE INDEX visits_department_day ON visits (department_id, window_date);
  CREATE INDEX visits_inspector_day ON visits (inspector_id, window_date);
  CREATE INDEX visits_requests ON visits (department_id, requested_at) WHERE state = 'requested';

  -- The calendar SEQUENCE never goes back and the calendar identity never changes (RFC 5546 2.1.4).
  CREATE FUNCTION visits_calendar_guard() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    IF NEW.calendar_uid <> OLD.calendar_uid OR NEW.calendar_sequence < OLD.calendar_sequence THEN
      RAISE EXCEPTION 'a calendar entry keeps its uid and its sequence never goes back' USING ERRCODE = 'integrity_constraint_violation';
    END IF;
    RETURN NEW;
  END $$;
  CREATE TRIGGER visits_calendar_guard BEFORE UPDATE ON visits FOR EACH ROW EXECUTE FUNCTION visits_calendar_guard();
  `,
  `DROP TABLE visits; DROP FUNCTION visits_calendar_guard();`,
);
