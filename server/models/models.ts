import { Sequelize } from 'sequelize';
import { defineActivity } from './activity.ts';
import { defineApiToken } from './apiToken.ts';
import { defineGroup } from './group.ts';
import { defineGrowthCard } from './growthCard.ts';
import { defineMaterial } from './material.ts';
import { defineMaterialImport } from './materialImport.ts';
import { defineMaterialVersion } from './materialVersion.ts';
import { defineMembership } from './membership.ts';
import { definePasswordReset } from './passwordReset.ts';
import { defineRun } from './run.ts';
import { defineRunChunk } from './runChunk.ts';
import { defineShareLink } from './shareLink.ts';
import { defineStack } from './stack.ts';
import { defineStackVersion } from './stackVersion.ts';
import { defineStudy } from './study.ts';
import { defineStudyVersion } from './studyVersion.ts';
import { defineUser } from './user.ts';

export type Models = ReturnType<typeof createModels>;

/**
 * A connection pool to PostgreSQL and the models on it; nothing is global, so that tests and tools can hold several.
 * Connects at the first query. End it with `models.sequelize.close()`.
 */
export function createModels(databaseUrl: string) {
  const sequelize = new Sequelize(databaseUrl, {
    dialect: 'postgres',
    logging: false,
    define: { underscored: true },
    // A request waits at most this long for the database before it is told that the database is away.
    pool: { max: 10, min: 0, acquire: 5_000, idle: 10_000 },
    dialectOptions: { connectionTimeoutMillis: 4_000, keepAlive: true },
  });
  const models = {
    sequelize,
    User: defineUser(sequelize),
    Group: defineGroup(sequelize),
    Membership: defineMembership(sequelize),
    ApiToken: defineApiToken(sequelize),
    PasswordReset: definePasswordReset(sequelize),
    Material: defineMaterial(sequelize),
    MaterialVersion: defineMaterialVersion(sequelize),
    MaterialImport: defineMaterialImport(sequelize),
    Stack: defineStack(sequelize),
    StackVersion: defineStackVersion(sequelize),
    Run: defineRun(sequelize),
    RunChunk: defineRunChunk(sequelize),
    Study: defineStudy(sequelize),
    StudyVersion: defineStudyVersion(sequelize),
    GrowthCard: defineGrowthCard(sequelize),
    ShareLink: defineShareLink(sequelize),
    Activity: defineActivity(sequelize),
  };
  const { User, Group, Membership, Stack, StackVersion, Run, ShareLink } = models;
  const { Study, StudyVersion, GrowthCard } = models;
  User.hasMany(Membership, { as: 'memberships', foreignKey: 'userId' });
  Membership.belongsTo(User, { as: 'user', foreignKey: 'userId' });
  Membership.belongsTo(Group, { as: 'group', foreignKey: 'groupId' });
  Stack.hasMany(StackVersion, { as: 'versions', foreignKey: 'stackId' });
  StackVersion.belongsTo(User, { as: 'author', foreignKey: 'authorId' });
  Study.hasMany(StudyVersion, { as: 'versions', foreignKey: 'studyId' });
  StudyVersion.belongsTo(User, { as: 'author', foreignKey: 'authorId' });
  Run.belongsTo(User, { as: 'createdBy', foreignKey: 'createdById' });
  Run.belongsTo(Group, { as: 'group', foreignKey: 'groupId' });
  ShareLink.belongsTo(User, { as: 'createdBy', foreignKey: 'createdById' });
  ShareLink.belongsTo(Run, { as: 'run', foreignKey: 'runId' });
  ShareLink.belongsTo(Study, { as: 'study', foreignKey: 'studyId' });
  ShareLink.belongsTo(GrowthCard, { as: 'card', foreignKey: 'cardId' });
  return models;
}
