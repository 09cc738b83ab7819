import { useState } from 'react';
import { zodResolver } from '@hookform/resolvers/zod';
import { Controller, FormProvider, useForm } from 'react-hook-form';
import { toast } from 'sonner';
import type { Household } from '../../../../server/contract/households.ts';
import { Banner } from '../../../components/ui/banner.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { ConflictDialog } from '../../../components/ui/conflict-dialog.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Section } from '../../../components/ui/section.tsx';
import { TextArea, TextInput } from '../../../components/ui/text-input.tsx';
import { isConflict, sentenceOf } from '../../../lib/api-error.ts';
import { applyFieldProblems } from '../../../lib/form-problems.ts';
import { mergeEdits, pickChanges } from '../../../lib/merge-edits.ts';
import { useUpdateHousehold } from '../api/update-household.ts';
import {
  describeValue,
  fieldWords,
  householdFormSchema,
  readHouseholdValues,
} from '../logic/household-values.ts';
import type { HouseholdValues } from '../logic/household-values.ts';
import { CircumstanceFields } from './circumstance-fields.tsx';
import { PeopleFields } from './people-fields.tsx';
import { PlaceFields } from './place-fields.tsx';

interface Conflict {
  theirs: Household;
  mine: HouseholdValues;
}

/** Everything about a household that can be changed, saved together. */
export function AboutForm({ household }: { household: Household }) {
  // The version that this form was filled from: edits are sent against it, not against a later refresh.
  const [base, setBase] = useState(household);
  const [conflict, setConflict] = useState<Conflict | null>(null);
  const update = useUpdateHousehold(household.id);
  const form = useForm({
    resolver: zodResolver(householdFormSchema),
    defaultValues: readHouseholdValues(household),
  });
  const { register, control, formState, handleSubmit, reset, setError } = form;

  const save = (values: HouseholdValues, against: Household): void => {
    update.mutate(
      { version: against.version, body: pickChanges(readHouseholdValues(against), values) },
      {
        onSuccess: (saved) => {
          setBase(saved);
          setConflict(null);
          reset(readHouseholdValues(saved));
          toast.success('Saved. Papers are being assessed anew.');
        },
        onError: (error) => {
          if (isConflict(error) && error.problem.current) {
            setConflict({ theirs: error.problem.current as Household, mine: values });
          } else {
            setConflict(null);
            applyFieldProblems(error, setError);
          }
        },
      },
    );
  };
  const merged = conflict
    ? mergeEdits(readHouseholdValues(base), conflict.mine, readHouseholdValues(conflict.theirs))
    : null;

  return (
    <FormProvider {...form}>
      <form noValidate onSubmit={handleSubmit((values) => save(values, base))}>
        <Section title="The household">
          <Field label="Name" error={formState.errors.name?.message} className="mb-5 max-w-xl">
            {(props) => <TextInput {...props} {...register('name')} />}
          </Field>
          <PlaceFields />
        </Section>
        <Section title="People" intro="Whose papers these are.">
          <PeopleFields />
        </Section>
        <Section
          title="Circumstances"
          intro="They decide which rules apply. What was not asked counts as yes, so that nothing goes too early."
        >
          <CircumstanceFields />
        </Section>
        <Section title="Business and hopes">
          <div className="grid gap-5 sm:grid-cols-2">
            <Field
              label="Business names"
              hint="One on each line. Bills to these names count as business papers."
              error={formState.errors.businessNames?.message}
            >
              {(props) => (
                <Controller
                  control={control}
                  name="businessNames"
                  render={({ field }) => (
                    <TextArea
                      {...props}
                      ref={field.ref}
                      name={field.name}
                      onBlur={() => {
                        field.onBlur();
                        field.onChange(field.value.map((n) => n.trim()).filter(Boolean));
                      }}
                      value={field.value.join('\n')}
                      onChange={(event) =>
                        field.onChange(event.target.value ? event.target.value.split('\n') : [])
                      }
                    />
                  )}
                />
              )}
            </Field>
            <Field
              label="What they hope for"
              hint="In their own words. They can read this."
              error={formState.errors.hopes?.message}
            >
              {(props) => <TextArea {...props} {...register('hopes')} maxLength={2000} />}
            </Field>
          </div>
        </Section>
        {update.error && !isConflict(update.error) ? (
          <Banner alert tone="fault" title="Not saved" className="mt-6">
            {sentenceOf(update.error)}
          </Banner>
        ) : null}
        <div className="sticky bottom-16 z-10 mt-8 flex items-center gap-4 border-t border-line bg-paper py-3 md:bottom-0">
          <Button
            type="submit"
            tone="primary"
            busy={update.isPending}
            disabled={!formState.isDirty}
          >
            Save
          </Button>
          {formState.isDirty ? (
            <Button tone="plain" onClick={() => reset()}>
              Undo my changes
            </Button>
          ) : (
            <p className="text-sm text-ink-soft">Everything is saved.</p>
          )}
        </div>
      </form>
      <ConflictDialog
        open={conflict !== null}
        onClose={() => setConflict(null)}
        busy={update.isPending}
        rows={
          conflict && merged
            ? merged.clashes.map((field) => ({
                name: fieldWords[field],
                mine: describeValue(field, conflict.mine),
                theirs: describeValue(field, readHouseholdValues(conflict.theirs)),
              }))
            : []
        }
        onKeepMine={() => {
          if (conflict && merged) save(merged.withMine, conflict.theirs);
        }}
        onTakeTheirs={() => {
          if (conflict && merged) save(merged.withTheirs, conflict.theirs);
        }}
      />
    </FormProvider>
  );
}
