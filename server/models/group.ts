import { DataTypes } from 'sequelize';
import type {
  CreationOptional,
  InferAttributes,
  InferCreationAttributes,
  Model,
  ModelStatic,
  Sequelize,
} from 'sequelize';

/** Whoever shares stacks, runs and materials. Every account has a personal one. */
export interface Group extends Model<InferAttributes<Group>, InferCreationAttributes<Group>> {
  id: CreationOptional<string>;
  name: string;
  isPersonal: CreationOptional<boolean>;
  isDemo: CreationOptional<boolean>;
  createdAt: CreationOptional<Date>;
  updatedAt: CreationOptional<Date>;
}

export function defineGroup(sequelize: Sequelize): ModelStatic<Group> {
  return sequelize.define<Group>(
    'Group',
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      name: { type: DataTypes.TEXT, allowNull: false },
      isPersonal: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
      isDemo: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
      createdAt: DataTypes.DATE,
      updatedAt: DataTypes.DATE,
    },
    { tableName: 'groups' },
  );
}
