import { useId } from 'react';
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
  const questionId = useId();
  return (
    <div
      role="radiogroup"
      aria-labelledby={questionId}
      className="grid grid-cols-[minmax(0,1fr)] items-center gap-x-6 border-t border-line py-2 md:grid-cols-2"
    >
      <p id={questionId} className="pt-1 font-semibold md:pt-0">
        {circumstanceWords[name]}
      </p>
      <div className="flex flex-wrap gap-x-6">
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
        <div className="grid grid-cols-2 gap-4 pt-1 pb-2 md:col-start-2">
          <Field label="Since" optional error={errors?.from?.message}>
            {(props) => (
              <DateInput {...props} {...register(`circumstances.${name}.from`, emptyToNull)} />
            )}
          </Field>
          <Field label="Until" optional error={errors?.to?.message}>
            {(props) => (
              <DateInput {...props} {...register(`circumstances.${name}.to`, emptyToNull)} />
            )}
          </Field>
        </div>
      ) : null}
    </div>
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
