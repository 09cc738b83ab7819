import { describe, expect, test } from 'vitest';
import { findMrz } from '../../../server/reading/facts/mrz.ts';

// Specimens of ICAO Doc 9303, part 4 (passport, TD3) and part 5 (card, TD1), with their check digits.
const passport = [
  'P<UTOERIKSSON<<ANNA<MARIA<<<<<<<<<<<<<<<<<<<',
  'L898902C36UTO7408122F1204159ZE184226B<<<<<10',
];
const card = [
  'I<UTOD231458907<<<<<<<<<<<<<<<',
  '7408122F1204159UTO<<<<<<<<<<<6',
  'ERIKSSON<<ANNA<MARIA<<<<<<<<<<',
];

const passportFacts = {
  valid: true,
  documentNumber: 'L898902C3',
  issuingState: 'UTO',
  surname: 'ERIKSSON',
  givenNames: 'ANNA MARIA',
  birthDate: '1974-08-12',
  expiryDate: '2012-04-15',
};

describe('the machine-readable zone of the ICAO specimens', () => {
  test('of the passport is read and all check digits are right', () => {
    const mrz = findMrz(['PASSPORT', ...passport]);
    expect(mrz).toMatchObject(passportFacts);
    expect(mrz?.checks.every((check) => check.valid)).toBe(true);
  });

  test('of the card is read', () => {
    const mrz = findMrz(card);
    expect(mrz).toMatchObject({
      valid: true,
      documentNumber: 'D23145890',
      birthDate: '1974-08-12',
      expiryDate: '2012-04-15',
    });
  });

  test.each([
    ['fillers read as K', 'P<UTOERIKSSON<<ANNA<MARIA<<<<<<<KK<<<<<<<<<<', passport[1] ?? ''],
    ['a nought read as O', passport[0] ?? '', 'L898902C36UTO7408122F1204159ZE184226B<<<<<1O'],
    [
      'a letter O read as nought',
      passport[0] ?? '',
      'L898902C36UT07408122F1204159ZE184226B<<<<<10',
    ],
  ])('is mended: %s', (_name, first, second) => {
    expect(findMrz([first, second])).toMatchObject(passportFacts);
  });

  test('shows a wrong date by its check digit', () => {
    const mrz = findMrz([passport[0] ?? '', 'L898902C36UTO7408122F1304159ZE184226B<<<<<10']);
    expect(mrz?.checks.find((check) => check.field === 'expiryDate')?.valid ?? false).toBe(false);
    expect(mrz?.valid ?? false).toBe(false);
  });

  test('is not seen in ordinary print', () => {
    expect(findMrz(['Invoice 4411 of 3 May 2024', 'Total due 12.40'])).toBeNull();
  });
});
