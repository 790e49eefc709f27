import { QueryTypes, Sequelize } from 'sequelize';
import { Umzug } from 'umzug';
import { people } from './0001-people.ts';
import { materials } from './0002-materials.ts';
import { stacks } from './0003-stacks.ts';
import { runs } from './0004-runs.ts';
import { linksAndActivity } from './0005-links-and-activity.ts';
import { materialImports } from './0006-material-imports.ts';
import { designs } from './0007-designs.ts';
import { studiesAndCards } from './0008-studies-and-cards.ts';
import type { Migration, MigrationContext } from './migration.ts';

// Named here, not found by a pattern: the bundle has no folder of migrations to look into.
const migrations: Migration[] = [
  people,
  materials,
  stacks,
  runs,
  linksAndActivity,
  materialImports,
  designs,
  studiesAndCards,
];

/** Any number that nothing else in the database locks; servers that start together wait for one another. */
const LOCK = 0x5ce1_11a7;

/**
 * Brings the database to the newest schema, all steps in one transaction under an advisory lock.
 *
 * @returns names of the steps taken
 */
export function migrate(databaseUrl: string): Promise<string[]> {
  return withMigrator(databaseUrl, async (migrator) => (await migrator.up()).map((step) => step.name));
}

/** Takes every step back; the tables and what is in them are gone afterwards. */
export function migrateDown(databaseUrl: string): Promise<string[]> {
  return withMigrator(databaseUrl, async (migrator) =>
    (await migrator.down({ to: 0 })).map((step) => step.name),
  );
}

async function withMigrator<Result>(
  databaseUrl: string,
  work: (migrator: Umzug<MigrationContext>) => Promise<Result>,
): Promise<Result> {
  const sequelize = new Sequelize(databaseUrl, { dialect: 'postgres', logging: false, pool: { max: 1 } });
  try {
    return await sequelize.transaction(async (transaction) => {
      await sequelize.query('SELECT pg_advisory_xact_lock($1)', { bind: [LOCK], transaction });
      await sequelize.query(
        'CREATE TABLE IF NOT EXISTS schema_migrations (name text PRIMARY KEY, applied_at timestamptz NOT NULL DEFAULT now())',
        { transaction },
      );
      return work(createMigrator({ sequelize, transaction }));
    });
  } finally {
    await sequelize.close();
  }
}

function createMigrator(context: MigrationContext): Umzug<MigrationContext> {
  const { sequelize, transaction } = context;
  return new Umzug<MigrationContext>({
    context,
    logger: undefined,
    migrations: migrations.map(({ name, up, down }) => ({
      name,
      up: () => sequelize.query(up, { transaction }),
      down: () => sequelize.query(down, { transaction }),
    })),
    storage: {
      async executed() {
        const rows = await sequelize.query<{ name: string }>(
          'SELECT name FROM schema_migrations ORDER BY name',
          {
            type: QueryTypes.SELECT,
            transaction,
          },
        );
        return rows.map((row) => row.name);
      },
      async logMigration({ name }) {
        await sequelize.query('INSERT INTO schema_migrations (name) VALUES ($1)', {
          bind: [name],
          transaction,
        });
      },
      async unlogMigration({ name }) {
        await sequelize.query('DELETE FROM schema_migrations WHERE name = $1', { bind: [name], transaction });
      },
    },
  });
}
