import { useState } from 'react';
import { toast } from 'sonner';
import { classLabel } from '../../../../server/contract/document-classes.ts';
import { defaultLeadDays, type Household } from '../../../../server/contract/households.ts';
import { Banner } from '../../../components/ui/banner.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { sentenceOf } from '../../../lib/api-error.ts';
import { useSaveLeadDays } from '../api/save-lead-days.ts';

/** Days of notice before something runs out, by kind of paper. */
export function LeadDaysForm({ household }: { household: Household }) {
  const save = useSaveLeadDays(household);
  const [values, setValues] = useState<Record<string, number>>({
    ...defaultLeadDays,
    ...household.leadDays,
  });
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        save.mutate(values, { onSuccess: () => toast.success('Saved.') });
      }}
    >
      {save.error ? (
        <Banner alert tone="fault" className="mb-4" title="Not saved">
          {sentenceOf(save.error)}
        </Banner>
      ) : null}
      <div className="grid gap-4 sm:grid-cols-2 lg:grid-cols-3">
        {Object.keys(defaultLeadDays).map((classId) => (
          <Field key={classId} label={`${classLabel(classId)}, days before`}>
            {(props) => (
              <TextInput
                {...props}
                type="number"
                min={0}
                max={1000}
                inputMode="numeric"
                value={String(values[classId] ?? '')}
                onChange={(event) =>
                  setValues({ ...values, [classId]: Number(event.target.value) })
                }
              />
            )}
          </Field>
        ))}
      </div>
      <Button type="submit" className="mt-4" busy={save.isPending}>
        Save the notice
      </Button>
    </form>
  );
}
