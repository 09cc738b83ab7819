import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { type Hold, liftHoldSchema } from '../../../../server/contract/holds.ts';
import { Banner } from '../../../components/ui/banner.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Dialog } from '../../../components/ui/dialog.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { TextArea } from '../../../components/ui/text-input.tsx';
import { sentenceOf } from '../../../lib/api-error.ts';
import { useLiftHold } from '../api/change-holds.ts';

/** Asks why a hold can go before lifting it; both stay on record. */
export function LiftHoldDialog({ hold, onClose }: { hold: Hold; onClose: () => void }) {
  const lift = useLiftHold(hold.householdId);
  const { register, handleSubmit, formState } = useForm({
    resolver: zodResolver(liftHoldSchema),
    defaultValues: { reason: '' },
  });
  const submit = handleSubmit(({ reason }) =>
    lift.mutate({ holdId: hold.id, reason }, { onSuccess: onClose }),
  );
  return (
    <Dialog
      open
      onOpenChange={onClose}
      title="Lift “don’t destroy yet”"
      description="The papers it covered follow their own dates again. If another side set it, write down their agreement."
    >
      <form noValidate onSubmit={(event) => void submit(event)} className="space-y-4">
        {lift.error ? (
          <Banner alert tone="fault" title="Not lifted">
            {sentenceOf(lift.error)}
          </Banner>
        ) : null}
        <Field label="Why it can go" error={formState.errors.reason?.message}>
          {(props) => <TextArea {...props} {...register('reason')} maxLength={500} />}
        </Field>
        <div className="flex justify-end gap-3 pt-2">
          <Button onClick={onClose}>Leave it</Button>
          <Button type="submit" tone="primary" busy={lift.isPending}>
            Lift it
          </Button>
        </div>
      </form>
    </Dialog>
  );
}
