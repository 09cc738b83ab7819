import type { z } from 'zod';
import { updateHouseholdSchema } from '../../../../server/contract/households.ts';
import type { Household } from '../../../../server/contract/households.ts';
import { formatCountry } from '../../../lib/format.ts';
import { listRegions } from '../../../lib/places.ts';
import {
  circumstanceWords,
  describeCircumstance,
  fillCircumstances,
} from './circumstance-words.ts';
import { circumstanceNames } from '../../../../server/contract/households.ts';

/** What the form about a household edits: the contract's schema, every field filled in. */
export const householdFormSchema = updateHouseholdSchema.required().omit({ leadDays: true });
export type HouseholdValues = z.output<typeof householdFormSchema>;

/** A household's editable fields. */
export function readHouseholdValues(household: Household): HouseholdValues {
  return {
    name: household.name,
    country: household.country,
    region: household.region,
    timeZone: household.timeZone,
    circumstances: fillCircumstances(household.circumstances),
    people: household.people,
    businessNames: household.businessNames,
    hopes: household.hopes,
  };
}

export const fieldWords: Record<keyof HouseholdValues, string> = {
  name: 'Name',
  country: 'Country',
  region: 'Region',
  timeZone: 'Time zone',
  circumstances: 'Circumstances',
  people: 'People',
  businessNames: 'Business names',
  hopes: 'What they hope for',
};

/** One field's value in words, for laying two versions side by side. */
export function describeValue(field: keyof HouseholdValues, values: HouseholdValues): string {
  switch (field) {
    case 'country':
      return formatCountry(values.country);
    case 'region':
      return (
        listRegions(values.country).find((region) => region.value === values.region)?.label ??
        values.region ??
        'Not known'
      );
    case 'circumstances':
      return circumstanceNames
        .filter((name) => (values.circumstances[name]?.answer ?? 'not-asked') !== 'not-asked')
        .map(
          (name) =>
            `${circumstanceWords[name]}: ${describeCircumstance(values.circumstances[name])}`,
        )
        .join('; ');
    case 'people':
      return values.people.map((person) => person.name).join(', ') || 'Nobody';
    case 'businessNames':
      return values.businessNames.join(', ') || 'None';
    default:
      return values[field] || '–';
  }
}
