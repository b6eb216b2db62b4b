import { sqlMigration } from './migration.js';

export const testPlans = sqlMigration(
  '0017-test-plans',
  `
  -- The method chosen for a unit, stage and system, with what was worked out and told then.
  CREATE TABLE test_plans (
    id uuid PRIMARY KEY,
    client_id uuid NOT NULL UNIQUE,
    lot_id uuid NOT NULL REFERENCES lots (id),
    unit_number integer NOT NULL,
    stage_code text NOT NULL,
    system text NOT NULL CHECK (system IN ('dwv', 'water')),
    method text NOT NULL CHECK (method IN ('stack-to-roof', 'attic-cut', 'laundry-box', 'laundry-riser', 'standpipe', 'sectional', 'air', 'gauge')),
    medium text NOT NULL CHECK (medium IN ('water', 'water-topped-with-air', 'air')),
    tools jsonb NOT NULL,
    rule_card_id uuid NOT NULL REFERENCES rule_cards (id),
    geometry jsonb NOT NULL,
    geometry_digest text NOT NULL CHECK (geometry_digest ~ '^[0-9a-f]{64}$'),
    is_groundwork boolean NOT NULL,
    -- the answer of the computation, unrounded, as it was told
    answer jsonb NOT NULL,
    chosen_by uuid NOT NULL REFERENCES persons (id),
    chosen_at timestamptz NOT NULL,
    received_at timestamptz NOT NULL,
    superseded_at timestamptz,
    FOREIGN KEY (lot_id, unit_number) REFERENCES lot_units (lot_id, number),
    CHECK ((system = 'water') = (method = 'gauge'))
  );
  CREATE UNIQUE INDEX test_plans_one_current ON test_plans (lot_id, unit_number, stage_code, system) WHERE superseded_at IS NULL;
  CREATE INDEX test_plans_part ON test_plans (lot_id, unit_number, stage_code, system, received_at);

  -- A plan is never edited: superseded once, and kept.
  CREATE FUNCTION test_plans_guard() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    IF TG_OP = 'DELETE' THEN
      RAISE EXCEPTION 'a test plan is kept' USING ERRCODE = 'integrity_constraint_violation';
    END IF;
    IF OLD.superseded_at IS NOT NULL OR NEW.superseded_at IS NULL OR
      to_jsonb(NEW) - 'superseded_at' IS DISTINCT FROM to_jsonb(OLD) - 'superseded_at' THEN
      RAISE EXCEPTION 'a test plan is never edited, only superseded' USING ERRCODE = 'integrity_constraint_violation';
    END IF;
    RETURN NEW;
  END $$;
  CREATE TRIGGER test_plans_guard BEFORE UPDATE OR DELETE ON test_plans FOR EACH ROW EXECUTE FUNCTION test_plans_guard();
  `,
  `DROP TABLE test_plans; DROP FUNCTION test_plans_guard();`,
);
