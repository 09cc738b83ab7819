import { useFormContext, useWatch } from 'react-hook-form';
import { circumstanceNames } from '../../../../server/contract/households.ts';
import type { CircumstanceName, Circumstances } from '../../../../server/contract/households.ts';
import { Radio } from '../../../components/ui/checkbox.tsx';
import { DateInput } from '../../../components/ui/date-input.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { circumstanceWords } from '../logic/circumstance-words.ts';

interface CircumstanceValues {
  circumstances: Required<Circumstances>;
}

const answers = [
  { value: 'yes', label: 'Yes' },
  { value: 'no', label: 'No' },
  { value: 'not-asked', label: 'Not asked' },
] as const;
const emptyToNull = { setValueAs: (value: string | null) => value || null };

function CircumstanceQuestion({ name }: { name: CircumstanceName }) {
  const { register, control, formState } = useFormContext<CircumstanceValues>();
  const answer = useWatch({ control, name: `circumstances.${name}.answer` });
  const errors = formState.errors.circumstances?.[name];
  return (
    <fieldset className="border-t border-line py-3">
      <legend className="float-left mb-1 w-full pt-2 font-semibold md:w-1/2 md:pr-6">
        {circumstanceWords[name]}
      </legend>
      <div className="flex flex-wrap gap-x-6 md:pl-2">
        {answers.map((option) => (
          <Radio
            key={option.value}
            label={option.label}
            value={option.value}
            {...register(`circumstances.${name}.answer`)}
          />
        ))}
      </div>
      {answer === 'yes' ? (
        <div className="clear-both grid grid-cols-2 gap-4 pt-2 sm:max-w-md">
          <Field label="Since" optional error={errors?.from?.message}>
            {(props) => (
              <DateInput {...props} {...register(`circumstances.${name}.from`, emptyToNull)} />
            )}
          </Field>
          <Field label="Until" hint={null} optional error={errors?.to?.message}>
            {(props) => (
              <DateInput {...props} {...register(`circumstances.${name}.to`, emptyToNull)} />
            )}
          </Field>
        </div>
      ) : null}
    </fieldset>
  );
}

/** The facts about a household that switch rules on. */
export function CircumstanceFields() {
  return (
    <div className="border-b border-line">
      {circumstanceNames.map((name) => (
        <CircumstanceQuestion key={name} name={name} />
      ))}
    </div>
  );
}
