import { DataTypes } from 'sequelize';
import type {
  CreationOptional,
  InferAttributes,
  InferCreationAttributes,
  Model,
  ModelStatic,
  Sequelize,
} from 'sequelize';
import type { GrowthCard as PresentedCard } from '../../shared/growthCard.ts';

/** What a list does not need. All of it is stored: neither the library nor the study of tomorrow changes it. */
export type GrowthCardContent = Pick<
  PresentedCard,
  'document' | 'layers' | 'readings' | 'bench' | 'tolerance' | 'assumptions' | 'sources' | 'cautions' | 'url'
>;

/** A growth card; the database itself refuses to change it. */
export interface GrowthCard extends Model<InferAttributes<GrowthCard>, InferCreationAttributes<GrowthCard>> {
  id: CreationOptional<string>;
  groupId: string;
  createdById: string | null;
  /** Where it comes from; null when from nowhere, or the study was deleted. */
  studyId: string | null;
  designId: string | null;
  title: string;
  sampleId: string;
  decision: PresentedCard['decision'];
  content: GrowthCardContent;
  solverVersion: string;
  inputSha256: string;
  isDemo: CreationOptional<boolean>;
  createdAt: CreationOptional<Date>;
}

export function defineGrowthCard(sequelize: Sequelize): ModelStatic<GrowthCard> {
  return sequelize.define<GrowthCard>(
    'GrowthCard',
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      groupId: { type: DataTypes.UUID, allowNull: false },
      createdById: DataTypes.UUID,
      studyId: DataTypes.UUID,
      designId: DataTypes.UUID,
      title: { type: DataTypes.TEXT, allowNull: false },
      sampleId: { type: DataTypes.TEXT, allowNull: false },
      decision: { type: DataTypes.JSONB, allowNull: false },
      content: { type: DataTypes.JSONB, allowNull: false },
      solverVersion: { type: DataTypes.TEXT, allowNull: false },
      inputSha256: { type: DataTypes.TEXT, allowNull: false },
      isDemo: { type: DataTypes.BOOLEAN, allowNull: false, defaultValue: false },
      createdAt: DataTypes.DATE,
    },
    { tableName: 'growth_cards', updatedAt: false },
  );
}
