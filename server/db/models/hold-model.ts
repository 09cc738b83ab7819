import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import type { Hold as HoldView } from '../../contract/holds.ts';
import type { MemberRole } from '../../contract/permissions.ts';

/** A reason not to destroy what it covers: one paper, or the whole household when paperId is null. */
export class HoldModel extends Model<
  InferAttributes<HoldModel>,
  InferCreationAttributes<HoldModel>
> {
  declare id: CreationOptional<string>;
  declare householdId: string;
  declare paperId: CreationOptional<string | null>;
  declare kind: HoldView['kind'];
  declare reason: string;
  declare placedOn: string;
  declare placedBy: string;
  declare placedByRole: MemberRole;
  declare reviewOn: CreationOptional<string | null>;
  declare liftedOn: CreationOptional<string | null>;
  declare liftedBy: CreationOptional<string | null>;
  declare liftReason: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
}

export type HoldRow = InferAttributes<HoldModel>;

export function initHoldModel(sequelize: Sequelize): void {
  HoldModel.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      householdId: { type: DataTypes.UUID },
      paperId: { type: DataTypes.UUID },
      kind: { type: DataTypes.TEXT },
      reason: { type: DataTypes.TEXT },
      placedOn: { type: DataTypes.DATEONLY },
      placedBy: { type: DataTypes.UUID },
      placedByRole: { type: DataTypes.TEXT },
      reviewOn: { type: DataTypes.DATEONLY },
      liftedOn: { type: DataTypes.DATEONLY },
      liftedBy: { type: DataTypes.UUID },
      liftReason: { type: DataTypes.TEXT },
      createdAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
    },
    { sequelize, tableName: 'holds', modelName: 'hold' },
  );
}
