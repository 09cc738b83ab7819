/** Papers, one by one: read, lock, insert, change. The register's lists are in register-repository. */
import { Op, type Transaction } from 'sequelize';
import { PaperModel, type PaperRow as StoredPaper } from '../models/paper-model.ts';
import { selectRows } from './sql.ts';

export type { SteppedDown, PaperRow as StoredPaper } from '../models/paper-model.ts';

/** Columns that the retention sum fills. */
export type AssessedColumns = Pick<
  StoredPaper,
  | 'assessment'
  | 'keepUntil'
  | 'shredFrom'
  | 'advisedUntil'
  | 'permanent'
  | 'open'
  | 'held'
  | 'rule'
  | 'securityLevel'
  | 'ruleSetVersion'
  | 'assessedOn'
  | 'steppedDown'
  | 'classGroup'
  | 'issuer'
  | 'addressee'
  | 'reference'
  | 'paperOn'
  | 'keyDate'
  | 'expiresOn'
  | 'taxYear'
>;

export type NewPaper = Pick<StoredPaper, 'householdId' | 'number' | 'class' | 'country' | 'facts'> &
  AssessedColumns &
  Partial<StoredPaper>;

export async function findPaper(
  id: string,
  transaction?: Transaction,
): Promise<StoredPaper | null> {
  const found = await PaperModel.findByPk(id, { transaction: transaction ?? null });
  return found?.get({ plain: true }) ?? null;
}

/** Locks a paper's row until the transaction ends. */
export async function lockPaper(id: string, transaction: Transaction): Promise<StoredPaper | null> {
  const found = await PaperModel.findByPk(id, { transaction, lock: transaction.LOCK.UPDATE });
  return found?.get({ plain: true }) ?? null;
}

/** Locks papers in the order of their ids, so that two transactions never wait for each other. */
export async function lockPapers(ids: string[], transaction: Transaction): Promise<StoredPaper[]> {
  if (ids.length === 0) return [];
  const found = await PaperModel.findAll({
    where: { id: { [Op.in]: ids } },
    order: [['id', 'ASC']],
    transaction,
    lock: transaction.LOCK.UPDATE,
  });
  return found.map((paper) => paper.get({ plain: true }));
}

export async function listPapersByIds(
  ids: string[],
  transaction?: Transaction,
): Promise<StoredPaper[]> {
  if (ids.length === 0) return [];
  const found = await PaperModel.findAll({
    where: { id: { [Op.in]: ids } },
    attributes: { exclude: ['text'] },
    order: [['number', 'ASC']],
    transaction: transaction ?? null,
  });
  return found.map((paper) => paper.get({ plain: true }));
}

/** Papers of a household that have not left, locked: those of one subject, or all. */
export async function lockPapersToAssess(
  scope: { householdId: string; subjectId?: string; ids?: string[] },
  transaction: Transaction,
): Promise<StoredPaper[]> {
  const found = await PaperModel.findAll({
    where: {
      householdId: scope.householdId,
      status: { [Op.ne]: 'left' },
      ...(scope.subjectId === undefined ? {} : { subjectId: scope.subjectId }),
      ...(scope.ids === undefined ? {} : { id: { [Op.in]: scope.ids } }),
    },
    attributes: { exclude: ['text', 'read', 'candidates'] },
    order: [['id', 'ASC']],
    transaction,
    lock: transaction.LOCK.UPDATE,
  });
  return found.map((paper) => paper.get({ plain: true }));
}

/** Papers that have not left, without their text. */
export async function listPapersInHouse(
  householdId: string,
  where: { pile?: StoredPaper['pile']; status?: StoredPaper['status']; open?: boolean } = {},
  transaction?: Transaction,
): Promise<StoredPaper[]> {
  const found = await PaperModel.findAll({
    where: { status: { [Op.ne]: 'left' }, ...where, householdId },
    attributes: { exclude: ['text', 'read', 'candidates'] },
    order: [['number', 'ASC']],
    transaction: transaction ?? null,
  });
  return found.map((paper) => paper.get({ plain: true }));
}

export async function insertPapers(
  papers: NewPaper[],
  transaction: Transaction,
): Promise<StoredPaper[]> {
  const made = await PaperModel.bulkCreate(papers, { transaction, returning: true });
  return made.map((paper) => paper.get({ plain: true }));
}

