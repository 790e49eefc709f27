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
import type { DesignInput, DesignKind } from '../../shared/design.ts';
import type { ReadingName, RunState, SweepAxes, UsedMaterial } from '../../shared/run.ts';
import type { SolveWarning } from '../../shared/solve.ts';
import type { StackDocument } from '../../shared/stack.ts';
import type { Group } from './group.ts';
import type { User } from './user.ts';

/** Everything a sweep is computed from; never changed once stored, and what `inputSha256` is the hash of. */
export type RunInput = SweepAxes & {
  document: StackDocument;
  readings: ReadingName[];
  /** The library materials of the document, each with the version that was the newest when none was named. */
  materials: { id: string; version: number }[];
};

/** ... and a design question. */
export type DesignRunInput = { design: DesignInput; materials: RunInput['materials'] };

/** One stored calculation: a sweep, or the answer to a design question. Its numbers are in RunChunk rows. */
export interface Run extends Model<InferAttributes<Run>, InferCreationAttributes<Run>> {
  id: CreationOptional<string>;
  groupId: string;
  /** Null when the document was not a saved stack, or the stack was deleted. */
  stackId: string | null;
  stackVersion: number | null;
  /** The stack's name at that time, which outlives the stack. */
  stackName: string | null;
  name: string;
  kind: CreationOptional<'sweep' | DesignKind>;
  createdById: string | null;
  input: RunInput | DesignRunInput;
  materials: UsedMaterial[];
  assumptions: string[];
  warnings: SolveWarning[];
  state: CreationOptional<RunState>;
  done: CreationOptional<number>;
  total: number;
  /** How often a host has taken it. */
  attempts: CreationOptional<number>;
  error: CreationOptional<string | null>;
  /** The compute host that has it. */
  host: CreationOptional<string | null>;
  heartbeatAt: CreationOptional<Date | null>;
  solverVersion: string;
  inputSha256: string;
  computeSeconds: CreationOptional<number | null>;
  startedAt: CreationOptional<Date | null>;
  finishedAt: CreationOptional<Date | null>;
  cancelRequestedAt: CreationOptional<Date | null>;
  isDemo: CreationOptional<boolean>;
  createdAt: CreationOptional<Date>;
  updatedAt: CreationOptional<Date>;
  /** Present when the query included it. */
  createdBy?: NonAttribute<User | null>;
  group?: NonAttribute<Group>;
}

export type SweepRun = Run & { kind: 'sweep'; input: RunInput };
export type DesignRun = Run & { kind: DesignKind; input: DesignRunInput };

export function isSweepRun(run: Run): run is SweepRun {
  return run.kind === 'sweep';
}

export function isDesignRun(run: Run): run is DesignRun {
  return run.kind !== 'sweep';
}

export function defineRun(sequelize: Sequelize): ModelStatic<Run> {
  return sequelize.define<Run>(
    'Run',
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      groupId: { type: DataTypes.UUID, allowNull: false },
      stackId: DataTypes.UUID,
      stackVersion: DataTypes.INTEGER,
      stackName: DataTypes.TEXT,
      name: { type: DataTypes.TEXT, allowNull: false },
      kind: { type: DataTypes.TEXT, allowNull: false, defaultValue: 'sweep' },
      createdById: DataTypes.UUID,
      input: { type: DataTypes.JSONB, allowNull: false },
      materials: { type: DataTypes.JSONB, allowNull: false },
      assumptions: { type: DataTypes.JSONB, allowNull: false },
      warnings: { type: DataTypes.JSONB, allowNull: false },
      state: { type: DataTypes.TEXT, allowNull: false, defaultValue: 'queued' },
      done: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
      total: { type: DataTypes.INTEGER, allowNull: false },
      attempts: { type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 },
      error: DataTypes.TEXT,
      host: DataTypes.TEXT,
      heartbeatAt: DataTypes.DATE,
      solverVersion: { type: DataTypes.TEXT, allowNull: false },
      inputSha256: { type: DataTypes.TEXT, allowNull: false },
      computeSeconds: DataTypes.DOUBLE,
      startedAt: DataTypes.DATE,
      finishedAt: DataTypes.DATE,
      cancelRequestedAt: DataTypes.DATE,
      isDemo: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
      createdAt: DataTypes.DATE,
      updatedAt: DataTypes.DATE,
    },
    { tableName: 'runs' },
  );
}
