import { DataTypes } from 'sequelize';
import type {
  CreationOptional,
  InferAttributes,
  InferCreationAttributes,
  Model,
  ModelStatic,
  Sequelize,
} from 'sequelize';
import type { MaterialContent } from '../../shared/material.ts';

/** The constants of one version. The database refuses to change a row: stored runs rest on it. */
export interface MaterialVersion extends Model<
  InferAttributes<MaterialVersion>,
  InferCreationAttributes<MaterialVersion>
> {
  materialId: string;
  version: number;
  content: MaterialContent;
  /** Null for the shipped library, and when the account is gone. */
  authorId: CreationOptional<string | null>;
  /** The name at that time, which outlives the account; null for the shipped library. */
  authorName: CreationOptional<string | null>;
  /** Why it was made, for those who read the history. */
  note: CreationOptional<string>;
  createdAt: CreationOptional<Date>;
}

export function defineMaterialVersion(sequelize: Sequelize): ModelStatic<MaterialVersion> {
  return sequelize.define<MaterialVersion>(
    'MaterialVersion',
    {
      materialId: { type: DataTypes.TEXT, primaryKey: true },
      version: { type: DataTypes.INTEGER, primaryKey: true },
      content: { type: DataTypes.JSONB, allowNull: false },
      authorId: DataTypes.UUID,
      authorName: DataTypes.TEXT,
      note: { type: DataTypes.TEXT, allowNull: false, defaultValue: '' },
      createdAt: DataTypes.DATE,
    },
    { tableName: 'material_versions', updatedAt: false },
  );
}
