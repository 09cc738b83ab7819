import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';

/** A practice is a tenant: nothing crosses between practices. */
export class PracticeModel extends Model<
  InferAttributes<PracticeModel>,
  InferCreationAttributes<PracticeModel>
> {
  declare id: CreationOptional<string>;
  declare name: string;
  declare country: string;
  declare createdAt: CreationOptional<Date>;
}

export type PracticeRow = InferAttributes<PracticeModel>;

export function initPracticeModel(sequelize: Sequelize): void {
  PracticeModel.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      name: { type: DataTypes.TEXT },
      country: { type: DataTypes.TEXT },
      createdAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
    },
    { sequelize, tableName: 'practices', modelName: 'practice' },
  );
}
