import type { Household } from '../../../../server/contract/households.ts';
import { circumstanceNames } from '../../../../server/contract/households.ts';
import { Section } from '../../../components/ui/section.tsx';
import { formatDay } from '../../../lib/format.ts';
import { circumstanceWords, describeCircumstance } from '../logic/circumstance-words.ts';
import { describeValue, fieldWords, readHouseholdValues } from '../logic/household-values.ts';

const plainFields = ['name', 'country', 'region', 'timeZone', 'businessNames', 'hopes'] as const;

/** What is known about a household, for those who may not change it. */
export function AboutFacts({ household }: { household: Household }) {
  const values = readHouseholdValues(household);
  const row = 'grid gap-x-6 border-t border-line py-2.5 sm:grid-cols-[minmax(0,1fr)_minmax(0,2fr)]';
  return (
    <>
      <Section title="The household">
        <dl>
          {plainFields.map((field) => (
            <div key={field} className={row}>
              <dt className="text-ink-soft">{fieldWords[field]}</dt>
              <dd className="whitespace-pre-line">{describeValue(field, values)}</dd>
            </div>
          ))}
        </dl>
      </Section>
      <Section title="People">
        <dl>
          {household.people.map((person) => (
            <div key={person.name} className={row}>
              <dt>{person.name}</dt>
              <dd className="text-ink-soft">
                {[
                  person.birthDate ? `born ${formatDay(person.birthDate)}` : '',
                  person.diedOn ? `died ${formatDay(person.diedOn)}` : '',
                ]
                  .filter(Boolean)
                  .join(', ')}
              </dd>
            </div>
          ))}
        </dl>
      </Section>
      <Section title="Circumstances">
        <dl>
          {circumstanceNames.map((name) => (
            <div key={name} className={row}>
              <dt className="text-ink-soft">{circumstanceWords[name]}</dt>
              <dd>{describeCircumstance(household.circumstances[name])}</dd>
            </div>
          ))}
        </dl>
      </Section>
    </>
  );
}
