/** The story that the demo's two households tell; the papers are those of `tests/fixtures/demo`. */
import type { z } from 'zod';
import type { createHouseholdSchema } from '../../contract/households.ts';
import type { enterPaperSchema, UpdatePaper } from '../../contract/papers.ts';

export interface DemoPaper {
  /** File in the household's folder. */
  file: string;
  /** What a person decided; absent: it waits on the review desk. */
  decision?: UpdatePaper;
  hold?: { kind: 'claim'; reason: string };
}

export interface DemoBox {
  label: string;
  area: string;
  /** Read while the demo is set up. */
  papers: DemoPaper[];
  /** Left to the worker: waits on the desk soon after the start. */
  piles: string[];
}

export interface DemoHousehold {
  folder: string;
  roles: ('assistant' | 'client' | 'adviser')[];
  household: z.input<typeof createHouseholdSchema>;
  boxes: DemoBox[];
  /** Entered by hand, with what was decided. */
  entered: { paper: z.input<typeof enterPaperSchema>; decision?: UpdatePaper }[];
  filings: { taxYear: string; answer: 'on-time' | 'on-day'; filedOn?: string }[];
}

interface DemoBundle {
  class: 'bank-statement' | 'utility-bill' | 'telecom-bill';
  title: string;
  from: string;
  to: string;
  sheets: number;
  issuer: string;
  /** Where it lies, if it stays; a pile if it goes. */
  place?: string;
  pile?: 'shred';
}

function describeBundle(bundle: DemoBundle): DemoHousehold['entered'][number] {
  const answers = { usedForTax: false, endedOn: bundle.to };
  return {
    paper: {
      class: bundle.class,
      title: bundle.title,
      bundle: true,
      bundleFrom: bundle.from,
      bundleTo: bundle.to,
      sheets: bundle.sheets,
      facts: {
        dates: { periodStart: bundle.from, periodEnd: bundle.to, issued: bundle.to },
        issuer: bundle.issuer,
      },
      ...(bundle.place ? { place: bundle.place } : {}),
    },
    decision: bundle.pile
      ? { pile: bundle.pile, answers }
      : { pile: 'file-here', keptBecause: 'duty', answers },
  };
}

