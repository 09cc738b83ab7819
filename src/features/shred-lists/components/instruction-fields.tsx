import type { FieldErrors, UseFormRegister } from 'react-hook-form';
import { DateInput } from '../../../components/ui/date-input.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { TextArea } from '../../../components/ui/text-input.tsx';
import type { ConsentForm } from '../logic/consent.ts';
import { instructionWords } from '../logic/words.ts';

interface InstructionFieldsProps {
  register: UseFormRegister<ConsentForm>;
  errors: FieldErrors<ConsentForm>['instruction'];
  today: string;
}

/** How the client's instruction was given, when, and in which words. */
export function InstructionFields({ register, errors, today }: InstructionFieldsProps) {
  return (
    <>
      <div className="grid gap-5 sm:grid-cols-2">
        <Field label="How the client told you" error={errors?.how?.message}>
          {(props) => (
            <Select {...props} {...register('instruction.how')}>
              {Object.entries(instructionWords).map(([value, words]) => (
                <option key={value} value={value}>
                  {words}
                </option>
              ))}
            </Select>
          )}
        </Field>
        <Field
          label="When"
          error={errors?.on ? (errors.on.message ?? 'Choose the day.') : undefined}
        >
          {(props) => <DateInput {...props} {...register('instruction.on')} max={today} />}
        </Field>
      </div>
      <Field
        label="The client’s words"
        hint="As they were said or written. The client is told by e-mail that you recorded this."
        error={errors?.words?.message}
      >
        {(props) => <TextArea {...props} {...register('instruction.words')} maxLength={1000} />}
      </Field>
    </>
  );
}
