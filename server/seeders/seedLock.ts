import type { Sequelize } from 'sequelize';

/** Any number that nothing else in the database locks. */
const LOCK = 0x5ce1_11a8;

/** Runs the work while no other server on this database seeds: two that start together wait for one another. */
export function withSeedLock<Result>(sequelize: Sequelize, work: () => Promise<Result>): Promise<Result> {
  return sequelize.transaction(async (transaction) => {
    await sequelize.query('SELECT pg_advisory_xact_lock($1)', { bind: [LOCK], transaction });
    return work();
  });
}
