import { sqlMigration } from './migration.js';

export const plannedHolds = sqlMigration(
  '0019-planned-holds',
  `
  -- The plan a test was started by; none for tests started without one.
  ALTER TABLE holds ADD COLUMN plan_id uuid REFERENCES test_plans (id);
  CREATE INDEX holds_plan ON holds (plan_id) WHERE plan_id IS NOT NULL;
  `,
  `ALTER TABLE holds DROP COLUMN plan_id;`,
);
