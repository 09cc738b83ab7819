import { zodResolver } from '@hookform/resolvers/zod';
import { useForm, useWatch } from 'react-hook-form';
import {
  createSubjectSchema,
  type Subject,
  subjectKindLabels,
  subjectKinds,
} from '../../../../server/contract/subjects.ts';
import { Banner } from '../../../components/ui/banner.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Checkbox } from '../../../components/ui/checkbox.tsx';
import { DateInput } from '../../../components/ui/date-input.tsx';
import { Dialog } from '../../../components/ui/dialog.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { sentenceOf } from '../../../lib/api-error.ts';
import { applyFieldProblems } from '../../../lib/form-problems.ts';
import { useSaveSubject } from '../api/save-subject.ts';

const emptyToNull = (value: string | null) => value || null;

/** Something that papers are about: an account, a car, a policy. When it ends, their time starts. */
export function SubjectDialog({
  householdId,
  subject,
  onClose,
}: {
  householdId: string;
  subject: Subject | null;
  onClose: () => void;
}) {
  const save = useSaveSubject(householdId, subject);
  const { register, control, handleSubmit, formState, setError } = useForm({
    resolver: zodResolver(createSubjectSchema),
    defaultValues: {
      kind: subject?.kind ?? ('account' as const),
      name: subject?.name ?? '',
      reference: subject?.reference ?? null,
      startedOn: subject?.startedOn ?? null,
      endedOn: subject?.endedOn ?? null,
      endKnown: subject?.endKnown ?? false,
    },
  });
  const endedOn = useWatch({ control, name: 'endedOn' });
  const submit = handleSubmit((values) =>
    save.mutate(values, {
      onSuccess: onClose,
      onError: (error) => applyFieldProblems(error, setError),
    }),
  );
  return (
    <Dialog
      open
      onOpenChange={onClose}
      title={subject ? subject.name : 'Add what papers are about'}
      description="Recording that it ended starts the time of its papers."
    >
      <form noValidate onSubmit={(event) => void submit(event)} className="space-y-4">
        {save.error ? (
          <Banner alert tone="fault" title="Not saved">
            {sentenceOf(save.error)}
          </Banner>
        ) : null}
        <Field label="It is">
          {(props) => (
            <Select {...props} {...register('kind')}>
              {subjectKinds.map((kind) => (
                <option key={kind} value={kind}>
                  {subjectKindLabels[kind]}
                </option>
              ))}
            </Select>
          )}
        </Field>
        <Field label="Name" error={formState.errors.name?.message}>
          {(props) => <TextInput {...props} {...register('name')} autoComplete="off" />}
        </Field>
        <Field label="Number on its papers" optional>
          {(props) => (
            <TextInput {...props} {...register('reference', { setValueAs: emptyToNull })} />
          )}
        </Field>
        <div className="grid gap-4 sm:grid-cols-2">
          <Field label="Began on" optional error={formState.errors.startedOn?.message}>
            {(props) => (
              <DateInput {...props} {...register('startedOn', { setValueAs: emptyToNull })} />
            )}
          </Field>
          <Field label="Ended on" optional error={formState.errors.endedOn?.message}>
            {(props) => (
              <DateInput {...props} {...register('endedOn', { setValueAs: emptyToNull })} />
            )}
          </Field>
        </div>
        {endedOn ? null : (
          <Checkbox {...register('endKnown')} label="It still runs: somebody has made sure" />
        )}
        <div className="flex justify-end gap-3 pt-2">
          <Button onClick={onClose}>Cancel</Button>
          <Button type="submit" tone="primary" busy={save.isPending}>
            Save
          </Button>
        </div>
      </form>
    </Dialog>
  );
}
