import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';

/** What a paper was before a change, for undo and for the history. */
export class PaperChangeModel extends Model<
  InferAttributes<PaperChangeModel>,
  InferCreationAttributes<PaperChangeModel>
> {
  declare id: CreationOptional<string>;
  declare householdId: string;
  declare paperId: string;
  declare version: number;
  declare before: Record<string, unknown>;
  declare sentence: string;
  declare userId: CreationOptional<string | null>;
  declare at: CreationOptional<Date>;
  declare undone: CreationOptional<boolean>;
}

export type PaperChangeRow = InferAttributes<PaperChangeModel>;

export function initPaperChangeModel(sequelize: Sequelize): void {
  PaperChangeModel.init(
    {
      id: { type: DataTypes.BIGINT, primaryKey: true, autoIncrement: true },
      householdId: { type: DataTypes.UUID },
      paperId: { type: DataTypes.UUID },
      version: { type: DataTypes.INTEGER },
      before: { type: DataTypes.JSONB },
      sentence: { type: DataTypes.TEXT },
      userId: { type: DataTypes.UUID },
      at: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
      undone: { type: DataTypes.BOOLEAN },
    },
    { sequelize, tableName: 'paper_changes', modelName: 'paperChange' },
  );
}
