import { DataTypes } from 'sequelize';
import type {
  CreationOptional,
  InferAttributes,
  InferCreationAttributes,
  Model,
  ModelStatic,
  Sequelize,
} from 'sequelize';

/** One reset mail: opens once, until it expires. Only the SHA-256 of its token is stored. */
export interface PasswordReset extends Model<
  InferAttributes<PasswordReset>,
  InferCreationAttributes<PasswordReset>
> {
  id: CreationOptional<string>;
  userId: string;
  tokenHash: string;
  expiresAt: Date;
  usedAt: CreationOptional<Date | null>;
  createdAt: CreationOptional<Date>;
}

export function definePasswordReset(sequelize: Sequelize): ModelStatic<PasswordReset> {
  return sequelize.define<PasswordReset>(
    'PasswordReset',
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      userId: { type: DataTypes.UUID, allowNull: false },
      tokenHash: { type: DataTypes.TEXT, allowNull: false },
      expiresAt: { type: DataTypes.DATE, allowNull: false },
      usedAt: DataTypes.DATE,
      createdAt: DataTypes.DATE,
    },
    { tableName: 'password_resets', updatedAt: false },
  );
}
