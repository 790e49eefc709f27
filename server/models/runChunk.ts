import { DataTypes } from 'sequelize';
import type { InferAttributes, InferCreationAttributes, Model, ModelStatic, Sequelize } from 'sequelize';

/** A piece, at most 4 MB, of a run's result file; the pieces in order of `position` are the whole. */
export interface RunChunk extends Model<InferAttributes<RunChunk>, InferCreationAttributes<RunChunk>> {
  runId: string;
  /** From 0. */
  position: number;
  bytes: Buffer;
}

export function defineRunChunk(sequelize: Sequelize): ModelStatic<RunChunk> {
  return sequelize.define<RunChunk>(
    'RunChunk',
    {
      runId: { type: DataTypes.UUID, primaryKey: true },
      position: { type: DataTypes.INTEGER, primaryKey: true },
      bytes: { type: DataTypes.BLOB, allowNull: false },
    },
    { tableName: 'run_chunks', timestamps: false },
  );
}
