import { sqlMigration } from './migration.js';

export const departments = sqlMigration(
  '0002-departments',
  `
  CREATE TABLE departments (
    id uuid PRIMARY KEY REFERENCES organizations (id),
    zone text NOT NULL,
    elevation_ft double precision NOT NULL DEFAULT 0,
    is_outside boolean NOT NULL DEFAULT false
  );

  CREATE TABLE rule_cards (
    id uuid PRIMARY KEY,
    department_id uuid NOT NULL REFERENCES departments (id),
    version integer NOT NULL CHECK (version > 0),
    state text NOT NULL CHECK (state IN ('draft', 'published')),
    content jsonb NOT NULL,
    effective daterange,
    created_by uuid REFERENCES persons (id),
    created_at timestamptz NOT NULL,
    published_by uuid REFERENCES persons (id),
    published_at timestamptz,
    UNIQUE (department_id, version),
    CHECK ((state = 'published') = (effective IS NOT NULL)),
    -- two published versions never rule one day
    CONSTRAINT rule_cards_one_in_force EXCLUDE USING gist (department_id WITH =, effective WITH &&) WHERE (state = 'published')
  );
  CREATE UNIQUE INDEX rule_cards_one_draft ON rule_cards (department_id) WHERE state = 'draft';

  -- A published rule card is never edited: only the day it ends may still be set.
  CREATE FUNCTION rule_cards_guard() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    IF OLD.state = 'published' AND (NEW.state <> 'published' OR NEW.content IS DISTINCT FROM OLD.content
      OR NEW.version <> OLD.version OR lower(NEW.effective) IS DISTINCT FROM lower(OLD.effective)) THEN
      RAISE EXCEPTION 'a published rule card is never edited' USING ERRCODE = 'integrity_constraint_violation';
    END IF;
    RETURN NEW;
  END $$;
  CREATE TRIGGER rule_cards_guard BEFORE UPDATE ON rule_cards FOR EACH ROW EXECUTE FUNCTION rule_cards_guard();

  CREATE TABLE department_closures (
    id uuid PRIMARY KEY,
    department_id uuid NOT NULL REFERENCES departments (id),
    date date NOT NULL,
    from_time time,
    to_time time,
    why text NOT NULL,
    created_by uuid REFERENCES persons (id),
    created_at timestamptz NOT NULL,
    removed_at timestamptz,
    CHECK ((from_time IS NULL) = (to_time IS NULL)),
    CHECK (from_time IS NULL OR to_time > from_time)
  );
  CREATE INDEX department_closures_day ON department_closures (department_id, date) WHERE removed_at IS NULL;

  -- One row a department and day: what a booking locks, so that the last room of a window is taken once.
  CREATE TABLE department_days (
    department_id uuid NOT NULL REFERENCES departments (id),
    date date NOT NULL,
    PRIMARY KEY (department_id, date)
  );
  `,
  `
  DROP TABLE department_days, department_closures, rule_cards, departments;
  DROP FUNCTION rule_cards_guard();
  `,
);
