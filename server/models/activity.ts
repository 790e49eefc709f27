import { DataTypes } from 'sequelize';
import type {
  CreationOptional,
  InferAttributes,
  InferCreationAttributes,
  Model,
  ModelStatic,
  Sequelize,
} from 'sequelize';

/** One line of the audit trail: who did what, when, in which group. Lines are only ever added. */
export interface Activity extends Model<InferAttributes<Activity>, InferCreationAttributes<Activity>> {
  id: CreationOptional<string>;
  /** Null for what concerns an account and no group, such as a password reset. */
  groupId: string | null;
  actorId: string | null;
  /** The name at that time, which outlives the account. */
  actorName: string;
  /** A verb on a noun, such as "stack.update". */
  action: string;
  subjectId: string | null;
  detail: Record<string, string | number | boolean | null>;
  createdAt: CreationOptional<Date>;
}

export function defineActivity(sequelize: Sequelize): ModelStatic<Activity> {
  return sequelize.define<Activity>(
    'Activity',
    {
      id: { type: DataTypes.BIGINT, primaryKey: true, autoIncrement: true },
      groupId: DataTypes.UUID,
      actorId: DataTypes.UUID,
      actorName: { type: DataTypes.TEXT, allowNull: false },
      action: { type: DataTypes.TEXT, allowNull: false },
      subjectId: DataTypes.TEXT,
      detail: { type: DataTypes.JSONB, allowNull: false },
      createdAt: DataTypes.DATE,
    },
    { tableName: 'activity', updatedAt: false },
  );
}
