import { sqlMigration } from './migration.js';

export const ruleCardDrafts = sqlMigration(
  '0018-rule-card-drafts',
  `
  ALTER TABLE rule_cards ADD COLUMN edited_by uuid REFERENCES persons (id), ADD COLUMN edited_at timestamptz,
    ADD CONSTRAINT rule_cards_edited_whole CHECK ((edited_by IS NULL) = (edited_at IS NULL));

  -- A draft may be thrown away; a published version stays for good, since visits are held to it.
  CREATE FUNCTION rule_cards_kept() RETURNS trigger LANGUAGE plpgsql AS $$
  BEGIN
    IF OLD.state = 'published' THEN
      RAISE EXCEPTION 'a published rule card is kept' USING ERRCODE = 'integrity_constraint_violation';
    END IF;
    RETURN OLD;
  END $$;
  CREATE TRIGGER rule_cards_kept BEFORE DELETE ON rule_cards FOR EACH ROW EXECUTE FUNCTION rule_cards_kept();
  `,
  `
  DROP TRIGGER rule_cards_kept ON rule_cards;
  DROP FUNCTION rule_cards_kept();
  ALTER TABLE rule_cards DROP CONSTRAINT rule_cards_edited_whole, DROP COLUMN edited_by, DROP COLUMN edited_at;
  `,
);
