import { sqlMigration } from './migration.js';

export const keptRight = sqlMigration(
  '0013-kept-right',
  `
  -- The visit its deadline had freed though the test was said up in time: this one stands in its stead, once.
  ALTER TABLE visits ADD COLUMN restores_id uuid;
  ALTER TABLE visits ADD CONSTRAINT visits_restores_once UNIQUE (restores_id),
    ADD CONSTRAINT visits_restores_own_lot FOREIGN KEY (restores_id, lot_id) REFERENCES visits (id, lot_id),
    ADD CONSTRAINT visits_restores_another CHECK (restores_id <> id);
  `,
  `ALTER TABLE visits DROP COLUMN restores_id;`,
);
