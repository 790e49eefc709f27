import type { Migration } from './migration.ts';

export const people: Migration = {
  name: '0001-people',
  up: `
    CREATE TABLE users (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      name text NOT NULL,
      email text NOT NULL UNIQUE CHECK (email = lower(email)),
      password_hash text NOT NULL,
      session_version integer NOT NULL DEFAULT 1,
      is_site_administrator boolean NOT NULL DEFAULT false,
      is_demo boolean NOT NULL DEFAULT false,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE TABLE groups (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      name text NOT NULL,
      is_personal boolean NOT NULL DEFAULT false,
      is_demo boolean NOT NULL DEFAULT false,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE TABLE memberships (
      user_id uuid NOT NULL REFERENCES users ON DELETE CASCADE,
      group_id uuid NOT NULL REFERENCES groups ON DELETE CASCADE,
      role text NOT NULL CHECK (role IN ('owner', 'editor', 'viewer')),
      created_at timestamptz NOT NULL DEFAULT now(),
      PRIMARY KEY (user_id, group_id)
    );
    CREATE INDEX memberships_group ON memberships (group_id);
    CREATE TABLE api_tokens (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      user_id uuid NOT NULL REFERENCES users ON DELETE CASCADE,
      name text NOT NULL,
      token_hash text NOT NULL UNIQUE,
      last_used_at timestamptz,
      created_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE INDEX api_tokens_user ON api_tokens (user_id);
    CREATE TABLE password_resets (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      user_id uuid NOT NULL REFERENCES users ON DELETE CASCADE,
      token_hash text NOT NULL UNIQUE,
      expires_at timestamptz NOT NULL,
      used_at timestamptz,
      created_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE INDEX password_resets_user ON password_resets (user_id);
  `,
  down: `
    DROP TABLE password_resets;
    DROP TABLE api_tokens;
    DROP TABLE memberships;
    DROP TABLE groups;
    DROP TABLE users;
  `,
};
