import type { Migration } from './migration.ts';

export const stacks: Migration = {
  name: '0003-stacks',
  up: `
    CREATE TABLE stacks (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      group_id uuid NOT NULL REFERENCES groups ON DELETE CASCADE,
      name text NOT NULL,
      description text NOT NULL DEFAULT '',
      version integer NOT NULL CHECK (version >= 1),
      is_demo boolean NOT NULL DEFAULT false,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE INDEX stacks_group ON stacks (group_id, updated_at DESC);
    CREATE TABLE stack_versions (
      stack_id uuid NOT NULL REFERENCES stacks ON DELETE CASCADE,
      version integer NOT NULL CHECK (version >= 1),
      name text NOT NULL,
      description text NOT NULL DEFAULT '',
      document jsonb NOT NULL,
      layer_count integer NOT NULL,
      author_id uuid REFERENCES users ON DELETE SET NULL,
      created_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (stack_id, version)
    );
    CREATE INDEX stack_versions_author ON stack_versions (author_id);
  `,
  down: `
    DROP TABLE stack_versions;
    DROP TABLE stacks;
  `,
};
