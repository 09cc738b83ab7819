import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import type { MemberRole, Reach, Rights, Standing } from '../../contract/permissions.ts';

/** Ties a user to a practice (owner) or to one household. */
export class MembershipModel extends Model<
  InferAttributes<MembershipModel>,
  InferCreationAttributes<MembershipModel>
> {
  declare id: CreationOptional<string>;
  declare userId: string;
  declare practiceId: string;
  declare householdId: CreationOptional<string | null>;
  declare role: MemberRole;
  declare standing: CreationOptional<Standing | null>;
  declare rights: CreationOptional<Rights | null>;
  declare sharedGroups: CreationOptional<Reach | null>;
  declare evidence: CreationOptional<Record<string, unknown> | null>;
  declare startsOn: string;
  declare endsOn: CreationOptional<string | null>;
  declare createdAt: CreationOptional<Date>;
}

export type MembershipRow = InferAttributes<MembershipModel>;

export function initMembershipModel(sequelize: Sequelize): void {
  MembershipModel.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      userId: { type: DataTypes.UUID },
      practiceId: { type: DataTypes.UUID },
      householdId: { type: DataTypes.UUID },
      role: { type: DataTypes.TEXT },
      standing: { type: DataTypes.TEXT },
      rights: { type: DataTypes.JSONB },
      sharedGroups: { type: DataTypes.JSONB },
      evidence: { type: DataTypes.JSONB },
      startsOn: { type: DataTypes.DATEONLY },
      endsOn: { type: DataTypes.DATEONLY },
      createdAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
    },
    { sequelize, tableName: 'memberships', modelName: 'membership' },
  );
}
