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
  createdAt: CreationOptional<Date>;
}

export function defineMaterialVersion(sequelize: Sequelize): ModelStatic<MaterialVersion> {
  return sequelize.define<MaterialVersion>(
    'MaterialVersion',
    {
      materialId: { type: DataTypes.TEXT, primaryKey: true },
      version: { type: DataTypes.INTEGER, primaryKey: true },
      content: { type: DataTypes.JSONB, allowNull: false },
      createdAt: DataTypes.DATE,
    },
    { tableName: 'material_versions', updatedAt: false },
  );
}
