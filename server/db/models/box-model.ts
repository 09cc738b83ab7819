import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';

/** A box of paper. */
export class BoxModel extends Model<InferAttributes<BoxModel>, InferCreationAttributes<BoxModel>> {
  declare id: CreationOptional<string>;
  declare householdId: string;
  declare areaId: CreationOptional<string | null>;
  declare code: string;
  declare label: CreationOptional<string>;
  declare version: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
}

export type BoxRow = InferAttributes<BoxModel>;

export function initBoxModel(sequelize: Sequelize): void {
  BoxModel.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      householdId: { type: DataTypes.UUID },
      areaId: { type: DataTypes.UUID },
      code: { type: DataTypes.TEXT },
      label: { type: DataTypes.TEXT },
      version: { type: DataTypes.INTEGER },
      createdAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
    },
    { sequelize, tableName: 'boxes', modelName: 'box' },
  );
}
