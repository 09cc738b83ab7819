/** Stored papers assessed anew after an edit, beside one plain UPDATE of the same columns on the same rows. */
import { monitorEventLoopDelay } from 'node:perf_hooks';
import type { Database } from '../../db/connection.ts';
import type { Rule } from '../../retention/rule-schema.ts';
import { buildRuleSet, type RuleSet } from '../../retention/rule-set.ts';
import { reassessAll } from '../../use-cases/reassess-all.ts';
import { fillWithPapers } from './bench-papers.ts';

export interface DatabaseFigures {
  papers: number;
  moved: number;
  reassessMs: number;
  updateMs: number;
  /** Resident memory before, and the most while it ran, in bytes. */
  memory: { before: number; most: number };
  /** How long others waited while it ran: a page of the register (95 of 100), and the event loop at worst. */
  others: { registerMs: number; loopMs: number; asked: number };
}

/** The tables as if a practice had made every fixed period a year longer. */
export function lengthenRules(ruleSet: RuleSet, version: string): RuleSet {
  const lengthen = (rule: Rule): Rule => {
    const { keep } = rule;
    if (keep.how !== 'period' || typeof keep.period !== 'string') return rule;
    const period = keep.period.replace(/^P(\d+)Y$/, (_, years) => `P${Number(years) + 1}Y`);
    return { ...rule, keep: { ...keep, period } };
  };
  const tables = [ruleSet.common, ...ruleSet.tables.values()].map(({ table }) => ({
    ...table,
    rules: table.rules.map(lengthen),
  }));
  return buildRuleSet(tables, ruleSet.handling, version);
}

const plainUpdate = `update papers set
  assessment = jsonb_set(assessment, '{keepUntil}', coalesce(to_jsonb(keep_until + 1), 'null'::jsonb)),
  keep_until = keep_until + 1, shred_from = shred_from + 1, advised_until = advised_until + 1,
  permanent = permanent, open = open, held = held, rule = rule || '', security_level = security_level,
  rule_set_version = 'plain', assessed_on = assessed_on, stepped_down = stepped_down
  where household_id = any($ids::uuid[]) and status <> 'left'`;

async function timeUpdate(database: Database, ids: string[]): Promise<number> {
  await database.query('vacuum analyze papers');
  const started = performance.now();
  await database.query(plainUpdate, { bind: { ids } });
  return performance.now() - started;
}

/** Asks for a page of the register again and again, as somebody at work would. */
function watchOthers(database: Database, householdId: string) {
  const waits: number[] = [];
  let isOver = false;
  const ask = async (): Promise<void> => {
    while (!isOver) {
      const started = performance.now();
      await database.query(
        `select id, class, keep_until, rule from papers where household_id = $householdId and status = 'kept' order by number limit 50`,
        { bind: { householdId } },
      );
      waits.push(performance.now() - started);
      await new Promise((resolve) => setTimeout(resolve, 100));
    }
  };
  const asking = ask();
  return {
    async stop(): Promise<{ registerMs: number; asked: number }> {
      isOver = true;
      await asking;
      waits.sort((a, b) => a - b);
      return { registerMs: waits[Math.floor(waits.length * 0.95)] ?? 0, asked: waits.length };
    },
  };
}

/** Fills the database, edits the rules, and measures both. `say` is told how far it got. */
export async function measureInDatabase(
  database: Database,
  ruleSet: RuleSet,
  counts: { households: number; papersEach: number },
  say: (line: string) => void,
): Promise<DatabaseFigures> {
  const today = '2026-12-01';
  say(`Filling ${counts.households} households with ${counts.papersEach} papers each.`);
  const ids = await fillWithPapers(database, counts, { today, ruleSet });
  const before = await timeUpdate(database, ids);
  say(`One plain UPDATE: ${Math.round(before)} ms.`);
  await database.query('vacuum analyze papers');

  const day = { today, ruleSet: lengthenRules(ruleSet, 'edited') };
  const memory = { before: process.memoryUsage().rss, most: 0 };
  const sampling = setInterval(() => {
    memory.most = Math.max(memory.most, process.memoryUsage().rss);
  }, 100);
  const loop = monitorEventLoopDelay({ resolution: 10 });
  loop.enable();
  const others = watchOthers(database, ids[0] ?? '');
  let shown = 0;
  const started = performance.now();
  const papers = await reassessAll(ids, () => day, {
    onProgress: ({ done, total }) => {
      const tenth = Math.floor((done / total) * 10);
      if (tenth > shown) say(`${done} of ${total} assessed anew.`);
      shown = tenth;
    },
  });
  const reassessMs = performance.now() - started;
  loop.disable();
  const waits = await others.stop();
  clearInterval(sampling);
  const [rows] = await database.query(
    `select count(*) filter (where rule_set_version = 'edited')::int as moved from papers where household_id = any($ids::uuid[])`,
    { bind: { ids } },
  );
  const after = await timeUpdate(database, ids);
  say(`The plain UPDATE again: ${Math.round(after)} ms.`);
  return {
    papers,
    moved: (rows as { moved: number }[])[0]?.moved ?? 0,
    reassessMs,
    updateMs: (before + after) / 2,
    memory,
    others: { ...waits, loopMs: loop.max / 1e6 },
  };
}
