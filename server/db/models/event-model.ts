import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';

/** The activity record: append-only, kept so by the database. */
export class EventModel extends Model<
  InferAttributes<EventModel>,
  InferCreationAttributes<EventModel>
> {
  declare id: CreationOptional<string>;
  declare practiceId: CreationOptional<string | null>;
  declare householdId: CreationOptional<string | null>;
  declare userId: CreationOptional<string | null>;
  declare at: CreationOptional<Date>;
  declare action: string;
  declare sentence: string;
  declare paperId: CreationOptional<string | null>;
  declare shredListId: CreationOptional<string | null>;
  declare detail: CreationOptional<Record<string, unknown>>;
}

export type EventRow = InferAttributes<EventModel>;

export function initEventModel(sequelize: Sequelize): void {
  EventModel.init(
    {
      id: { type: DataTypes.BIGINT, primaryKey: true, autoIncrement: true },
      practiceId: { type: DataTypes.UUID },
      householdId: { type: DataTypes.UUID },
      userId: { type: DataTypes.UUID },
      at: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
      action: { type: DataTypes.TEXT },
      sentence: { type: DataTypes.TEXT },
      paperId: { type: DataTypes.UUID },
      shredListId: { type: DataTypes.UUID },
      detail: { type: DataTypes.JSONB },
    },
    { sequelize, tableName: 'events', modelName: 'event' },
  );
}
