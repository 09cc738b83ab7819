import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';

/** When the return of a tax year was sent, as a person answered it. */
export class FilingModel extends Model<
  InferAttributes<FilingModel>,
  InferCreationAttributes<FilingModel>
> {
  declare id: CreationOptional<string>;
  declare householdId: string;
  declare person: CreationOptional<string | null>;
  declare country: string;
  declare taxYear: string;
  declare answer: 'on-time' | 'on-day' | 'never' | 'unknown';
  declare filedOn: CreationOptional<string | null>;
  declare answeredBy: CreationOptional<string | null>;
  declare answeredAt: CreationOptional<Date>;
}

export type FilingRow = InferAttributes<FilingModel>;

export function initFilingModel(sequelize: Sequelize): void {
  FilingModel.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      householdId: { type: DataTypes.UUID },
      person: { type: DataTypes.TEXT },
      country: { type: DataTypes.TEXT },
      taxYear: { type: DataTypes.TEXT },
      answer: { type: DataTypes.TEXT },
      filedOn: { type: DataTypes.DATEONLY },
      answeredBy: { type: DataTypes.UUID },
      answeredAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
    },
    { sequelize, tableName: 'filings', modelName: 'filing' },
  );
}
