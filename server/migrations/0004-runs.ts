import type { Migration } from './migration.ts';

export const runs: Migration = {
  name: '0004-runs',
  up: `
    CREATE TABLE runs (
      id uuid PRIMARY KEY DEFAULT gen_random_uuid(),
      group_id uuid NOT NULL REFERENCES groups ON DELETE CASCADE,
      stack_id uuid REFERENCES stacks ON DELETE SET NULL,
      stack_version integer,
      stack_name text,
      name text NOT NULL,
      created_by_id uuid REFERENCES users ON DELETE SET NULL,
      input jsonb NOT NULL,
      materials jsonb NOT NULL,
      assumptions jsonb NOT NULL,
      warnings jsonb NOT NULL,
      state text NOT NULL DEFAULT 'queued'
        CHECK (state IN ('queued', 'running', 'done', 'failed', 'cancelled')),
      done integer NOT NULL DEFAULT 0,
      total integer NOT NULL,
      attempts integer NOT NULL DEFAULT 0,
      error text,
      host text,
      heartbeat_at timestamptz,
      solver_version text NOT NULL,
      input_sha256 text NOT NULL,
      compute_seconds double precision,
      started_at timestamptz,
      finished_at timestamptz,
      cancel_requested_at timestamptz,
      is_demo boolean NOT NULL DEFAULT false,
      created_at timestamptz NOT NULL DEFAULT now(),
      updated_at timestamptz NOT NULL DEFAULT now()
    );
    CREATE INDEX runs_group ON runs (group_id, created_at DESC);
    CREATE INDEX runs_stack ON runs (stack_id);
    CREATE INDEX runs_created_by ON runs (created_by_id);
    CREATE INDEX runs_unfinished ON runs (heartbeat_at) WHERE state IN ('queued', 'running');
    CREATE TABLE run_chunks (
      run_id uuid NOT NULL REFERENCES runs ON DELETE CASCADE,
      position integer NOT NULL CHECK (position >= 0),
      bytes bytea NOT NULL CHECK (octet_length(bytes) <= 4194304),
      PRIMARY KEY (run_id, position)
    );
    -- Float64 numbers hardly compress; storing them plain saves the attempt.
    ALTER TABLE run_chunks ALTER COLUMN bytes SET STORAGE EXTERNAL;
  `,
  down: `
    DROP TABLE run_chunks;
    DROP TABLE runs;
  `,
};
