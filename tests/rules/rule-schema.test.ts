/** The schemas that editors use are those that the product checks with. */
import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';
import { parse } from 'yaml';
import { z } from 'zod';
import { describeRuleSchemas } from '../../server/rule-json-schema.ts';

const folder = fileURLToPath(new URL('../../rules', import.meta.url));
const read = (file: string): string => readFileSync(path.join(folder, file), 'utf8');
const tables = readdirSync(folder).filter((name) => name.endsWith('.yaml'));
const schemas = new Map(describeRuleSchemas().map(({ file, text }) => [file, text]));

describe('the JSON Schemas of the rule tables', () => {
  it.each([...schemas])('%s is what `npm run rules:schema` would write', (file, text) => {
    expect(read(file)).toBe(text);
  });

  it.each(tables)('%s names its schema and fits it', (file) => {
    const text = read(file);
    const [, schema = ''] = /^# yaml-language-server: \$schema=\.\/(\S+)$/m.exec(text) ?? [];
    expect(text.startsWith('# yaml-language-server')).toBe(true);
    const json = JSON.parse(schemas.get(schema) ?? 'null') as Parameters<
      typeof z.fromJSONSchema
    >[0];
    const result = z.fromJSONSchema(json).safeParse(parse(text, { merge: true }));
    expect(result.error?.issues ?? []).toEqual([]);
  });

  it('refuse what the product refuses', () => {
    const json = JSON.parse(schemas.get('rule-table.schema.json') ?? 'null') as Parameters<
      typeof z.fromJSONSchema
    >[0];
    const table = parse(read('gb.yaml'), { merge: true }) as { rules: Record<string, unknown>[] };
    const [rule] = table.rules;
    if (rule) rule.classes = ['parchment'];
    expect(z.fromJSONSchema(json).safeParse(table).success).toBe(false);
  });
});
