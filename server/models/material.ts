import { DataTypes } from 'sequelize';
import type {
  CreationOptional,
  InferAttributes,
  InferCreationAttributes,
  Model,
  ModelStatic,
  Sequelize,
} from 'sequelize';
import type { MaterialClass } from '../../shared/material.ts';

/** What a material is called; its constants are in its versions. */
export interface Material extends Model<InferAttributes<Material>, InferCreationAttributes<Material>> {
  /** Readable, such as "co-johnson"; the id that solve requests name. */
  id: string;
  /** Null for the shipped library, which every group can use. */
  groupId: string | null;
  name: string;
  formula: string;
  class: MaterialClass;
  preferred: boolean;
  notes: string[];
  /** The newest version. */
  version: number;
  createdAt: CreationOptional<Date>;
  updatedAt: CreationOptional<Date>;
}

export function defineMaterial(sequelize: Sequelize): ModelStatic<Material> {
  return sequelize.define<Material>(
    'Material',
    {
      id: { type: DataTypes.TEXT, primaryKey: true },
      groupId: DataTypes.UUID,
      name: { type: DataTypes.TEXT, allowNull: false },
      formula: { type: DataTypes.TEXT, allowNull: false },
      class: { type: DataTypes.TEXT, allowNull: false },
      preferred: { type: DataTypes.BOOLEAN, allowNull: false },
      notes: { type: DataTypes.JSONB, allowNull: false },
      version: { type: DataTypes.INTEGER, allowNull: false },
      createdAt: DataTypes.DATE,
      updatedAt: DataTypes.DATE,
    },
    { tableName: 'materials' },
  );
}
