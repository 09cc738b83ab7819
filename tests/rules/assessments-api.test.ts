/** The retention sum asked through the HTTP door: exactly the described answer, and faults named by field. */
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startTestApp, type TestApp, type Visitor } from '../support/app.ts';
import { addPractice, testPassword } from '../support/people.ts';

interface Problem {
  status: number;
  fields: { field: string; message: string }[];
}

const payslip = {
  country: 'GB',
  class: 'payslip',
  on: '2026-12-01',
  inputs: { role: 'individual', documentDate: '2023-11-30', filedOn: '2025-01-20' },
};

describe('POST /api/assessments', () => {
  let app: TestApp;
  let owner: Visitor;

  beforeAll(async () => {
    app = await startTestApp();
    const practice = await addPractice();
    owner = await app.signIn(practice.emails.owner, testPassword);
  });
  afterAll(() => app.close());

  const ask = (body: object) => owner.post('/api/assessments', body);

  it('answers with exactly the described fields', async () => {
    const answer = await ask(payslip);
    expect(answer.status).toBe(200);
    const body = answer.body as Record<string, unknown>;
    expect(Object.keys(body).sort()).toEqual([
      'advisedBecause',
      'advisedUntil',
      'assumed',
      'cautions',
      'disposal',
      'heldBy',
      'keepUntil',
      'open',
      'openBecause',
      'original',
      'permanent',
      'provisional',
      'rules',
      'scheduledUntil',
      'securityLevel',
      'shredFrom',
      'steps',
    ]);
    expect(body).toMatchObject({
      keepUntil: '2026-01-31',
      shredFrom: '2026-02-01',
      permanent: false,
      open: false,
      openBecause: null,
      heldBy: [],
      scheduledUntil: '2026-01-31',
      provisional: null,
      advisedUntil: '2028-04-05',
      disposal: 'shred',
      securityLevel: 'P-4',
      original: 'conditional',
    });
    const [rule] = body.rules as Record<string, unknown>[];
    expect(Object.keys(rule ?? {}).sort()).toEqual(['basis', 'id', 'keepUntil', 'source']);
    expect(Object.keys(rule?.source ?? {}).sort()).toEqual([
      'authority',
      'section',
      'status',
      'title',
    ]);
    for (const step of body.steps as object[]) {
      expect(Object.keys(step).sort()).toEqual(['date', 'text']);
    }
  });

  it('answers open for a country without a table', async () => {
    const answer = await ask({ ...payslip, country: 'FR' });
    expect(answer.status).toBe(200);
    expect(answer.body).toMatchObject({ open: true, keepUntil: null, rules: [] });
  });

  it('takes a case without inputs', async () => {
    const { inputs: _inputs, ...bare } = payslip;
    expect((await ask(bare)).status).toBe(200);
  });

  const wrong: [string, object, string][] = [
    ['a class that does not exist', { ...payslip, class: 'parchment' }, 'class'],
    ['a country that does not exist', { ...payslip, country: 'XX' }, 'country'],
    ['a country in small letters', { ...payslip, country: 'gb' }, 'country'],
    ['a missing class', { country: 'GB', on: '2026-12-01' }, 'class'],
    ['a missing country', { class: 'payslip', on: '2026-12-01' }, 'country'],
    ['a missing day', { country: 'GB', class: 'payslip' }, 'on'],
    ['an impossible day asked about', { ...payslip, on: '2026-02-30' }, 'on'],
    ['a day out of reach', { ...payslip, on: '9999-01-01' }, 'on'],
    ['an unknown name beside the case', { ...payslip, household: 'x' }, 'household'],
    ['an unknown input', { ...payslip, inputs: { filed: '2025-01-20' } }, 'inputs.filed'],
    ['an impossible day', { ...payslip, inputs: { filedOn: '2023-02-29' } }, 'inputs.filedOn'],
    [
      'an instant for a day',
      { ...payslip, inputs: { filedOn: '2023-02-28T00:00:00Z' } },
      'inputs.filedOn',
    ],
    ['a number for a day', { ...payslip, inputs: { filedOn: 20230228 } }, 'inputs.filedOn'],
    [
      'a day before its time',
      { ...payslip, inputs: { documentDate: '0001-01-01' } },
      'inputs.documentDate',
    ],
    ['text for a year', { ...payslip, inputs: { taxYear: '2023' } }, 'inputs.taxYear'],
    ['half a year', { ...payslip, inputs: { taxYear: 2023.5 } }, 'inputs.taxYear'],
    ['text for a flag', { ...payslip, inputs: { usedForTax: 'yes' } }, 'inputs.usedForTax'],
    ['an unknown role', { ...payslip, inputs: { role: 'gardener' } }, 'inputs.role'],
    ['an unknown region', { ...payslip, inputs: { region: 'atlantis' } }, 'inputs.region'],
    ['a hold that is text', { ...payslip, inputs: { hold: 'dispute' } }, 'inputs.hold'],
    [
      'an unknown name in a hold',
      { ...payslip, inputs: { hold: { until: null } } },
      'inputs.hold.until',
    ],
    [
      'an unknown name in an enquiry',
      { ...payslip, inputs: { enquiry: { endedOn: null } } },
      'inputs.enquiry.endedOn',
    ],
    [
      'an impossible day of an owner',
      { ...payslip, inputs: { role: 'joint', owners: [{ filedOn: '2023-13-01' }] } },
      'inputs.owners.0.filedOn',
    ],
    ['no owners', { ...payslip, inputs: { role: 'joint', owners: [] } }, 'inputs.owners'],
  ];

  it.each(wrong)('refuses %s and names the field', async (_words, body, field) => {
    const answer = await ask(body);
    expect(answer.status, answer.text).toBe(422);
    expect(answer.type).toBe('application/problem+json');
    const { fields } = answer.body as Problem;
    expect(fields.map((entry) => entry.field)).toContain(field);
    for (const entry of fields) expect(entry.message.length).toBeGreaterThan(5);
  });

  it('names the class and the country that do not exist', async () => {
    const text = (await ask({ ...payslip, class: 'parchment', country: 'XX' })).text;
    expect(text).toContain('parchment');
    expect((await ask({ ...payslip, country: 'XX' })).text).toContain('XX');
  });
});
