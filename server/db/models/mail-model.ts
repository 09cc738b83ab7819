import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';

/** A message to be sent, sent, or failing. */
export class MailModel extends Model<
  InferAttributes<MailModel>,
  InferCreationAttributes<MailModel>
> {
  declare id: CreationOptional<string>;
  declare practiceId: string;
  declare userId: CreationOptional<string | null>;
  declare address: string;
  declare subject: string;
  declare text: string;
  declare html: string;
  declare state: CreationOptional<'queued' | 'sent' | 'failing'>;
  declare attempts: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
  declare sentAt: CreationOptional<Date | null>;
  declare nextAttemptAt: CreationOptional<Date | null>;
  declare lastError: CreationOptional<string | null>;
}

export type MailRow = InferAttributes<MailModel>;

export function initMailModel(sequelize: Sequelize): void {
  MailModel.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      practiceId: { type: DataTypes.UUID },
      userId: { type: DataTypes.UUID },
      address: { type: DataTypes.TEXT },
      subject: { type: DataTypes.TEXT },
      text: { type: DataTypes.TEXT },
      html: { type: DataTypes.TEXT },
      state: { type: DataTypes.TEXT },
      attempts: { type: DataTypes.INTEGER },
      createdAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
      sentAt: { type: DataTypes.DATE },
      nextAttemptAt: { type: DataTypes.DATE },
      lastError: { type: DataTypes.TEXT },
    },
    { sequelize, tableName: 'mails', modelName: 'mail' },
  );
}
