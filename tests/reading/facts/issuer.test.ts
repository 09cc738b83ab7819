import { describe, expect, test } from 'vitest';
import { findEmployer, findIssuer } from '../../../server/reading/facts/issuer.ts';
import { listPaperLines } from '../../../server/reading/facts/paper-lines.ts';
import { pageOfText } from '../support/page-of-text.ts';

const issuerOf = (text: string) => findIssuer(listPaperLines([pageOfText(text)]))?.value ?? null;

describe('the issuer', () => {
  test('is the letterhead, not the heading and not the person written to', () => {
    expect(
      issuerOf(`
# Corrin Card Services
PO Box 9, Wenford WN1 2AB
# Your credit card statement
Mr P Olander
9 Birch Walk
Wenford WN4 5CD
Statement date 12 April 2024`),
    ).toBe('Corrin Card Services');
  });

  test('keeps no marks of a logo, and "plc" is "plc"', () => {
    expect(issuerOf('# ¢ bd Brackwater Energy ple\n3 Lock Lane, Wenford\nElectricity')).toBe(
      'Brackwater Energy plc',
    );
  });

  test('is put together again when its name fills two lines', () => {
    expect(issuerOf('# Corrin & Vale\n# Bank ple\n2 Market Street\nCurrent account')).toBe(
      'Corrin & Vale Bank plc',
    );
  });

  test('is an authority where one is named', () => {
    expect(issuerOf('HM Revenue\nand Customs HMRC\nDate 3 May 2024')).toBe('HM Revenue & Customs');
  });

  test('is nobody where there are only marks', () => {
    expect(issuerOf('# ala\ne e re')).toBeNull();
  });

  test('of a yearly slip of pay is the employer', () => {
    const lines = listPaperLines([
      pageOfText(`
P60 End of Year Certificate
Employer's full name and address
Holt Joinery Limited
Employer PAYE reference 120/LB0041`),
    ]);
    expect(findEmployer(lines)?.value).toBe('Holt Joinery Limited');
  });
});
