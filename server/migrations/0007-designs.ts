import type { Migration } from './migration.ts';

/** A design question is a run of another kind: it waits, is computed, shared and deleted like any other. */
export const designs: Migration = {
  name: '0007-designs',
  up: `
    ALTER TABLE runs ADD COLUMN kind text NOT NULL DEFAULT 'sweep'
      CHECK (kind IN ('sweep', 'cap', 'optimise', 'tolerance'));
  `,
  down: `
    -- Without the column they would pass for sweeps.
    DELETE FROM runs WHERE kind <> 'sweep';
    ALTER TABLE runs DROP COLUMN kind;
  `,
};
