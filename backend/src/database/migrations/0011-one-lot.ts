import { sqlMigration } from './migration.js';

export const oneLot = sqlMigration(
  '0011-one-lot',
  `
  -- A visit is ruled by a card of its own department.
  ALTER TABLE rule_cards ADD CONSTRAINT rule_cards_of_department UNIQUE (id, department_id);
  ALTER TABLE visits ADD CONSTRAINT visits_own_rule_card FOREIGN KEY (rule_card_id, department_id) REFERENCES rule_cards (id, department_id);

  -- A correction lies on the lot of its visit, in a unit the lot has, and says who fixed and who accepted it.
  ALTER TABLE visits ADD CONSTRAINT visits_of_lot UNIQUE (id, lot_id);
  ALTER TABLE corrections
    ADD CONSTRAINT corrections_own_visit FOREIGN KEY (visit_id, lot_id) REFERENCES visits (id, lot_id),
    ADD CONSTRAINT corrections_own_unit FOREIGN KEY (lot_id, unit_number) REFERENCES lot_units (lot_id, number),
    ADD CONSTRAINT corrections_fixed CHECK (state = 'open' OR (fixed_at IS NOT NULL AND fixed_by IS NOT NULL AND fix_note IS NOT NULL)),
    ADD CONSTRAINT corrections_accepted CHECK ((state = 'accepted') = (accepted_by IS NOT NULL));

  -- A reading is of the kind its test is read by: a level for water standing in a drain, else a pressure.
  CREATE FUNCTION readings_fit_test() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    IF NOT EXISTS (SELECT 1 FROM holds h WHERE h.id = NEW.hold_id
      AND (h.system = 'dwv' AND h.medium = 'water') = (NEW.level_in IS NOT NULL)) THEN
      RAISE EXCEPTION 'a reading is of the kind its test is read by' USING ERRCODE = 'integrity_constraint_violation';
    END IF;
    RETURN NEW;
  END $$;
  CREATE TRIGGER readings_fit_test BEFORE INSERT ON readings FOR EACH ROW EXECUTE FUNCTION readings_fit_test();
  `,
  `
  DROP TRIGGER readings_fit_test ON readings;
  DROP FUNCTION readings_fit_test();
  ALTER TABLE corrections DROP CONSTRAINT corrections_own_visit, DROP CONSTRAINT corrections_own_unit,
    DROP CONSTRAINT corrections_fixed, DROP CONSTRAINT corrections_accepted;
  ALTER TABLE visits DROP CONSTRAINT visits_own_rule_card, DROP CONSTRAINT visits_of_lot;
  ALTER TABLE rule_cards DROP CONSTRAINT rule_cards_of_department;
  `,
);
