import { DataTypes } from 'sequelize';
import type {
  CreationOptional,
  InferAttributes,
  InferCreationAttributes,
  Model,
  ModelStatic,
  Sequelize,
} from 'sequelize';
import type { ImportTable, MaterialImport as PresentedImport } from '../../shared/materialImport.ts';
import type { ExportedMaterial } from '../../worker/import/exportedMaterial.ts';

/** A file of constants as it came, and how it was read. Nobody changes it; what rests on it names it. */
export interface MaterialImport extends Model<
  InferAttributes<MaterialImport>,
  InferCreationAttributes<MaterialImport>
> {
  id: CreationOptional<string>;
  groupId: string;
  createdById: string | null;
  fileName: string;
  sha256: string;
  /** Left out of every query that does not ask for it with the scope `withBytes`; null once the file was refused. */
  bytes: Buffer | null;
  size: number;
  state: CreationOptional<PresentedImport['state']>;
  error: CreationOptional<string | null>;
  tableJson: CreationOptional<ImportTable | null>;
  /** Set for a file that Skewlight exported. */
  exported: CreationOptional<ExportedMaterial | null>;
  /** When a server last began to read it. */
  readingAt: CreationOptional<Date>;
  /** How often one has. */
  attempts: CreationOptional<number>;
  createdAt: CreationOptional<Date>;
}

export function defineMaterialImport(sequelize: Sequelize): ModelStatic<MaterialImport> {
  return sequelize.define<MaterialImport>(
    'MaterialImport',
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      groupId: { type: DataTypes.UUID, allowNull: false },
      createdById: DataTypes.UUID,
      fileName: { type: DataTypes.TEXT, allowNull: false },
      sha256: { type: DataTypes.TEXT, allowNull: false },
      bytes: DataTypes.BLOB,
      size: { type: DataTypes.INTEGER, allowNull: false },
      state: { type: DataTypes.TEXT, allowNull: false, defaultValue: 'reading' },
      error: DataTypes.TEXT,
      tableJson: DataTypes.JSONB,
      exported: DataTypes.JSONB,
      readingAt: DataTypes.DATE,
      attempts: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
      createdAt: DataTypes.DATE,
    },
    {
      tableName: 'material_imports',
      updatedAt: false,
      defaultScope: { attributes: { exclude: ['bytes'] } },
      scopes: { withBytes: {} },
    },
  );
}
