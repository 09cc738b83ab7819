import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { holdKindLabels, holdKinds, placeHoldSchema } from '../../../../server/contract/holds.ts';
import { Banner } from '../../../components/ui/banner.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Radio } from '../../../components/ui/checkbox.tsx';
import { DateInput } from '../../../components/ui/date-input.tsx';
import { Dialog } from '../../../components/ui/dialog.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { TextArea } from '../../../components/ui/text-input.tsx';
import { sentenceOf } from '../../../lib/api-error.ts';
import type { HoldInput } from '../api/place-hold.ts';

interface HoldDialogProps {
  paperId: string;
  onPlace: (input: HoldInput) => Promise<void>;
  onClose: () => void;
}

/** Says that this paper, or everything in the household, must not be destroyed yet. */
export function HoldDialog({ paperId, onPlace, onClose }: HoldDialogProps) {
  const form = useForm({
    resolver: zodResolver(placeHoldSchema),
    defaultValues: { paperId, kind: 'enquiry', reason: '', reviewOn: null },
  });
  const { errors, isSubmitting } = form.formState;
  const submit = form.handleSubmit(async (input) => {
    try {
      await onPlace(input);
    } catch (error) {
      form.setError('root', { message: sentenceOf(error) });
    }
  });
  return (
    <Dialog
      open
      onOpenChange={onClose}
      title="Don’t destroy yet"
      description="Nothing that this covers can be shredded or recycled until it is lifted again, whatever its date."
    >
      <form onSubmit={(event) => void submit(event)} noValidate className="space-y-4">
        {errors.root && <Banner tone="fault" alert title={errors.root.message} />}
        <fieldset>
          <legend className="font-semibold">It covers</legend>
          <Radio
            {...form.register('paperId', { setValueAs: emptyToNull })}
            value={paperId}
            label="this paper"
          />
          <Radio
            {...form.register('paperId', { setValueAs: emptyToNull })}
            value=""
            label="everything in the household"
          />
        </fieldset>
        <Field label="Because of" error={errors.kind?.message}>
          {(control) => (
            <Select {...control} {...form.register('kind')}>
              {holdKinds.map((kind) => (
                <option key={kind} value={kind}>
                  {holdKindLabels[kind]}
                </option>
              ))}
            </Select>
          )}
        </Field>
        <Field label="In a few words" error={errors.reason?.message}>
          {(control) => <TextArea {...control} {...form.register('reason')} rows={2} />}
        </Field>
        <Field label="Look at it again on" optional error={errors.reviewOn?.message}>
          {(control) => (
            <DateInput {...control} {...form.register('reviewOn', { setValueAs: emptyToNull })} />
          )}
        </Field>
        <div className="flex justify-end">
          <Button tone="hold" type="submit" busy={isSubmitting}>
            Don’t destroy yet
          </Button>
        </div>
      </form>
    </Dialog>
  );
}

function emptyToNull(value: string | null): string | null {
  return value || null;
}
