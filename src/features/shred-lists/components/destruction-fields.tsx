import type { UseFormReturn } from 'react-hook-form';
import { useWatch } from 'react-hook-form';
import { securityLevels } from '../../../../server/contract/assessments.ts';
import type { ShredList } from '../../../../server/contract/shred-lists.ts';
import { Checkbox } from '../../../components/ui/checkbox.tsx';
import { DateInput } from '../../../components/ui/date-input.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import type { DestructionForm, DestructionRecord } from '../logic/destruction-form.ts';

interface DestructionFieldsProps {
  form: UseFormReturn<DestructionForm, unknown, DestructionRecord>;
  list: ShredList;
  today: string;
}

/** The day, the place, the shredder and the witness. */
export function DestructionFields({ form, list, today }: DestructionFieldsProps) {
  const { register, control, formState } = form;
  const { errors } = formState;
  const level = useWatch({ control, name: 'level' });
  const asked = list.securityLevel;
  const isCoarser = asked !== null && (!level || level < asked);
  return (
    <>
      <div className="grid gap-5 sm:grid-cols-2">
        <Field
          label="When"
          error={
            errors.on
              ? errors.on.type === 'server'
                ? errors.on.message
                : 'Choose the day.'
              : undefined
          }
        >
          {(props) => (
            <DateInput {...props} {...register('on')} min={list.approval?.on} max={today} />
          )}
        </Field>
        <Field label="Where" error={errors.place?.message}>
          {(props) => (
            <TextInput
              {...props}
              {...register('place')}
              placeholder="For example at the kitchen table"
            />
          )}
        </Field>
      </div>
      <Field
        label="How"
        hint="The shredder, or the firm and the number of its receipt."
        error={errors.method?.message}
      >
        {(props) => (
          <TextInput
            {...props}
            {...register('method')}
            placeholder="For example a cross-cut shredder"
          />
        )}
      </Field>
      <Field
        label="Shredder level"
        hint={
          asked
            ? `It stands on the shredder. ${asked} or finer is asked for; a higher number is finer.`
            : 'It stands on the shredder; a higher number is finer.'
        }
        error={errors.level?.message}
      >
        {(props) => (
          <>
            <Select
              {...props}
              className="max-w-56"
              {...register('level', {
                setValueAs: (value: string | null) => (value === '' ? null : value),
              })}
            >
              <option value="">Not known</option>
              {securityLevels.map((name) => (
                <option key={name} value={name}>
                  {name}
                </option>
              ))}
            </Select>
            {isCoarser ? (
              <p className="text-sm font-semibold text-amber-strong">
                Some papers ask for {asked}. Shred those again finer, or have a firm do it.
              </p>
            ) : null}
          </>
        )}
      </Field>
      <div>
        <Field label="Who watched" hint="First and last name." error={errors.witness?.message}>
          {(props) => <TextInput {...props} {...register('witness')} autoComplete="off" />}
        </Field>
        <Checkbox
          {...register('clientPresent')}
          className="mt-1"
          label="The client was there while it was shredded"
        />
      </div>
    </>
  );
}
