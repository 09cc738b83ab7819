import { Plus, Trash2 } from 'lucide-react';
import { useFieldArray, useFormContext } from 'react-hook-form';
import { Button } from '../../../components/ui/button.tsx';
import { DateInput } from '../../../components/ui/date-input.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';

interface PeopleValues {
  people: { name: string; birthDate: string | null; diedOn: string | null }[];
}

const emptyToNull = { setValueAs: (value: string | null) => value || null };

/** The people whose papers these are. */
export function PeopleFields() {
  const { register, control, formState } = useFormContext<PeopleValues>();
  const { fields, append, remove } = useFieldArray({ control, name: 'people' });
  const errors = formState.errors.people;
  return (
    <div className="flex flex-col gap-4">
      {fields.length === 0 ? <p className="text-ink-soft">Nobody is named yet.</p> : null}
      <ul className="flex flex-col gap-4">
        {fields.map((field, i) => (
          <li
            key={field.id}
            className="grid grid-cols-2 gap-x-4 gap-y-3 border-t border-line pt-4 sm:grid-cols-[minmax(0,2fr)_minmax(0,1fr)_minmax(0,1fr)_auto] sm:items-start"
          >
            <Field
              label="Name"
              error={errors?.[i]?.name?.message}
              className="col-span-2 sm:col-span-1"
            >
              {(props) => (
                <TextInput {...props} {...register(`people.${i}.name`)} autoComplete="off" />
              )}
            </Field>
            <Field label="Born on" error={errors?.[i]?.birthDate?.message}>
              {(props) => (
                <DateInput {...props} {...register(`people.${i}.birthDate`, emptyToNull)} />
              )}
            </Field>
            <Field label="Died on" error={errors?.[i]?.diedOn?.message}>
              {(props) => <DateInput {...props} {...register(`people.${i}.diedOn`, emptyToNull)} />}
            </Field>
            <Button
              tone="plain"
              onClick={() => remove(i)}
              className="col-span-2 justify-self-start sm:col-span-1 sm:mt-7"
              icon={<Trash2 aria-hidden />}
            >
              <span className="sm:sr-only">Remove this person</span>
            </Button>
          </li>
        ))}
      </ul>
      <div>
        <Button
          icon={<Plus aria-hidden />}
          onClick={() => append({ name: '', birthDate: null, diedOn: null })}
        >
          Add a person
        </Button>
      </div>
    </div>
  );
}
