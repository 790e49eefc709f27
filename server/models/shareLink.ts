import { DataTypes } from 'sequelize';
import type {
  CreationOptional,
  InferAttributes,
  InferCreationAttributes,
  Model,
  ModelStatic,
  NonAttribute,
  Sequelize,
} from 'sequelize';
import type { GrowthCard } from './growthCard.ts';
import type { Run } from './run.ts';
import type { Study } from './study.ts';
import type { User } from './user.ts';

/** A link that opens one run, design, study or growth card without an account. Only the SHA-256 of its token is stored. */
export interface ShareLink extends Model<InferAttributes<ShareLink>, InferCreationAttributes<ShareLink>> {
  id: CreationOptional<string>;
  /** At most one of the three; none once its subject is deleted: the link is revoked with it and keeps answering 410. */
  runId: string | null;
  studyId: CreationOptional<string | null>;
  cardId: CreationOptional<string | null>;
  groupId: string;
  tokenHash: string;
  label: string;
  createdById: string | null;
  expiresAt: Date | null;
  revokedAt: CreationOptional<Date | null>;
  lastUsedAt: CreationOptional<Date | null>;
  useCount: CreationOptional<number>;
  createdAt: CreationOptional<Date>;
  /** Present when the query included it. */
  run?: NonAttribute<Run | null>;
  study?: NonAttribute<Study | null>;
  card?: NonAttribute<GrowthCard | null>;
  createdBy?: NonAttribute<User | null>;
}

export function defineShareLink(sequelize: Sequelize): ModelStatic<ShareLink> {
  return sequelize.define<ShareLink>(
    'ShareLink',
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      runId: DataTypes.UUID,
      studyId: DataTypes.UUID,
      cardId: DataTypes.UUID,
      groupId: { type: DataTypes.UUID, allowNull: false },
      tokenHash: { type: DataTypes.TEXT, allowNull: false },
      label: { type: DataTypes.TEXT, allowNull: false },
      createdById: DataTypes.UUID,
      expiresAt: DataTypes.DATE,
      revokedAt: DataTypes.DATE,
      lastUsedAt: DataTypes.DATE,
      useCount: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
      createdAt: DataTypes.DATE,
    },
    { tableName: 'share_links', updatedAt: false },
  );
}