/** @param passportExpiresOn a day within the usual notice, so that a reminder goes out */
export function describeDemoHouseholds(passportExpiresOn: string): DemoHousehold[] {
  return [
    {
      folder: 'pennelow',
      roles: ['assistant', 'client', 'adviser'],
      household: {
        name: 'Pennelow',
        country: 'GB',
        region: 'england-wales',
        timeZone: 'Europe/London',
        people: [
          { name: 'Leonard Arthur Pennelow', birthDate: '1951-05-17' },
          { name: 'Winifred Joan Pennelow', birthDate: '1953-11-09' },
        ],
        circumstances: {
          selfEmployed: { answer: 'no' },
          landlord: { answer: 'yes', from: '1989-03-01' },
          company: { answer: 'no' },
          vatRegistered: { answer: 'no' },
          employer: { answer: 'no' },
          filesReturn: { answer: 'yes' },
          attorneyActing: { answer: 'no' },
          capacityInDoubt: { answer: 'no' },
        },
        hopes: 'The bureau to close again, and to know where the passports are.',
      },
      boxes: [
        {
          label: 'Study shelf',
          area: 'Study',
          piles: [],
          papers: [
            {
              file: 'IMG_090.jpg',
              decision: { pile: 'file-here', keptBecause: 'use', place: 'Bureau, top drawer' },
            },
            {
              file: 'scan-030.pdf',
              decision: {
                pile: 'file-elsewhere',
                keptBecause: 'duty',
                place: 'With the solicitor',
              },
            },
            {
              file: 'scan-047.pdf',
              decision: {
                pile: 'file-here',
                keptBecause: 'use',
                place: 'Blue folder',
                answers: { usedForTax: false },
              },
            },
            {
              file: 'scan-018.pdf',
              decision: {
                pile: 'file-here',
                keptBecause: 'use',
                place: 'Blue folder',
                answers: { usedForTax: false },
              },
            },
            {
              file: 'scan-058.pdf',
              decision: {
                pile: 'file-here',
                keptBecause: 'duty',
                place: 'Blue folder',
                answers: { usedForTax: false },
              },
            },
            { file: 'scan-011.jpg', decision: { pile: 'recycle' } },
            { file: 'scan-080.jpg', decision: { pile: 'shred' } },
            {
              file: 'scan-010.pdf',
              decision: { pile: 'file-here', keptBecause: 'duty', place: 'Blue folder' },
              hold: { kind: 'claim', reason: 'The claim for the burst pipe is not settled yet.' },
            },
          ],
        },
        {
          label: 'Bureau',
          area: 'Study',
          papers: [
            { file: 'scan-104.pdf' },
            { file: 'scan-085.pdf' },
            { file: 'scan-017.pdf' },
            { file: 'scan-078.pdf' },
          ],
          piles: ['pile-a.pdf'],
        },
        { label: 'Hall cupboard', area: 'Hall', papers: [], piles: [] },
      ],
      entered: [
        {
          paper: {
            class: 'passport',
            title: "Winifred's passport, in the bureau",
            facts: { dates: { expiry: passportExpiresOn }, addressee: 'Winifred Joan Pennelow' },
            place: 'Bureau, top drawer',
          },
          decision: { pile: 'file-here', keptBecause: 'use' },
        },
        describeBundle({
          class: 'bank-statement',
          title: 'Bank statements 2012 to 2014',
          from: '2012-01-31',
          to: '2014-12-31',
          sheets: 36,
          issuer: 'Corbel & Tarn Bank plc',
          pile: 'shred',
        }),
        describeBundle({
          class: 'utility-bill',
          title: 'Electricity and gas bills 2012 to 2016',
          from: '2012-02-01',
          to: '2016-11-30',
          sheets: 22,
          issuer: 'Normoor Energy',
          pile: 'shred',
        }),
        ...[2021, 2022, 2023, 2024, 2025].map((year) =>
          describeBundle({
            class: 'bank-statement',
            title: `Bank statements ${String(year)}`,
            from: `${String(year)}-01-31`,
            to: `${String(year)}-12-31`,
            sheets: 12 + 2 * (2025 - year),
            issuer: 'Corbel & Tarn Bank plc',
            place: 'Blue folder',
          }),
        ),
        ...[2021, 2022, 2023, 2024].map((year) =>
          describeBundle({
            class: 'telecom-bill',
            title: `Telephone bills ${String(year)}`,
            from: `${String(year)}-02-14`,
            to: `${String(year)}-11-14`,
            sheets: 8,
            issuer: 'Larkwire',
            place: 'Blue folder',
          }),
        ),
        {
          paper: {
            class: 'birth-certificate',
            title: 'Certificates of the family',
            sheets: 6,
            place: 'Bureau, top drawer',
          },
          decision: { pile: 'file-here', keptBecause: 'duty' },
        },
        {
          paper: {
            class: 'keepsake',
            title: 'Letters from Martin at university',
            sheets: 12,
            place: 'Cedar chest',
          },
          decision: { pile: 'file-here', keptBecause: 'dear' },
        },
      ],
      filings: [{ taxYear: '2024-25', answer: 'on-time' }],
    },
    {
      folder: 'tarrow',
      roles: ['assistant'],
      household: {
        name: 'Tarrow',
        country: 'GB',
        region: 'england-wales',
        timeZone: 'Europe/London',
        businessNames: ['Tarrow Gardens'],
        people: [
          { name: 'Callum Reid Tarrow', birthDate: '1984-08-02' },
          { name: 'Aoife Tarrow', birthDate: '1986-02-21' },
          { name: 'Finn Callum Tarrow', birthDate: '2013-03-14' },
          { name: 'Maeve Rose Tarrow', birthDate: '2017-06-30' },
        ],
        circumstances: {
          selfEmployed: { answer: 'yes', from: '2015-04-06' },
          vatRegistered: { answer: 'yes' },
          employer: { answer: 'yes' },
          filesReturn: { answer: 'yes' },
        },
        hopes: 'A kitchen table without papers on it.',
      },
      boxes: [
        {
          label: 'Kitchen drawer',
          area: 'Kitchen',
          papers: [
            {
              file: 'scan-067.pdf',
              decision: { pile: 'file-here', keptBecause: 'duty', place: 'Red folder' },
            },
            {
              file: 'scan-053.pdf',
              decision: { pile: 'file-here', keptBecause: 'use', place: 'Red folder' },
            },
            {
              file: 'download-072.pdf',
              decision: { pile: 'file-here', keptBecause: 'duty', place: 'Business drawer' },
            },
            {
              file: 'download-008.pdf',
              decision: { pile: 'file-here', keptBecause: 'duty', place: 'Business drawer' },
            },
            { file: 'scan-048.pdf' },
            { file: 'scan-087.pdf' },
          ],
          piles: ['pile-b.pdf'],
        },
      ],
      entered: [],
      filings: [{ taxYear: '2024-25', answer: 'on-time' }],
    },
  ];
}
