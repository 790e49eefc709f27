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
import type { StackVersion } from './stackVersion.ts';

/** A stack of a group; the documents are in its versions. */
export interface Stack extends Model<InferAttributes<Stack>, InferCreationAttributes<Stack>> {
  id: CreationOptional<string>;
  groupId: string;
  name: string;
  description: string;
  /** The newest version. */
  version: number;
  isDemo: CreationOptional<boolean>;
  createdAt: CreationOptional<Date>;
  updatedAt: CreationOptional<Date>;
  /** Present when the query included it: `newestVersion` of services/stacks.ts asks for the newest only. */
  versions?: NonAttribute<StackVersion[]>;
}

export function defineStack(sequelize: Sequelize): ModelStatic<Stack> {
  return sequelize.define<Stack>(
    'Stack',
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      groupId: { type: DataTypes.UUID, allowNull: false },
      name: { type: DataTypes.TEXT, allowNull: false },
      description: { type: DataTypes.TEXT, allowNull: false },
      version: { type: DataTypes.INTEGER, allowNull: false },
      isDemo: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
      createdAt: DataTypes.DATE,
      updatedAt: DataTypes.DATE,
    },
    { tableName: 'stacks' },
  );
}
