import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from 'sequelize';
import type { Assessment } from '../../contract/assessments.ts';
import type { ClassGroup, ClassId } from '../../contract/document-classes.ts';
import type { Paper, PaperStatus, Pile } from '../../contract/papers.ts';
import type { Candidate, Facts } from '../../contract/readings.ts';

export interface SteppedDown {
  on: string;
  byName: string;
  reason: string;
  /** The advised day that was stepped down from; a longer advice asks anew. */
  advisedUntil: string;
}

/** One document as a person would pick it up. Columns beside `facts` and `assessment` repeat what the register sorts by. */
export class PaperModel extends Model<
  InferAttributes<PaperModel>,
  InferCreationAttributes<PaperModel>
> {
  declare id: CreationOptional<string>;
  declare householdId: string;
  declare boxId: CreationOptional<string | null>;
  declare scanId: CreationOptional<string | null>;
  declare subjectId: CreationOptional<string | null>;
  declare number: number;
  declare status: CreationOptional<PaperStatus>;
  declare class: ClassId;
  declare classGroup: ClassGroup;
  declare confidence: CreationOptional<number | null>;
  declare country: string;
  declare title: CreationOptional<string | null>;
  declare facts: Facts;
  declare read: CreationOptional<Paper['read'] | null>;
  declare candidates: CreationOptional<Candidate[]>;
  declare answers: CreationOptional<Paper['answers']>;
  declare text: CreationOptional<string>;
  declare pile: CreationOptional<Pile | null>;
  declare keptBecause: CreationOptional<Paper['keptBecause'] | null>;
  declare place: CreationOptional<string | null>;
  declare note: CreationOptional<string | null>;
  declare practiceNote: CreationOptional<string | null>;
  declare sheets: CreationOptional<number>;
  declare bundle: CreationOptional<boolean>;
  declare bundleFrom: CreationOptional<string | null>;
  declare bundleTo: CreationOptional<string | null>;
  declare issuer: CreationOptional<string | null>;
  declare addressee: CreationOptional<string | null>;
  declare reference: CreationOptional<string | null>;
  declare paperOn: CreationOptional<string | null>;
  declare keyDate: CreationOptional<string | null>;
  declare expiresOn: CreationOptional<string | null>;
  declare taxYear: CreationOptional<string | null>;
  declare assessment: Assessment;
  declare keepUntil: CreationOptional<string | null>;
  declare shredFrom: CreationOptional<string | null>;
  declare advisedUntil: CreationOptional<string | null>;
  declare permanent: CreationOptional<boolean>;
  declare open: CreationOptional<boolean>;
  declare held: CreationOptional<boolean>;
  declare rule: CreationOptional<string | null>;
  declare securityLevel: CreationOptional<string | null>;
  declare ruleSetVersion: string;
  declare assessedOn: string;
  declare steppedDown: CreationOptional<SteppedDown | null>;
  declare likelyCopyOf: CreationOptional<string | null>;
  declare eyesOnlyUserId: CreationOptional<string | null>;
  declare reviewedAt: CreationOptional<Date | null>;
  declare reviewedBy: CreationOptional<string | null>;
  declare leftOn: CreationOptional<string | null>;
  declare version: CreationOptional<number>;
  declare createdAt: CreationOptional<Date>;
}

export type PaperRow = InferAttributes<PaperModel>;

export function initPaperModel(sequelize: Sequelize): void {
  PaperModel.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true, defaultValue: DataTypes.UUIDV4 },
      householdId: { type: DataTypes.UUID },
      boxId: { type: DataTypes.UUID },
      scanId: { type: DataTypes.UUID },
      subjectId: { type: DataTypes.UUID },
      number: { type: DataTypes.INTEGER },
      status: { type: DataTypes.TEXT },
      class: { type: DataTypes.TEXT },
      classGroup: { type: DataTypes.TEXT },
      confidence: { type: DataTypes.REAL },
      country: { type: DataTypes.TEXT },
      title: { type: DataTypes.TEXT },
      facts: { type: DataTypes.JSONB },
      read: { type: DataTypes.JSONB },
      candidates: { type: DataTypes.JSONB },
      answers: { type: DataTypes.JSONB },
      text: { type: DataTypes.TEXT },
      pile: { type: DataTypes.TEXT },
      keptBecause: { type: DataTypes.TEXT },
      place: { type: DataTypes.TEXT },
      note: { type: DataTypes.TEXT },
      practiceNote: { type: DataTypes.TEXT },
      sheets: { type: DataTypes.INTEGER },
      bundle: { type: DataTypes.BOOLEAN },
      bundleFrom: { type: DataTypes.DATEONLY },
      bundleTo: { type: DataTypes.DATEONLY },
      issuer: { type: DataTypes.TEXT },
      addressee: { type: DataTypes.TEXT },
      reference: { type: DataTypes.TEXT },
      paperOn: { type: DataTypes.DATEONLY },
      keyDate: { type: DataTypes.DATEONLY },
      expiresOn: { type: DataTypes.DATEONLY },
      taxYear: { type: DataTypes.TEXT },
      assessment: { type: DataTypes.JSONB },
      keepUntil: { type: DataTypes.DATEONLY },
      shredFrom: { type: DataTypes.DATEONLY },
      advisedUntil: { type: DataTypes.DATEONLY },
      permanent: { type: DataTypes.BOOLEAN },
      open: { type: DataTypes.BOOLEAN },
      held: { type: DataTypes.BOOLEAN },
      rule: { type: DataTypes.TEXT },
      securityLevel: { type: DataTypes.TEXT },
      ruleSetVersion: { type: DataTypes.TEXT },
      assessedOn: { type: DataTypes.DATEONLY },
      steppedDown: { type: DataTypes.JSONB },
      likelyCopyOf: { type: DataTypes.UUID },
      eyesOnlyUserId: { type: DataTypes.UUID },
      reviewedAt: { type: DataTypes.DATE },
      reviewedBy: { type: DataTypes.UUID },
      leftOn: { type: DataTypes.DATEONLY },
      version: { type: DataTypes.INTEGER },
      createdAt: { type: DataTypes.DATE, defaultValue: DataTypes.NOW },
    },
    { sequelize, tableName: 'papers', modelName: 'paper' },
  );
}
