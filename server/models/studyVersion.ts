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
import type { StudyDocument } from '../../shared/study.ts';
import type { User } from './user.ts';

/** What one save of a study wrote, and who saved it. */
export interface StudyVersion extends Model<
  InferAttributes<StudyVersion>,
  InferCreationAttributes<StudyVersion>
> {
  studyId: string;
  version: number;
  title: string;
  document: StudyDocument;
  /** What differs from the version before, in sentences. */
  changes: string[];
  /** Null when the account is gone. */
  authorId: string | null;
  createdAt: CreationOptional<Date>;
  /** Present when the query included it. */
  author?: NonAttribute<User | null>;
}

export function defineStudyVersion(sequelize: Sequelize): ModelStatic<StudyVersion> {
  return sequelize.define<StudyVersion>(
    'StudyVersion',
    {
      studyId: { type: DataTypes.UUID, primaryKey: true },
      version: { type: DataTypes.INTEGER, primaryKey: true },
      title: { type: DataTypes.TEXT, allowNull: false },
      document: { type: DataTypes.JSONB, allowNull: false },
      changes: { type: DataTypes.JSONB, allowNull: false },
      authorId: DataTypes.UUID,
      createdAt: DataTypes.DATE,
    },
    { tableName: 'study_versions', updatedAt: false },
  );
}
