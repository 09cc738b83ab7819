import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import type { Assessment } from '../../contract/assessments.ts';

/** How and when a sheet left the household. */
export class DepartureModel extends Model<
  InferAttributes<DepartureModel>,
  InferCreationAttributes<DepartureModel>
> {
  declare id: CreationOptional<string>;
  declare householdId: string;
  declare paperId: string;
  declare how: 'shred' | 'recycle' | 'give-back' | 'pass-on';
  declare on: string;
  declare recipient: CreationOptional<string | null>;
  declare shredListId: CreationOptional<string | null>;
  declare recordedBy: string;
  declare recordedAt: CreationOptional<Date>;
  declare assessment: Assessment;
}

export type DepartureRow = InferAttributes<DepartureModel>;

export function initDepartureModel(sequelize: Sequelize): void {
  DepartureModel.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      householdId: { type: DataTypes.UUID },
      paperId: { type: DataTypes.UUID },
      how: { type: DataTypes.TEXT },
      on: { type: DataTypes.DATEONLY },
      recipient: { type: DataTypes.TEXT },
      shredListId: { type: DataTypes.UUID },
      recordedBy: { type: DataTypes.UUID },
      recordedAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
      assessment: { type: DataTypes.JSONB },
    },
    { sequelize, tableName: 'departures', modelName: 'departure' },
  );
}
