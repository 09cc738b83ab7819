/** Fills an empty database with households full of papers, all assessed, for measuring. */
import { emptyFacts, type Facts } from '../../contract/readings.ts';
import type { RetentionCase } from '../../contract/cases.ts';
import type { Database } from '../../db/connection.ts';
import { insertPapers, type NewPaper } from '../../db/repositories/paper-repository.ts';
import { inTransaction } from '../../db/transaction.ts';
import type { RuleSet } from '../../retention/rule-set.ts';
import { assessPaper, loadAssessContext } from '../../use-cases/assess-paper.ts';
import { makeBenchCases } from './bench-cases.ts';

const countries = ['GB', 'GB', 'GB', 'US', 'CA', 'AU', 'IE', 'DE'] as const;
const papersOfPattern = 250;
const words =
  'statement account period balance amount reference customer number payment received thank you please quote date total tax office sent page'.split(
    ' ',
  );

function makeFacts({ inputs }: RetentionCase, index: number): Facts {
  const place = { confidence: 0.93, seenAt: { page: 1, box: { x: 0.1, y: 0.2, w: 0.2, h: 0.02 } } };
  const issued = inputs.documentDate ?? inputs.invoiceDate ?? null;
  const facts = emptyFacts();
  return {
    ...facts,
    dates: { ...facts.dates, issued: issued ? { value: issued, printed: issued, ...place } : null },
    keyDate: issued,
    reference: { value: `REF-${index * 7919}`, ...place },
    issuer: { value: `Northmere ${words[index % words.length] ?? ''}`, ...place },
    addressee: { value: 'Ada Client', ...place },
    amounts: [{ name: 'total', value: index * 1.5, currency: 'EUR', ...place }],
  };
}

function makeText(index: number): string {
  return Array.from({ length: 160 }, (_, at) => words[(index * 31 + at * at) % words.length]).join(
    ' ',
  );
}

async function insertHousehold(
  database: Database,
  practiceId: string,
  country: string,
): Promise<string> {
  const [rows] = await database.query(
    `insert into households (practice_id, name, country, time_zone) values ($practiceId, 'Measured', $country, 'UTC') returning id`,
    { bind: { practiceId, country } },
  );
  return (rows as { id: string }[])[0]?.id ?? '';
}

/** Some hundred papers of a country, assessed one by one, that all others are copied from. */
async function insertPattern(
  database: Database,
  practiceId: string,
  country: string,
  day: { today: string; ruleSet: RuleSet },
): Promise<string> {
  const householdId = await insertHousehold(database, practiceId, country);
  const context = await loadAssessContext(householdId, day);
  const cases = makeBenchCases(papersOfPattern * 20)
    .filter((entry) => entry.country === country && !entry.inputs.owners)
    .slice(0, papersOfPattern);
  const papers = cases.map((retentionCase, index): NewPaper => {
    const { owners: _owners, ...answers } = retentionCase.inputs;
    const paper = {
      id: null,
      class: retentionCase.class,
      country,
      facts: makeFacts(retentionCase, index),
      answers,
      subjectId: null,
      bundle: false,
      bundleFrom: null,
      bundleTo: null,
      steppedDown: null,
    };
    const { id: _id, ...stored } = paper;
    return {
      ...stored,
      householdId,
      number: index + 1,
      text: makeText(index),
      ...assessPaper(paper, context),
    };
  });
  await inTransaction((transaction) => insertPapers(papers, transaction));
  return householdId;
}

const copied =
  'class, class_group, country, facts, answers, text, issuer, addressee, reference, paper_on, key_date, tax_year, ' +
  'assessment, keep_until, shred_from, advised_until, permanent, open, held, rule, security_level, rule_set_version, assessed_on';

/** Makes households with papers; answers the ids of the households. */
export async function fillWithPapers(
  database: Database,
  counts: { households: number; papersEach: number },
  day: { today: string; ruleSet: RuleSet },
): Promise<string[]> {
  const [practices] = await database.query(
    `insert into practices (name, country) values ('Measured', 'GB') returning id`,
  );
  const practiceId = (practices as { id: string }[])[0]?.id ?? '';
  const patterns = new Map<string, string>();
  const ids: string[] = [];
  for (let index = 0; index < counts.households; index += 1) {
    const country = countries[index % countries.length] ?? 'GB';
    let pattern = patterns.get(country);
    if (!pattern) {
      pattern = await insertPattern(database, practiceId, country, day);
      patterns.set(country, pattern);
    }
    const id = await insertHousehold(database, practiceId, country);
    await database.query(
      `insert into papers (household_id, number, status, ${copied})
       select $id, row_number() over (), 'kept', ${copied}
       from papers, generate_series(1, $copies::int) where household_id = $pattern limit $papersEach::int`,
      {
        bind: {
          id,
          pattern,
          papersEach: counts.papersEach,
          copies: Math.ceil(counts.papersEach / 40),
        },
      },
    );
    ids.push(id);
  }
  return ids;
}
