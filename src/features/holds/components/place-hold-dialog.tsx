import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { holdKindLabels, holdKinds, placeHoldSchema } from '../../../../server/contract/holds.ts';
import { Banner } from '../../../components/ui/banner.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { DateInput } from '../../../components/ui/date-input.tsx';
import { Dialog } from '../../../components/ui/dialog.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { TextArea } from '../../../components/ui/text-input.tsx';
import { sentenceOf } from '../../../lib/api-error.ts';
import { usePlaceHold } from '../api/change-holds.ts';

/** Says that nothing in the household may be destroyed yet. */
export function PlaceHoldDialog({
  householdId,
  onClose,
}: {
  householdId: string;
  onClose: () => void;
}) {
  const place = usePlaceHold(householdId);
  const { register, handleSubmit, formState } = useForm({
    resolver: zodResolver(placeHoldSchema),
    defaultValues: { paperId: null, kind: 'enquiry' as const, reason: '', reviewOn: null },
  });
  const submit = handleSubmit((input) => place.mutate(input, { onSuccess: onClose }));
  return (
    <Dialog
      open
      onOpenChange={onClose}
      title="Hold everything in the household"
      description="No paper can leave until this is lifted, whatever its date. To hold one paper only, open it and hold it there."
    >
      <form noValidate onSubmit={(event) => void submit(event)} className="space-y-4">
        {place.error ? (
          <Banner alert tone="fault" title="Not set">
            {sentenceOf(place.error)}
          </Banner>
        ) : null}
        <Field label="Because of" error={formState.errors.kind?.message}>
          {(props) => (
            <Select {...props} {...register('kind')}>
              {holdKinds.map((kind) => (
                <option key={kind} value={kind}>
                  {holdKindLabels[kind]}
                </option>
              ))}
            </Select>
          )}
        </Field>
        <Field
          label="In a few words"
          hint="Everybody of the household can read this."
          error={formState.errors.reason?.message}
        >
          {(props) => <TextArea {...props} {...register('reason')} maxLength={500} />}
        </Field>
        <Field label="Look at it again on" optional error={formState.errors.reviewOn?.message}>
          {(props) => (
            <DateInput
              {...props}
              {...register('reviewOn', { setValueAs: (v: string | null) => v || null })}
            />
          )}
        </Field>
        <div className="flex justify-end gap-3 pt-2">
          <Button onClick={onClose}>Cancel</Button>
          <Button type="submit" tone="primary" busy={place.isPending}>
            Hold everything
          </Button>
        </div>
      </form>
    </Dialog>
  );
}
