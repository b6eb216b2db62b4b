import { sqlMigration } from './migration.js';

export const houseModels = sqlMigration(
  '0020-house-models',
  `
  -- A house that a builder saved under a name, to be given to many lots.
  CREATE TABLE house_models (
    id uuid PRIMARY KEY,
    builder_id uuid NOT NULL REFERENCES organizations (id),
    name text NOT NULL CHECK (name <> ''),
    -- the newest
    version integer NOT NULL CHECK (version > 0),
    created_at timestamptz NOT NULL
  );
  CREATE UNIQUE INDEX house_models_name ON house_models (builder_id, lower(name));

  -- Lots rest on the version they were given, so none is ever edited.
  CREATE TABLE house_model_versions (
    model_id uuid NOT NULL REFERENCES house_models (id) ON DELETE CASCADE,
    version integer NOT NULL CHECK (version > 0),
    geometry jsonb NOT NULL,
    made_by uuid NOT NULL REFERENCES persons (id),
    made_at timestamptz NOT NULL,
    PRIMARY KEY (model_id, version)
  );
  CREATE FUNCTION house_model_versions_guard() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    RAISE EXCEPTION 'a version of a house model is never edited' USING ERRCODE = 'integrity_constraint_violation';
  END $$;
  CREATE TRIGGER house_model_versions_guard BEFORE UPDATE ON house_model_versions
    FOR EACH ROW EXECUTE FUNCTION house_model_versions_guard();

  -- The version a unit's house was taken from. What differs from it was changed on the lot.
  ALTER TABLE lot_units
    ADD COLUMN house_model_id uuid,
    ADD COLUMN house_model_version integer,
    ADD CONSTRAINT lot_units_house_model FOREIGN KEY (house_model_id, house_model_version)
      REFERENCES house_model_versions (model_id, version),
    ADD CONSTRAINT lot_units_modelled CHECK (
      (house_model_id IS NULL) = (house_model_version IS NULL) AND (house_model_id IS NULL OR geometry IS NOT NULL)
    );
  CREATE INDEX lot_units_house_model ON lot_units (house_model_id) WHERE house_model_id IS NOT NULL;
  `,
  `
  ALTER TABLE lot_units
    DROP CONSTRAINT lot_units_modelled, DROP CONSTRAINT lot_units_house_model,
    DROP COLUMN house_model_id, DROP COLUMN house_model_version;
  DROP TABLE house_model_versions, house_models;
  DROP FUNCTION house_model_versions_guard();
  `,
);
