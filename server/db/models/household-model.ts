import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import type { z } from 'zod';
import type { Circumstances, personSchema } from '../../contract/households.ts';

/** A household of a practice. */
export class HouseholdModel extends Model<
  InferAttributes<HouseholdModel>,
  InferCreationAttributes<HouseholdModel>
> {
  declare id: CreationOptional<string>;
  declare practiceId: string;
  declare name: string;
  declare country: string;
  declare region: CreationOptional<string | null>;
  declare timeZone: string;
  declare circumstances: CreationOptional<Circumstances>;
  declare people: CreationOptional<z.infer<typeof personSchema>[]>;
  declare businessNames: CreationOptional<string[]>;
  declare hopes: CreationOptional<string>;
  declare leadDays: CreationOptional<Record<string, number>>;
  declare nextBoxNumber: CreationOptional<number>;
  declare nextPaperNumber: CreationOptional<number>;
  declare nextListNumber: CreationOptional<number>;
  declare version: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
}

export type HouseholdRow = InferAttributes<HouseholdModel>;

export function initHouseholdModel(sequelize: Sequelize): void {
  HouseholdModel.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      practiceId: { type: DataTypes.UUID },
      name: { type: DataTypes.TEXT },
      country: { type: DataTypes.TEXT },
      region: { type: DataTypes.TEXT },
      timeZone: { type: DataTypes.TEXT },
      circumstances: { type: DataTypes.JSONB },
      people: { type: DataTypes.JSONB },
      businessNames: { type: DataTypes.JSONB },
      hopes: { type: DataTypes.TEXT },
      leadDays: { type: DataTypes.JSONB },
      nextBoxNumber: { type: DataTypes.INTEGER },
      nextPaperNumber: { type: DataTypes.INTEGER },
      nextListNumber: { type: DataTypes.INTEGER },
      version: { type: DataTypes.INTEGER },
      createdAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
    },
    { sequelize, tableName: 'households', modelName: 'household' },
  );
}
