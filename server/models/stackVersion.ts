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
import type { StackDocument } from '../../shared/stack.ts';
import type { User } from './user.ts';

/** What one save of a stack wrote, and who saved it. */
export interface StackVersion extends Model<
  InferAttributes<StackVersion>,
  InferCreationAttributes<StackVersion>
> {
  stackId: string;
  version: number;
  name: string;
  description: string;
  document: StackDocument;
  /** Layers after blocks are expanded. */
  layerCount: number;
  /** Null when the account is gone. */
  authorId: string | null;
  createdAt: CreationOptional<Date>;
  /** Present when the query included it. */
  author?: NonAttribute<User | null>;
}

export function defineStackVersion(sequelize: Sequelize): ModelStatic<StackVersion> {
  return sequelize.define<StackVersion>(
    'StackVersion',
    {
      stackId: { type: DataTypes.UUID, primaryKey: true },
      version: { type: DataTypes.INTEGER, primaryKey: true },
      name: { type: DataTypes.TEXT, allowNull: false },
      description: { type: DataTypes.TEXT, allowNull: false },
      document: { type: DataTypes.JSONB, allowNull: false },
      layerCount: { type: DataTypes.INTEGER, allowNull: false },
      authorId: DataTypes.UUID,
      createdAt: DataTypes.DATE,
    },
    { tableName: 'stack_versions', updatedAt: false },
  );
}
