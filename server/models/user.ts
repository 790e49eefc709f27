import { DataTypes } from 'sequelize';
import type { Role } from '../../shared/account.ts';
import type {
  CreationOptional,
  InferAttributes,
  InferCreationAttributes,
  Model,
  ModelStatic,
  NonAttribute,
  Sequelize,
} from 'sequelize';

export interface User extends Model<InferAttributes<User>, InferCreationAttributes<User>> {
  id: CreationOptional<string>;
  name: string;
  /** Lower case: one address is one account however it is typed. */
  email: string;
  passwordHash: string;
  /** In every session cookie; raising it ends all sessions of this person. */
  sessionVersion: CreationOptional<number>;
  isSiteAdministrator: CreationOptional<boolean>;
  /** A demo account has a published password and is refused in production. */
  isDemo: CreationOptional<boolean>;
  createdAt: CreationOptional<Date>;
  updatedAt: CreationOptional<Date>;
  /** Its memberships; present when the query included them. */
  memberships?: NonAttribute<{ groupId: string; role: Role }[]>;
}

export function defineUser(sequelize: Sequelize): ModelStatic<User> {
  return sequelize.define<User>(
    'User',
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      name: { type: DataTypes.TEXT, allowNull: false },
      email: { type: DataTypes.TEXT, allowNull: false },
      passwordHash: { type: DataTypes.TEXT, allowNull: false },
      sessionVersion: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 1 },
      isSiteAdministrator: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
      isDemo: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
      createdAt: DataTypes.DATE,
      updatedAt: DataTypes.DATE,
    },
    { tableName: 'users' },
  );
}
