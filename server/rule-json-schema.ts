/** JSON Schemas of the files in `rules/`, so that an editor completes and checks what it is given. */
import { z } from 'zod';
import { handlingSchema, ruleTableSchema } from './retention/rule-schema.ts';

function describeFile(
  file: string,
  title: string,
  schema: z.ZodType,
): { file: string; text: string } {
  // What a person writes, so that a key with a default may be left out.
  const json = z.toJSONSchema(schema, {
    io: 'input',
    target: 'draft-7',
    reused: 'ref',
    unrepresentable: 'any',
  });
  return { file, text: `${JSON.stringify({ title, ...json }, null, 2)}\n` };
}

/** Each schema with the name of its file in `rules/`. */
export function describeRuleSchemas(): { file: string; text: string }[] {
  return [
    describeFile('rule-table.schema.json', 'Rule table', ruleTableSchema),
    describeFile('handling.schema.json', 'Handling of papers that leave', handlingSchema),
  ];
}
