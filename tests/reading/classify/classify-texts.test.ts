import { describe, expect, test } from 'vitest';
import { documentClasses } from '../../../server/contract/document-classes.ts';
import { readPaper } from '../../../server/reading/papers.ts';
import { pagesOfText } from '../support/page-of-text.ts';
import { loadSampleTexts } from './sample-texts.ts';

const readings = loadSampleTexts().map((sample) => ({
  sample,
  reading: readPaper(pagesOfText(sample.text), { country: sample.country }),
}));
const groups = [...new Set(readings.map(({ sample }) => sample.group))];

function share(list: typeof readings, isRight: (item: (typeof readings)[number]) => boolean) {
  const wrong = list.filter((item) => !isRight(item));
  return {
    right: 1 - wrong.length / Math.max(1, list.length),
    wrong: wrong.map(
      ({ sample, reading }) =>
        `${sample.class} (${sample.name}): ${reading.class}, ${reading.country}, ${reading.facts.keyDate}`,
    ),
  };
}

describe('invented papers of six countries', () => {
  test('cover every kind of paper that print can show', () => {
    const covered = new Set(readings.map(({ sample }) => sample.class));
    const left = documentClasses.map(({ id }) => id).filter((id) => !covered.has(id));
    expect(left).toEqual(['photograph', 'unrecognised']);
  });

  test.each(groups)('%s: nine of ten are named rightly', (group) => {
    const own = readings.filter(({ sample }) => sample.group === group);
    const { right, wrong } = share(own, ({ sample, reading }) => reading.class === sample.class);
    expect(right, wrong.join('\n')).toBeGreaterThanOrEqual(0.9);
  });

  test('of those the reader is sure of, 98 of 100 are right', () => {
    const sure = readings.filter(({ reading }) => reading.confidence >= 0.8);
    const { right, wrong } = share(sure, ({ sample, reading }) => reading.class === sample.class);
    expect(sure.length).toBeGreaterThan(readings.length * 0.75);
    expect(right, wrong.join('\n')).toBeGreaterThanOrEqual(0.98);
  });

  test('the country is right or left open', () => {
    const named = readings.filter(({ reading }) => reading.country !== null);
    const { right, wrong } = share(
      named,
      ({ sample, reading }) => reading.country === sample.country,
    );
    expect(named.length).toBeGreaterThan(readings.length * 0.75);
    expect(right, wrong.join('\n')).toBeGreaterThanOrEqual(0.98);
  });

  test('the key date is right on nine of ten', () => {
    const dated = readings.filter(({ sample }) => sample.keyDate !== undefined);
    const { right, wrong } = share(
      dated,
      ({ sample, reading }) => reading.facts.keyDate === sample.keyDate,
    );
    expect(right, wrong.join('\n')).toBeGreaterThanOrEqual(0.9);
  });
});
