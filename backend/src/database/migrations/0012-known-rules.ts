import { sqlMigration } from './migration.js';

/** Rules the services keep and the database can know as well. A refusal of a trigger bears the name of its rule as a constraint. */
export const knownRules = sqlMigration(
  '0012-known-rules',
  `
  -- A visit that has ended says when; an open one has no end.
  UPDATE visits SET ended_at = NULL WHERE ended_at IS NOT NULL AND state NOT IN ('closed', 'withdrawn', 'declined', 'freed');
  UPDATE visits SET ended_at = upper("window") WHERE ended_at IS NULL AND state IN ('closed', 'withdrawn', 'declined', 'freed');
  ALTER TABLE visits ADD CONSTRAINT visits_ended
    CHECK ((state IN ('closed', 'withdrawn', 'declined', 'freed')) = (ended_at IS NOT NULL));

  -- A place is one of the room its window has by the rule card in force on the day. Told when a place is taken: a version published later
  -- may have less room, and whoever has a place keeps it.
  CREATE FUNCTION visits_place_in_room() RETURNS trigger LANGUAGE plpgsql AS $$
  DECLARE
    room integer;
  BEGIN
    IF NEW.place IS NULL OR (TG_OP = 'UPDATE' AND ROW (NEW.place, NEW.department_id, NEW.window_date, NEW.window_label)
      IS NOT DISTINCT FROM ROW (OLD.place, OLD.department_id, OLD.window_date, OLD.window_label)) THEN
      RETURN NEW;
    END IF;
    SELECT max((w.value ->> 'room')::integer) INTO room
    FROM rule_cards rc CROSS JOIN LATERAL jsonb_array_elements(rc.content -> 'asking' -> 'windows') w
    WHERE rc.department_id = NEW.department_id AND rc.state = 'published' AND rc.effective @> NEW.window_date
      AND w.value ->> 'label' = NEW.window_label;
    IF room IS NULL OR NEW.place > room THEN
      RAISE EXCEPTION 'a place is one of the room of its window'
        USING ERRCODE = 'integrity_constraint_violation', CONSTRAINT = 'visits_place_in_room';
    END IF;
    RETURN NEW;
  END $$;
  CREATE TRIGGER visits_place_in_room BEFORE INSERT OR UPDATE OF place, department_id, window_date, window_label ON visits
    FOR EACH ROW EXECUTE FUNCTION visits_place_in_room();

  -- A visit is for a stage its rule card knows.
  CREATE FUNCTION visits_stage_of_card() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    IF NOT EXISTS (SELECT 1 FROM rule_cards rc CROSS JOIN LATERAL jsonb_array_elements(rc.content -> 'stages') s
      WHERE rc.id = NEW.rule_card_id AND s.value ->> 'code' = NEW.stage_code) THEN
      RAISE EXCEPTION 'a visit is for a stage of its rule card'
        USING ERRCODE = 'integrity_constraint_violation', CONSTRAINT = 'visits_stage_of_card';
    END IF;
    RETURN NEW;
  END $$;
  CREATE TRIGGER visits_stage_of_card BEFORE INSERT OR UPDATE OF stage_code, rule_card_id ON visits
    FOR EACH ROW EXECUTE FUNCTION visits_stage_of_card();

  -- A correction is of the stage of its visit, and at a point that stage has, where it names one.
  CREATE FUNCTION corrections_point_of_stage() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    IF NEW.point_code IS NOT NULL AND NOT EXISTS (
      SELECT 1 FROM visits v JOIN rule_cards rc ON rc.id = v.rule_card_id
        CROSS JOIN LATERAL jsonb_array_elements(rc.content -> 'stages') s CROSS JOIN LATERAL jsonb_array_elements(s.value -> 'work') p
      WHERE v.id = NEW.visit_id AND s.value ->> 'code' = v.stage_code AND p.value ->> 'code' = NEW.point_code) THEN
      RAISE EXCEPTION 'a correction names a point of its visit''s stage'
        USING ERRCODE = 'integrity_constraint_violation', CONSTRAINT = 'corrections_point_of_stage';
    END IF;
    RETURN NEW;
  END $$;
  CREATE TRIGGER corrections_point_of_stage BEFORE INSERT OR UPDATE OF point_code, visit_id ON corrections
    FOR EACH ROW EXECUTE FUNCTION corrections_point_of_stage();
  ALTER TABLE visits ADD CONSTRAINT visits_of_stage UNIQUE (id, stage_code);
  ALTER TABLE corrections ADD CONSTRAINT corrections_own_stage FOREIGN KEY (visit_id, stage_code) REFERENCES visits (id, stage_code);

  -- Every party is of its kind: builders build, plumbers plumb, departments inspect. The kind stands beside the key that names it.
  ALTER TABLE organizations ADD CONSTRAINT organizations_of_kind UNIQUE (id, kind);
  ALTER TABLE departments ADD COLUMN kind text NOT NULL GENERATED ALWAYS AS ('department') STORED,
    ADD CONSTRAINT departments_kind FOREIGN KEY (id, kind) REFERENCES organizations (id, kind);
  ALTER TABLE tracts ADD COLUMN builder_kind text NOT NULL GENERATED ALWAYS AS ('builder') STORED,
    ADD CONSTRAINT tracts_builder_kind FOREIGN KEY (builder_id, builder_kind) REFERENCES organizations (id, kind);
  ALTER TABLE lots ADD COLUMN builder_kind text NOT NULL GENERATED ALWAYS AS ('builder') STORED,
    ADD COLUMN plumber_kind text NOT NULL GENERATED ALWAYS AS ('plumber') STORED,
    ADD CONSTRAINT lots_builder_kind FOREIGN KEY (builder_id, builder_kind) REFERENCES organizations (id, kind),
    ADD CONSTRAINT lots_plumber_kind FOREIGN KEY (plumber_id, plumber_kind) REFERENCES organizations (id, kind);
  ALTER TABLE lot_consents ADD CONSTRAINT lot_consents_kind FOREIGN KEY (organization_id, kind) REFERENCES organizations (id, kind);
  `,
  `
  ALTER TABLE lot_consents DROP CONSTRAINT lot_consents_kind;
  ALTER TABLE lots DROP COLUMN builder_kind, DROP COLUMN plumber_kind;
  ALTER TABLE tracts DROP COLUMN builder_kind;
  ALTER TABLE departments DROP COLUMN kind;
  ALTER TABLE organizations DROP CONSTRAINT organizations_of_kind;
  ALTER TABLE corrections DROP CONSTRAINT corrections_own_stage;
  ALTER TABLE visits DROP CONSTRAINT visits_of_stage;
  DROP TRIGGER corrections_point_of_stage ON corrections;
  DROP TRIGGER visits_stage_of_card ON visits;
  DROP TRIGGER visits_place_in_room ON visits;
  DROP FUNCTION corrections_point_of_stage();
  DROP FUNCTION visits_stage_of_card();
  DROP FUNCTION visits_place_in_room();
  ALTER TABLE visits DROP CONSTRAINT visits_ended;
  `,
);
