import { describe, expect, it } from 'vitest';
import { mergeEdits, pickChanges } from '../../../src/lib/merge-edits.ts';

const base = { name: 'Pennelow', country: 'GB', hopes: '' };

describe('two people change the same record', () => {
  it('keeps both when they changed different things', () => {
    const merged = mergeEdits(base, { ...base, hopes: 'less' }, { ...base, country: 'IE' });
    expect(merged.clashes).toEqual([]);
    expect(merged.withMine).toEqual({ name: 'Pennelow', country: 'IE', hopes: 'less' });
    expect(merged.withTheirs).toEqual(merged.withMine);
  });

  it('names what both changed, and lets either win without losing the rest', () => {
    const mine = { name: 'The Pennelows', country: 'GB', hopes: 'less' };
    const theirs = { name: 'Pennelow family', country: 'IE', hopes: '' };
    const merged = mergeEdits(base, mine, theirs);
    expect(merged.clashes).toEqual(['name']);
    expect(merged.withMine).toEqual({ name: 'The Pennelows', country: 'IE', hopes: 'less' });
    expect(merged.withTheirs).toEqual({ name: 'Pennelow family', country: 'IE', hopes: 'less' });
  });

  it('sends only what was changed', () => {
    expect(pickChanges(base, { ...base, hopes: 'less' })).toEqual({ hopes: 'less' });
  });
});
