import type { Migration } from './migration.ts';

export const materialImports: Migration = {
  name: '0006-material-imports',
  up: `
    ALTER TABLE material_versions
      ADD COLUMN author_id uuid REFERENCES users ON DELETE SET NULL,
      ADD COLUMN author_name text,
      ADD COLUMN note text NOT NULL DEFAULT '';
    CREATE INDEX material_versions_author ON material_versions (author_id);
    -- What an account that goes takes along is its id alone.
    DROP TRIGGER material_versions_are_immutable ON material_versions;
    CREATE TRIGGER material_versions_are_immutable
      BEFORE UPDATE OF material_id, version, content, author_name, note, created_at ON material_versions
      FOR EACH ROW EXECUTE FUNCTION refuse_material_version_change();
    CREATE TABLE material_imports (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      group_id uuid NOT NULL REFERENCES groups ON DELETE CASCADE,
      created_by_id uuid REFERENCES users ON DELETE SET NULL,
      file_name text NOT NULL,
      sha256 text NOT NULL,
      -- Null once the file was refused.
      bytes bytea,
      size integer NOT NULL CHECK (size >= 0),
      state text NOT NULL DEFAULT 'reading' CHECK (state IN ('reading', 'ready', 'refused')),
      error text,
      table_json jsonb,
      exported jsonb,
      -- When a server last began to read it, and how often one has.
      reading_at timestamptz NOT NULL DEFAULT now(),
      attempts integer NOT NULL DEFAULT 0,
      created_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE INDEX material_imports_group ON material_imports (group_id);
    CREATE INDEX material_imports_created_by ON material_imports (created_by_id);
    CREATE INDEX material_imports_age ON material_imports (created_at);
    CREATE INDEX material_imports_unread ON material_imports (reading_at) WHERE state = 'reading';
    -- Which versions rest on an import, and which runs on a material.
    CREATE INDEX material_versions_index_import ON material_versions ((content #>> '{origin,index,importId}'));
    CREATE INDEX material_versions_voigt_import ON material_versions ((content #>> '{origin,voigt,importId}'));
    CREATE INDEX runs_materials ON runs USING gin (materials jsonb_path_ops);
  `,
  down: `
    DROP INDEX runs_materials;
    DROP INDEX material_versions_voigt_import;
    DROP INDEX material_versions_index_import;
    DROP TABLE material_imports;
    DROP TRIGGER material_versions_are_immutable ON material_versions;
    CREATE TRIGGER material_versions_are_immutable BEFORE UPDATE ON material_versions
      FOR EACH ROW EXECUTE FUNCTION refuse_material_version_change();
    ALTER TABLE material_versions DROP COLUMN note, DROP COLUMN author_name, DROP COLUMN author_id;
  `,
};
