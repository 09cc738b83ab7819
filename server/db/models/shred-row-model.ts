import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import type { ShredRow as ShredRowView } from '../../contract/shred-lists.ts';

/** One paper on a shred list. */
export class ShredRowModel extends Model<
  InferAttributes<ShredRowModel>,
  InferCreationAttributes<ShredRowModel>
> {
  declare shredListId: string;
  declare paperId: string;
  declare householdId: string;
  declare position: number;
  declare keptBack: CreationOptional<boolean>;
  declare keptBackReason: CreationOptional<string | null>;
  declare outcome: CreationOptional<ShredRowView['outcome'] | null>;
  declare snapshot: CreationOptional<ShredRowView | null>;
}

export type ShredRowRow = InferAttributes<ShredRowModel>;

export function initShredRowModel(sequelize: Sequelize): void {
  ShredRowModel.init(
    {
      shredListId: { type: DataTypes.UUID, primaryKey: true },
      paperId: { type: DataTypes.UUID, primaryKey: true },
      householdId: { type: DataTypes.UUID },
      position: { type: DataTypes.INTEGER },
      keptBack: { type: DataTypes.BOOLEAN },
      keptBackReason: { type: DataTypes.TEXT },
      outcome: { type: DataTypes.TEXT },
      snapshot: { type: DataTypes.JSONB },
    },
    { sequelize, tableName: 'shred_rows', modelName: 'shredRow' },
  );
}
