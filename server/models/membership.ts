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
import type { Role } from '../../shared/account.ts';
import type { Group } from './group.ts';
import type { User } from './user.ts';

/** One person's role in one group. */
export interface Membership extends Model<InferAttributes<Membership>, InferCreationAttributes<Membership>> {
  userId: string;
  groupId: string;
  role: Role;
  createdAt: CreationOptional<Date>;
  /** Present when the query included it. */
  user?: NonAttribute<User>;
  group?: NonAttribute<Group>;
}

export function defineMembership(sequelize: Sequelize): ModelStatic<Membership> {
  return sequelize.define<Membership>(
    'Membership',
    {
      userId: { type: DataTypes.UUID, primaryKey: true },
      groupId: { type: DataTypes.UUID, primaryKey: true },
      role: { type: DataTypes.TEXT, allowNull: false },
      createdAt: DataTypes.DATE,
    },
    { tableName: 'memberships', updatedAt: false },
  );
}
