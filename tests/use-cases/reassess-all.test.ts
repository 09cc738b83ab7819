/** After an edit of the rules every paper in the house follows, lot by lot, and nothing else changes. */
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { lengthenRules } from '../../server/commands/measuring/bench-database.ts';
import { fillWithPapers } from '../../server/commands/measuring/bench-papers.ts';
import { PaperModel } from '../../server/db/models/paper-model.ts';
import { reassessAll } from '../../server/use-cases/reassess-all.ts';
import { startTestApp, type TestApp } from '../support/app.ts';

const today = '2026-12-01';

describe('reassessing after an edit', () => {
  let app: TestApp;
  let ids: string[];

  beforeAll(async () => {
    app = await startTestApp();
    const { ruleSet } = app.deps;
    ids = await fillWithPapers(
      app.deps.database,
      { households: 4, papersEach: 30 },
      { today, ruleSet },
    );
  });
  afterAll(() => app.close());

  const read = () =>
    PaperModel.findAll({ where: { householdId: ids }, order: [['id', 'ASC']], raw: true });

  it('moves the dates by lots that do not divide the number of papers, and tells how far it is', async () => {
    const before = await read();
    await PaperModel.update({ status: 'left' }, { where: { id: before[0]?.id ?? '' } });
    const ruleSet = lengthenRules(app.deps.ruleSet, 'edited');
    const told: number[] = [];
    const count = await reassessAll(ids, () => ({ today, ruleSet }), {
      lot: 7,
      onProgress: ({ done, total }) => {
        expect(total).toBe(119);
        told.push(done);
      },
    });
    expect(count).toBe(119);
    expect(told).toEqual([...told].sort((a, b) => a - b));
    expect(told.at(-1)).toBe(119);

    const after = await read();
    expect(after).toHaveLength(before.length);
    let moved = 0;
    for (const [index, paper] of after.entries()) {
      const old = before[index];
      expect(paper.version).toBe(old?.version);
      if (index === 0) {
        expect(paper.ruleSetVersion).toBe(old?.ruleSetVersion);
        expect(paper.keepUntil).toBe(old?.keepUntil);
        continue;
      }
      expect(paper.ruleSetVersion).toBe('edited');
      expect(paper.keepUntil).toBe(paper.assessment.keepUntil);
      expect((paper.keepUntil ?? '9') >= (old?.keepUntil ?? '')).toBe(true);
      if (paper.keepUntil !== old?.keepUntil) moved += 1;
    }
    expect(moved).toBeGreaterThan(10);
  });

  it('keeps what was done when the work is interrupted', async () => {
    const lengthened = lengthenRules(app.deps.ruleSet, 'interrupted');
    let asked = 0;
    const work = reassessAll(
      ids,
      () => {
        asked += 1;
        if (asked > 2) throw new Error('interrupted');
        return { today, ruleSet: lengthened };
      },
      { lot: 7, lanes: 1 },
    );
    await expect(work).rejects.toThrow('interrupted');
    const done = (await read()).filter((paper) => paper.ruleSetVersion === 'interrupted');
    expect(done.length).toBeGreaterThanOrEqual(59);
    expect(done.length).toBeLessThan(119);
  });
});
