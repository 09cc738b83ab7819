import { zodResolver } from '@hookform/resolvers/zod';
import { FormProvider, useForm } from 'react-hook-form';
import { createHouseholdSchema } from '../../../../server/contract/households.ts';
import type { Household } from '../../../../server/contract/households.ts';
import { Banner } from '../../../components/ui/banner.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Section } from '../../../components/ui/section.tsx';
import { TextArea, TextInput } from '../../../components/ui/text-input.tsx';
import { sentenceOf } from '../../../lib/api-error.ts';
import { applyFieldProblems } from '../../../lib/form-problems.ts';
import { suggestTimeZone } from '../../../lib/places.ts';
import { useCreateHousehold } from '../api/create-household.ts';
import { PeopleFields } from './people-fields.tsx';
import { PlaceFields } from './place-fields.tsx';

/** The first facts about a household; circumstances are asked afterwards, together with the client. */
export function NewHouseholdForm({ onCreated }: { onCreated: (household: Household) => void }) {
  const create = useCreateHousehold();
  const form = useForm({
    resolver: zodResolver(createHouseholdSchema),
    defaultValues: {
      name: '',
      country: 'GB',
      region: null,
      timeZone: suggestTimeZone('GB'),
      people: [{ name: '', birthDate: null, diedOn: null }],
      hopes: '',
    },
  });
  const { register, formState, handleSubmit, setError } = form;
  const submit = handleSubmit((values) =>
    create.mutate(values, {
      onSuccess: onCreated,
      onError: (error) => applyFieldProblems(error, setError),
    }),
  );
  return (
    <FormProvider {...form}>
      <form noValidate onSubmit={submit}>
        <Section title="The household">
          <Field
            label="Name"
            hint="As you would say it, for example “Family Merrow”."
            error={formState.errors.name?.message}
            className="mb-5 max-w-xl"
          >
            {(props) => <TextInput {...props} {...register('name')} autoComplete="off" />}
          </Field>
          <PlaceFields />
        </Section>
        <Section title="People" intro="Whose papers these are. Dates can follow later.">
          <PeopleFields />
        </Section>
        <Section title="What they hope for">
          <Field label="In their own words" hint="They can read this." optional>
            {(props) => <TextArea {...props} {...register('hopes')} maxLength={2000} />}
          </Field>
        </Section>
        {create.error ? (
          <Banner alert tone="fault" title="Not added" className="mt-6">
            {sentenceOf(create.error)}
          </Banner>
        ) : null}
        <div className="mt-8">
          <Button type="submit" tone="primary" busy={create.isPending}>
            Add the household
          </Button>
        </div>
      </form>
    </FormProvider>
  );
}
