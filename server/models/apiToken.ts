import { DataTypes } from 'sequelize';
import type {
  CreationOptional,
  InferAttributes,
  InferCreationAttributes,
  Model,
  ModelStatic,
  Sequelize,
} from 'sequelize';

/** A person's key for scripts. Only its SHA-256 is stored. */
export interface ApiToken extends Model<InferAttributes<ApiToken>, InferCreationAttributes<ApiToken>> {
  id: CreationOptional<string>;
  userId: string;
  name: string;
  tokenHash: string;
  lastUsedAt: CreationOptional<Date | null>;
  createdAt: CreationOptional<Date>;
}

export function defineApiToken(sequelize: Sequelize): ModelStatic<ApiToken> {
  return sequelize.define<ApiToken>(
    'ApiToken',
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      userId: { type: DataTypes.UUID, allowNull: false },
      name: { type: DataTypes.TEXT, allowNull: false },
      tokenHash: { type: DataTypes.TEXT, allowNull: false },
      lastUsedAt: DataTypes.DATE,
      createdAt: DataTypes.DATE,
    },
    { tableName: 'api_tokens', updatedAt: false },
  );
}
