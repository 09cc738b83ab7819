/** Countries, regions and time zones to choose from. */
import { tableCountries } from '../../server/contract/cases.ts';
import { formatCountry } from './format.ts';

export interface Choice {
  value: string;
  label: string;
}

/** Two-letter codes that the browser still names although the country or code is gone or is none. */
const notCountries = new Set(
  'AC AN BU CP CQ CS CT DD DG DY EA EU EZ FQ FX HV IC IO JT MI NH NQ NT PC PU PZ QO RH SU TA TP UK UN VD WK XA XB YD YU ZR ZZ'.split(
    ' ',
  ),
);

function sortByLabel(choices: Choice[]): Choice[] {
  return choices.sort((a, b) => a.label.localeCompare(b.label, 'en'));
}

/** The countries that come with rules. */
export const countriesWithRules: Choice[] = sortByLabel(
  tableCountries.map((code) => ({ value: code, label: formatCountry(code) })),
);

/** All other countries: their papers stay open until the adviser was asked. */
export function listOtherCountries(): Choice[] {
  const names = new Intl.DisplayNames(['en'], { type: 'region', fallback: 'none' });
  const letters = 'ABCDEFGHIJKLMNOPQRSTUVWXYZ'.split('');
  const withRules = new Set<string>(tableCountries);
  const codes = letters.flatMap((a) => letters.map((b) => a + b));
  return sortByLabel(
    codes.flatMap((code) => {
      if (notCountries.has(code) || withRules.has(code)) return [];
      const label = names.of(code);
      return label ? [{ value: code, label }] : [];
    }),
  );
}

function spell(names: string): Choice[] {
  return names.split(', ').map((label) => ({
    value: label.toLowerCase().replace(/ /g, '-'),
    label,
  }));
}

function pair(text: string): Choice[] {
  return text.split(', ').map((entry) => {
    const at = entry.indexOf(' ');
    return { value: entry.slice(0, at).toLowerCase(), label: entry.slice(at + 1) };
  });
}

const regions: Record<string, Choice[]> = {
  GB: [
    { value: 'england-wales', label: 'England or Wales' },
    { value: 'scotland', label: 'Scotland' },
    { value: 'northern-ireland', label: 'Northern Ireland' },
  ],
  CA: spell(
    'Alberta, British Columbia, Manitoba, New Brunswick, Newfoundland and Labrador, Northwest Territories, ' +
      'Nova Scotia, Nunavut, Ontario, Prince Edward Island, Quebec, Saskatchewan, Yukon',
  ),
  AU: pair(
    'ACT Australian Capital Territory, NSW New South Wales, NT Northern Territory, QLD Queensland, ' +
      'SA South Australia, TAS Tasmania, VIC Victoria, WA Western Australia',
  ),
  US: pair(
    'AL Alabama, AK Alaska, AZ Arizona, AR Arkansas, CA California, CO Colorado, CT Connecticut, DE Delaware, ' +
      'DC District of Columbia, FL Florida, GA Georgia, HI Hawaii, ID Idaho, IL Illinois, IN Indiana, IA Iowa, ' +
      'KS Kansas, KY Kentucky, LA Louisiana, ME Maine, MD Maryland, MA Massachusetts, MI Michigan, ' +
      'MN Minnesota, MS Mississippi, MO Missouri, MT Montana, NE Nebraska, NV Nevada, NH New Hampshire, ' +
      'NJ New Jersey, NM New Mexico, NY New York, NC North Carolina, ND North Dakota, OH Ohio, OK Oklahoma, ' +
      'OR Oregon, PA Pennsylvania, RI Rhode Island, SC South Carolina, SD South Dakota, TN Tennessee, ' +
      'TX Texas, UT Utah, VT Vermont, VA Virginia, WA Washington, WV West Virginia, WI Wisconsin, WY Wyoming',
  ),
};

/** The parts of a country whose rules differ; empty where that is not so, or not known. */
export function listRegions(country: string): Choice[] {
  return regions[country] ?? [];
}

const usualTimeZones: Record<string, string> = {
  GB: 'Europe/London',
  IE: 'Europe/Dublin',
  DE: 'Europe/Berlin',
  US: 'America/New_York',
  CA: 'America/Toronto',
  AU: 'Australia/Sydney',
};

/** The time zone to begin with for a country. */
export function suggestTimeZone(country: string): string {
  return usualTimeZones[country] ?? Intl.DateTimeFormat().resolvedOptions().timeZone;
}

/** All time zones the browser knows, and the one that is set even when it does not. */
export function listTimeZones(current: string): string[] {
  const known = Intl.supportedValuesOf('timeZone');
  return known.includes(current) || !current ? known : [current, ...known];
}
