import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import type { TextLine } from '../../reading/types.ts';

/** One side of a sheet within a scan; belongs to at most one paper. */
export class PageModel extends Model<
  InferAttributes<PageModel>,
  InferCreationAttributes<PageModel>
> {
  declare id: CreationOptional<string>;
  declare householdId: string;
  declare scanId: string;
  declare paperId: CreationOptional<string | null>;
  declare number: number;
  declare position: CreationOptional<number | null>;
  declare blank: CreationOptional<boolean>;
  declare code: CreationOptional<string | null>;
  declare turned: CreationOptional<number>;
  declare width: number;
  declare height: number;
  declare source: 'text-layer' | 'ocr' | 'none';
  declare confidence: CreationOptional<number>;
  declare lines: CreationOptional<TextLine[]>;
  declare text: CreationOptional<string>;
  declare readAt: CreationOptional<Date>;
}

export type PageRow = InferAttributes<PageModel>;

export function initPageModel(sequelize: Sequelize): void {
  PageModel.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      householdId: { type: DataTypes.UUID },
      scanId: { type: DataTypes.UUID },
      paperId: { type: DataTypes.UUID },
      number: { type: DataTypes.INTEGER },
      position: { type: DataTypes.INTEGER },
      blank: { type: DataTypes.BOOLEAN },
      code: { type: DataTypes.TEXT },
      turned: { type: DataTypes.INTEGER },
      width: { type: DataTypes.INTEGER },
      height: { type: DataTypes.INTEGER },
      source: { type: DataTypes.TEXT },
      confidence: { type: DataTypes.REAL },
      lines: { type: DataTypes.JSONB },
      text: { type: DataTypes.TEXT },
      readAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
    },
    { sequelize, tableName: 'pages', modelName: 'page' },
  );
}
