import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';

/** A room or place that boxes come out of. */
export class AreaModel extends Model<
  InferAttributes<AreaModel>,
  InferCreationAttributes<AreaModel>
> {
  declare id: CreationOptional<string>;
  declare householdId: string;
  declare name: string;
  declare createdAt: CreationOptional<Date>;
}

export type AreaRow = InferAttributes<AreaModel>;

export function initAreaModel(sequelize: Sequelize): void {
  AreaModel.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      householdId: { type: DataTypes.UUID },
      name: { type: DataTypes.TEXT },
      createdAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
    },
    { sequelize, tableName: 'areas', modelName: 'area' },
  );
}
