/** `npm run rules:schema`: writes the JSON Schemas of the rule tables for editors, from the schemas that check them. */
import { writeFileSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { describeRuleSchemas } from '../rule-json-schema.ts';

const folder = fileURLToPath(new URL('../../rules', import.meta.url));
for (const { file, text } of describeRuleSchemas()) {
  writeFileSync(path.join(folder, file), text);
  process.stdout.write(`rules/${file}\n`);
}
