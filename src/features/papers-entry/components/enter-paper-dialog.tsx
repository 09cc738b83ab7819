import { zodResolver } from '@hookform/resolvers/zod';
import { Controller, useForm, useWatch } from 'react-hook-form';
import { enterPaperSchema } from '../../../../server/contract/papers.ts';
import type { Paper } from '../../../../server/contract/papers.ts';
import { Banner } from '../../../components/ui/banner.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Checkbox } from '../../../components/ui/checkbox.tsx';
import { ClassPicker } from '../../../components/ui/class-picker.tsx';
import { DateInput } from '../../../components/ui/date-input.tsx';
import { Dialog } from '../../../components/ui/dialog.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { sentenceOf } from '../../../lib/api-error.ts';
import { applyFieldProblems } from '../../../lib/form-problems.ts';
import { useEnterPaper } from '../api/enter-paper.ts';

const emptyToNull = (value: string | null) => (value === '' ? null : value);

/** Describes a paper that is not scanned (sealed, bound, brittle, bulky), or several kept together. */
export function EnterPaperDialog({
  householdId,
  boxId,
  onEntered,
  onClose,
}: {
  householdId: string;
  boxId: string | null;
  onEntered: (paper: Paper) => void;
  onClose: () => void;
}) {
  const enter = useEnterPaper(householdId);
  const form = useForm({
    resolver: zodResolver(enterPaperSchema),
    defaultValues: {
      class: 'unrecognised' as const,
      title: '',
      boxId,
      bundle: false,
      bundleFrom: null,
      bundleTo: null,
      sheets: 1,
      place: null,
      facts: { dates: {} },
    },
  });
  const { register, control, formState, handleSubmit, setError } = form;
  const isBundle = useWatch({ control, name: 'bundle' });
  const submit = handleSubmit((values) =>
    enter.mutate(values, {
      onSuccess: onEntered,
      onError: (error) => applyFieldProblems(error, setError),
    }),
  );
  return (
    <Dialog
      open
      onOpenChange={onClose}
      title="Enter without a scan"
      description="For what is sealed, bound, brittle or bulky, and for many papers kept together."
    >
      <form noValidate onSubmit={(event) => void submit(event)} className="space-y-4">
        {enter.error ? (
          <Banner alert tone="fault" title="Not entered">
            {sentenceOf(enter.error)}
          </Banner>
        ) : null}
        <Field
          label="What it is"
          hint="In a few words, for example “Bank statements 2009 to 2014”."
          error={formState.errors.title?.message}
        >
          {(props) => <TextInput {...props} {...register('title')} autoComplete="off" />}
        </Field>
        <Field label="Kind of paper" error={formState.errors.class?.message}>
          {(props) => (
            <Controller
              control={control}
              name="class"
              render={({ field }) => (
                <ClassPicker
                  {...props}
                  value={field.value === 'unrecognised' ? null : field.value}
                  onChange={field.onChange}
                />
              )}
            />
          )}
        </Field>
        <Checkbox {...register('bundle')} label="Several papers kept together (a bundle)" />
        {isBundle ? (
          <div className="grid gap-4 sm:grid-cols-2">
            <Field label="First date" error={formState.errors.bundleFrom?.message} optional>
              {(props) => (
                <DateInput {...props} {...register('bundleFrom', { setValueAs: emptyToNull })} />
              )}
            </Field>
            <Field label="Last date" error={formState.errors.bundleTo?.message} optional>
              {(props) => (
                <DateInput {...props} {...register('bundleTo', { setValueAs: emptyToNull })} />
              )}
            </Field>
          </div>
        ) : (
          <div className="grid gap-4 sm:grid-cols-2">
            <Field label="Date on the paper" optional>
              {(props) => (
                <DateInput
                  {...props}
                  {...register('facts.dates.issued', {
                    setValueAs: (v: string | undefined) => v || undefined,
                  })}
                />
              )}
            </Field>
            <Field label="Runs out on" optional>
              {(props) => (
                <DateInput
                  {...props}
                  {...register('facts.dates.expiry', {
                    setValueAs: (v: string | undefined) => v || undefined,
                  })}
                />
              )}
            </Field>
          </div>
        )}
        <div className="grid gap-4 sm:grid-cols-2">
          <Field label="Sheets, about" error={formState.errors.sheets?.message}>
            {(props) => (
              <TextInput
                {...props}
                {...register('sheets', { valueAsNumber: true })}
                type="number"
                min={1}
                inputMode="numeric"
              />
            )}
          </Field>
          <Field label="Where it is" optional>
            {(props) => (
              <TextInput {...props} {...register('place', { setValueAs: emptyToNull })} />
            )}
          </Field>
        </div>
        <div className="flex justify-end gap-3 pt-2">
          <Button onClick={onClose}>Cancel</Button>
          <Button type="submit" tone="primary" busy={enter.isPending}>
            Enter it
          </Button>
        </div>
      </form>
    </Dialog>
  );
}
