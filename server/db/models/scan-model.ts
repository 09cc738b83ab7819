import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';

/** One uploaded file. */
export class ScanModel extends Model<
  InferAttributes<ScanModel>,
  InferCreationAttributes<ScanModel>
> {
  declare id: CreationOptional<string>;
  declare householdId: string;
  declare boxId: string;
  declare name: string;
  declare mediaType: string;
  declare bytes: string;
  declare sha256: string;
  declare status: CreationOptional<'waiting' | 'reading' | 'read' | 'failed'>;
  declare reason: CreationOptional<string | null>;
  declare pageCount: CreationOptional<number | null>;
  declare attempts: CreationOptional<number>;
  declare createdBy: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
  declare readAt: CreationOptional<Date | null>;
}

export type ScanRow = InferAttributes<ScanModel>;

export function initScanModel(sequelize: Sequelize): void {
  ScanModel.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      householdId: { type: DataTypes.UUID },
      boxId: { type: DataTypes.UUID },
      name: { type: DataTypes.TEXT },
      mediaType: { type: DataTypes.TEXT },
      bytes: { type: DataTypes.BIGINT },
      sha256: { type: DataTypes.TEXT },
      status: { type: DataTypes.TEXT },
      reason: { type: DataTypes.TEXT },
      pageCount: { type: DataTypes.INTEGER },
      attempts: { type: DataTypes.INTEGER },
      createdBy: { type: DataTypes.UUID },
      createdAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
      readAt: { type: DataTypes.DATE },
    },
    { sequelize, tableName: 'scans', modelName: 'scan' },
  );
}
