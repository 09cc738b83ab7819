/** `npm run rules:check [-- FOLDER]`: every fault of the rule tables with its place; exit status 1 when there is one. */
import { checkRuleTables, writeFault } from '../rule-tables.ts';

const now = new Date();
const today = [now.getFullYear(), now.getMonth() + 1, now.getDate()]
  .map((part) => String(part).padStart(2, '0'))
  .join('-');
const folder = process.argv[2];
const { tables, faults } = checkRuleTables(folder, today);
for (const fault of faults) process.stdout.write(`${writeFault(fault)}\n`);
const ruleCount = tables.reduce((sum, table) => sum + table.rules.length, 0);
process.stdout.write(
  faults.length === 0
    ? `${ruleCount} rules in ${tables.length} tables, no fault.\n`
    : `${faults.length} ${faults.length === 1 ? 'fault' : 'faults'}.\n`,
);
process.exitCode = faults.length === 0 ? 0 : 1;
