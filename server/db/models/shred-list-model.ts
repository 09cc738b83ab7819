import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import type { ShredList as ShredListView } from '../../contract/shred-lists.ts';

export type Approval = ShredListView['approval'];

/** Papers gathered for one destruction. */
export class ShredListModel extends Model<
  InferAttributes<ShredListModel>,
  InferCreationAttributes<ShredListModel>
> {
  declare id: CreationOptional<string>;
  declare householdId: string;
  declare number: number;
  declare status: CreationOptional<ShredListView['status']>;
  declare on: string;
  declare leftOut: CreationOptional<ShredListView['leftOut']>;
  declare version: CreationOptional<number>;
  declare createdBy: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
  declare sentAt: CreationOptional<Date | null>;
  declare approval: CreationOptional<Approval | null>;
  declare approvedBy: CreationOptional<string | null>;
  declare approvedAt: CreationOptional<Date | null>;
  declare destruction: CreationOptional<ShredListView['destruction'] | null>;
  declare doneAt: CreationOptional<Date | null>;
  declare voidReason: CreationOptional<string | null>;
}

export type ShredListRow = InferAttributes<ShredListModel>;

export function initShredListModel(sequelize: Sequelize): void {
  ShredListModel.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      householdId: { type: DataTypes.UUID },
      number: { type: DataTypes.INTEGER },
      status: { type: DataTypes.TEXT },
      on: { type: DataTypes.DATEONLY },
      leftOut: { type: DataTypes.JSONB },
      version: { type: DataTypes.INTEGER },
      createdBy: { type: DataTypes.UUID },
      createdAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
      sentAt: { type: DataTypes.DATE },
      approval: { type: DataTypes.JSONB },
      approvedBy: { type: DataTypes.UUID },
      approvedAt: { type: DataTypes.DATE },
      destruction: { type: DataTypes.JSONB },
      doneAt: { type: DataTypes.DATE },
      voidReason: { type: DataTypes.TEXT },
    },
    { sequelize, tableName: 'shred_lists', modelName: 'shredList' },
  );
}
