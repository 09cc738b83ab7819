import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';

/** A reminder that was taken up for one person; the key makes it unique. */
export class ReminderModel extends Model<
  InferAttributes<ReminderModel>,
  InferCreationAttributes<ReminderModel>
> {
  declare id: CreationOptional<string>;
  declare householdId: string;
  declare userId: string;
  declare paperId: CreationOptional<string | null>;
  declare key: string;
  declare kind: 'expiry' | 'keep-until';
  declare on: string;
  declare about: string;
  declare mailId: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
}

export type ReminderRow = InferAttributes<ReminderModel>;

export function initReminderModel(sequelize: Sequelize): void {
  ReminderModel.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      householdId: { type: DataTypes.UUID },
      userId: { type: DataTypes.UUID },
      paperId: { type: DataTypes.UUID },
      key: { type: DataTypes.TEXT },
      kind: { type: DataTypes.TEXT },
      on: { type: DataTypes.DATEONLY },
      about: { type: DataTypes.DATEONLY },
      mailId: { type: DataTypes.UUID },
      createdAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
    },
    { sequelize, tableName: 'reminders', modelName: 'reminder' },
  );
}