export async function insertPaper(paper: NewPaper, transaction: Transaction): Promise<StoredPaper> {
  const made = await PaperModel.create(paper, { transaction });
  await made.reload({ transaction });
  return made.get({ plain: true });
}

/** Writes a person's change: the version rises by one. The row must be locked. */
export async function changePaper(
  id: string,
  version: number,
  values: Partial<StoredPaper>,
  transaction: Transaction,
): Promise<void> {
  const [changed] = await PaperModel.update(
    { ...values, version: version + 1 },
    { where: { id, version }, transaction },
  );
  if (changed !== 1) throw new Error(`Paper ${id} is not at version ${version} any more.`);
}

export async function removePaper(id: string, transaction: Transaction): Promise<void> {
  await PaperModel.destroy({ where: { id }, transaction });
}

const assessmentChunk = 500;

/** Writes the assessments of many papers; no version rises, for no person changed anything. */
export async function saveAssessments(
  rows: ({ id: string } & AssessedColumns)[],
  transaction: Transaction,
): Promise<void> {
  for (let start = 0; start < rows.length; start += assessmentChunk) {
    const part = rows.slice(start, start + assessmentChunk);
    await selectRows(
      `update papers p set
         assessment = r.assessment, keep_until = r."keepUntil", shred_from = r."shredFrom",
         advised_until = r."advisedUntil", permanent = r.permanent, open = r.open, held = r.held,
         rule = r.rule, security_level = r."securityLevel", rule_set_version = r."ruleSetVersion",
         assessed_on = r."assessedOn", stepped_down = nullif(r."steppedDown", 'null'::jsonb),
         class_group = r."classGroup", issuer = r.issuer, addressee = r.addressee,
         reference = r.reference, paper_on = r."paperOn", key_date = r."keyDate",
         expires_on = r."expiresOn", tax_year = r."taxYear"
       from jsonb_to_recordset($rows::jsonb) as r(
         id uuid, assessment jsonb, "keepUntil" date, "shredFrom" date, "advisedUntil" date,
         permanent boolean, open boolean, held boolean, rule text, "securityLevel" text,
         "ruleSetVersion" text, "assessedOn" date, "steppedDown" jsonb, "classGroup" text,
         issuer text, addressee text, reference text, "paperOn" date, "keyDate" date,
         "expiresOn" date, "taxYear" text)
       where p.id = r.id
       returning p.id`,
      { rows: JSON.stringify(part) },
      transaction,
    );
  }
}

/** Papers with which a new one is worth comparing: the same class or the same reference, newest first. */
export async function listPossibleCopies(
  householdId: string,
  like: { classes: string[]; references: string[] },
  limit: number,
  transaction?: Transaction,
): Promise<StoredPaper[]> {
  const found = await PaperModel.findAll({
    where: {
      householdId,
      status: { [Op.ne]: 'left' },
      [Op.or]: [{ class: { [Op.in]: like.classes } }, { reference: { [Op.in]: like.references } }],
    },
    attributes: { exclude: ['assessment', 'read', 'candidates'] },
    order: [['number', 'DESC']],
    limit,
    transaction: transaction ?? null,
  });
  return found.map((paper) => paper.get({ plain: true }));
}

export async function setLikelyCopies(
  copies: { id: string; likelyCopyOf: string | null }[],
  transaction: Transaction,
): Promise<void> {
  for (const { id, likelyCopyOf } of copies) {
    await PaperModel.update({ likelyCopyOf }, { where: { id }, transaction });
  }
}

/** Points whatever names one paper at another, before the first is joined into the second. */
export async function repointPaper(
  from: string,
  to: string,
  transaction: Transaction,
): Promise<void> {
  const bind = { from, to };
  await selectRows(
    `with
       moved_holds as (update holds set paper_id = $to where paper_id = $from),
       moved_changes as (update paper_changes set paper_id = $to, before = '{}' where paper_id = $from),
       moved_reminders as (update reminders set paper_id = $to where paper_id = $from),
       copies as (
         update papers set likely_copy_of = case when id = $to then null else $to::uuid end
         where likely_copy_of = $from)
     select 1 as done`,
    bind,
    transaction,
  );
}
