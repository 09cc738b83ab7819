import { z } from 'zod';
import { assessmentSchema, basisSchema, sourceStatusSchema } from './assessments.ts';
import { caseSchema } from './cases.ts';
import { isoDateSchema } from './dates.ts';
import { defineEndpoint } from './endpoint.ts';

export const ruleViewSchema = z.object({
  id: z.string(),
  classes: z.array(z.string()),
  basis: basisSchema,
  /** One plain sentence. */
  sentence: z.string(),
  original: z.string(),
  source: z.object({
    authority: z.string(),
    title: z.string(),
    section: z.string().nullable(),
    status: sourceStatusSchema,
    readOn: isoDateSchema.nullable(),
  }),
  cautions: z.array(z.string()),
  note: z.string().nullable(),
});
export type RuleView = z.infer<typeof ruleViewSchema>;

export const ruleTableEndpoints = {
  listRuleTables: defineEndpoint({
    method: 'get',
    path: '/api/rule-tables',
    tag: 'rules',
    summary: 'The countries that have a rule table',
    access: 'signed-in',
    status: 200,
    response: z.object({
      version: z.string(),
      items: z.array(z.object({ country: z.string(), name: z.string(), rules: z.number().int() })),
    }),
  }),
  getRuleTable: defineEndpoint({
    method: 'get',
    path: '/api/rule-tables/:country',
    tag: 'rules',
    summary: 'The rules of one country, with those common to all',
    access: 'signed-in',
    params: z.object({ country: z.string().max(10) }),
    status: 200,
    response: z.object({
      country: z.string(),
      name: z.string(),
      version: z.string(),
      rules: z.array(ruleViewSchema),
    }),
  }),
  assessCase: defineEndpoint({
    method: 'post',
    path: '/api/assessments',
    tag: 'rules',
    summary: 'The retention sum for a given case; stores nothing',
    access: 'signed-in',
    body: caseSchema,
    status: 200,
    response: assessmentSchema,
  }),
};
