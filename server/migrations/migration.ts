import type { Sequelize, Transaction } from 'sequelize';

/** What a migration works with: everything runs on the one connection that holds the lock. */
export type MigrationContext = { sequelize: Sequelize; transaction: Transaction };

/** One step of the schema. Never edited once it is on main; a later step changes what it made. */
export type Migration = {
  /** Sorts in the order of application, such as "0001-people". */
  name: string;
  /** SQL statements that take the step. */
  up: string;
  /** SQL statements that undo it. */
  down: string;
};
