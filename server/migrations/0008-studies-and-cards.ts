import type { Migration } from './migration.ts';

export const studiesAndCards: Migration = {
  name: '0008-studies-and-cards',
  up: `
    CREATE TABLE studies (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      group_id uuid NOT NULL REFERENCES groups ON DELETE CASCADE,
      title text NOT NULL,
      question text NOT NULL,
      version integer NOT NULL CHECK (version >= 1),
      item_count integer NOT NULL,
      decided_by text,
      decided_at timestamptz,
      is_demo boolean NOT NULL DEFAULT false,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now(),
      CHECK ((decided_by IS NULL) = (decided_at IS NULL))
    );
    CREATE INDEX studies_group ON studies (group_id, updated_at DESC);
    CREATE TABLE study_versions (
      study_id uuid NOT NULL REFERENCES studies ON DELETE CASCADE,
      version integer NOT NULL CHECK (version >= 1),
      title text NOT NULL,
      document jsonb NOT NULL,
      -- What differs from the version before, in sentences with the names of that time.
      changes jsonb NOT NULL,
      author_id uuid REFERENCES users ON DELETE SET NULL,
      created_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (study_id, version)
    );
    CREATE INDEX study_versions_author ON study_versions (author_id);
    CREATE TABLE growth_cards (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      group_id uuid NOT NULL REFERENCES groups ON DELETE CASCADE,
      created_by_id uuid REFERENCES users ON DELETE SET NULL,
      study_id uuid REFERENCES studies ON DELETE SET NULL,
      design_id uuid REFERENCES runs ON DELETE SET NULL,
      title text NOT NULL,
      sample_id text NOT NULL,
      decision jsonb NOT NULL,
      -- All else that the page shows.
      content jsonb NOT NULL,
      solver_version text NOT NULL,
      input_sha256 text NOT NULL,
      is_demo boolean NOT NULL DEFAULT false,
      created_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE INDEX growth_cards_group ON growth_cards (group_id, created_at DESC);
    CREATE INDEX growth_cards_created_by ON growth_cards (created_by_id);
    CREATE INDEX growth_cards_study ON growth_cards (study_id);
    CREATE INDEX growth_cards_design ON growth_cards (design_id);
    CREATE FUNCTION refuse_growth_card_change() RETURNS trigger LANGUAGE plpgsql AS $$
      BEGIN
        RAISE EXCEPTION 'growth card % is never changed: make a new one', OLD.id;
      END
    $$;
    CREATE TRIGGER growth_cards_are_immutable
      BEFORE UPDATE OF id, group_id, title, sample_id, decision, content, solver_version, input_sha256, created_at ON growth_cards
      FOR EACH ROW EXECUTE FUNCTION refuse_growth_card_change();
    ALTER TABLE share_links
      ADD COLUMN study_id uuid REFERENCES studies ON DELETE SET NULL,
      ADD COLUMN card_id uuid REFERENCES growth_cards ON DELETE SET NULL;
    CREATE INDEX share_links_study ON share_links (study_id);
    CREATE INDEX share_links_card ON share_links (card_id);
  `,
  down: `
    ALTER TABLE share_links DROP COLUMN card_id, DROP COLUMN study_id;
    DROP TABLE growth_cards;
    DROP FUNCTION refuse_growth_card_change;
    DROP TABLE study_versions;
    DROP TABLE studies;
  `,
};
