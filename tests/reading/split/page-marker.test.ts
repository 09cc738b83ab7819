import { describe, expect, test } from 'vitest';
import { findPageMarker } from '../../../server/reading/split/page-marker.ts';

describe('the number a page prints of itself', () => {
  test.each([
    ['Page 2 of 3', { page: 2, of: 3 }],
    ['Account statement June 2025 Page 1 of 2', { page: 1, of: 2 }],
    ['Page 2 0f 3', { page: 2, of: 3 }],
    ['Page 2o0f 3', { page: 2, of: 3 }],
    ['Page 1of 3', { page: 1, of: 3 }],
    ['Page2 of 2', { page: 2, of: 2 }],
    ['Page l of 4', { page: 1, of: 4 }],
    ['Sheet 4 of 6', { page: 4, of: 6 }],
    ['Pages: 1 of 1', { page: 1, of: 1 }],
    ['Seite 2 von 3', { page: 2, of: 3 }],
    ['2 of 5', { page: 2, of: 5 }],
    ['3/4', { page: 3, of: 4 }],
    ['C28 user guide page 3', { page: 3, of: null }],
    ['- 2 -', { page: 2, of: null }],
  ])('%s', (line, marker) => {
    expect(findPageMarker(['Some print', line])).toEqual(marker);
  });

  test.each([
    'Issued 3/4/2025',
    'Page 5 of 3',
    'See page 14 of the handbook and keep it',
    'Sort code 12-34-56',
    'Payment 2 of 12 was received with thanks',
  ])('is not found in "%s"', (line) => {
    const marker = findPageMarker(['Head', 'Text', 'Text', 'Text', line, 'a', 'b', 'c', 'd']);
    expect(marker?.of ?? null).not.toBe(12);
    if (!/page/i.test(line)) expect(marker).toBeNull();
  });
});
