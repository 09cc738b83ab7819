import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';

export type TokenKind = 'password-reset' | 'email-change' | 'invitation';

/** A single-use link; only the hash of its token is kept. */
export class AccountTokenModel extends Model<
  InferAttributes<AccountTokenModel>,
  InferCreationAttributes<AccountTokenModel>
> {
  declare id: CreationOptional<string>;
  declare kind: TokenKind;
  declare tokenHash: string;
  declare userId: CreationOptional<string | null>;
  declare householdId: CreationOptional<string | null>;
  declare email: string;
  declare payload: CreationOptional<Record<string, unknown>>;
  declare createdAt: Date;
  declare expiresAt: Date;
  declare usedAt: CreationOptional<Date | null>;
}

export type AccountTokenRow = InferAttributes<AccountTokenModel>;

export function initAccountTokenModel(sequelize: Sequelize): void {
  AccountTokenModel.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      kind: { type: DataTypes.TEXT },
      tokenHash: { type: DataTypes.TEXT },
      userId: { type: DataTypes.UUID },
      householdId: { type: DataTypes.UUID },
      email: { type: DataTypes.TEXT },
      payload: { type: DataTypes.JSONB },
      createdAt: { type: DataTypes.DATE },
      expiresAt: { type: DataTypes.DATE },
      usedAt: { type: DataTypes.DATE },
    },
    { sequelize, tableName: 'account_tokens', modelName: 'accountToken' },
  );
}
