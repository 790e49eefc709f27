import type { Migration } from './migration.ts';

export const materials: Migration = {
  name: '0002-materials',
  up: `
    CREATE TABLE materials (
      id text PRIMARY KEY,
      group_id uuid REFERENCES groups ON DELETE CASCADE,
      name text NOT NULL,
      formula text NOT NULL,
      class text NOT NULL,
      preferred boolean NOT NULL DEFAULT false,
      notes jsonb NOT NULL DEFAULT '[]',
      version integer NOT NULL CHECK (version >= 1),
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE INDEX materials_group ON materials (group_id);
    CREATE TABLE material_versions (
      material_id text NOT NULL REFERENCES materials ON DELETE CASCADE,
      version integer NOT NULL CHECK (version >= 1),
      content jsonb NOT NULL,
      created_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (material_id, version)
    );
    CREATE FUNCTION refuse_material_version_change() RETURNS trigger LANGUAGE plpgsql AS $$
      BEGIN
        RAISE EXCEPTION 'A version of a material is never changed; add a new version of %', OLD.material_id;
      END
    $$;
    CREATE TRIGGER material_versions_are_immutable BEFORE UPDATE ON material_versions
      FOR EACH ROW EXECUTE FUNCTION refuse_material_version_change();
  `,
  down: `
    DROP TABLE material_versions;
    DROP FUNCTION refuse_material_version_change();
    DROP TABLE materials;
  `,
};
