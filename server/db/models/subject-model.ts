import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import type { Subject as SubjectView } from '../../contract/subjects.ts';

type SubjectKind = SubjectView['kind'];

/** What papers are about; when it ends, the clocks of its papers start. */
export class SubjectModel extends Model<
  InferAttributes<SubjectModel>,
  InferCreationAttributes<SubjectModel>
> {
  declare id: CreationOptional<string>;
  declare householdId: string;
  declare kind: SubjectKind;
  declare name: string;
  declare reference: CreationOptional<string | null>;
  declare startedOn: CreationOptional<string | null>;
  declare endedOn: CreationOptional<string | null>;
  declare endKnown: CreationOptional<boolean>;
  declare version: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
}

export type SubjectRow = InferAttributes<SubjectModel>;

export function initSubjectModel(sequelize: Sequelize): void {
  SubjectModel.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      householdId: { type: DataTypes.UUID },
      kind: { type: DataTypes.TEXT },
      name: { type: DataTypes.TEXT },
      reference: { type: DataTypes.TEXT },
      startedOn: { type: DataTypes.DATEONLY },
      endedOn: { type: DataTypes.DATEONLY },
      endKnown: { type: DataTypes.BOOLEAN },
      version: { type: DataTypes.INTEGER },
      createdAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
    },
    { sequelize, tableName: 'subjects', modelName: 'subject' },
  );
}
