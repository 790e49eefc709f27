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
import type { StudyVersion } from './studyVersion.ts';

/** A study of a group; the documents are in its versions. */
export interface Study extends Model<InferAttributes<Study>, InferCreationAttributes<Study>> {
  id: CreationOptional<string>;
  groupId: string;
  title: string;
  question: string;
  /** The newest version. */
  version: number;
  itemCount: number;
  /** Name of who wrote the decision as it stands, which outlives the account; null while there is none. */
  decidedBy: string | null;
  decidedAt: Date | null;
  isDemo: CreationOptional<boolean>;
  createdAt: CreationOptional<Date>;
  updatedAt: CreationOptional<Date>;
  /** Present when the query included it: `newestVersion` of services/studies.ts asks for the newest only. */
  versions?: NonAttribute<StudyVersion[]>;
}

export function defineStudy(sequelize: Sequelize): ModelStatic<Study> {
  return sequelize.define<Study>(
    'Study',
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      groupId: { type: DataTypes.UUID, allowNull: false },
      title: { type: DataTypes.TEXT, allowNull: false },
      question: { type: DataTypes.TEXT, allowNull: false },
      version: { type: DataTypes.INTEGER, allowNull: false },
      itemCount: { type: DataTypes.INTEGER, allowNull: false },
      decidedBy: DataTypes.TEXT,
      decidedAt: DataTypes.DATE,
      isDemo: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
      createdAt: DataTypes.DATE,
      updatedAt: DataTypes.DATE,
    },
    { tableName: 'studies' },
  );
}
