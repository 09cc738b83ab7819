import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { createShredListSchema, type ShredList } from '../../../../server/contract/shred-lists.ts';
import { Button } from '../../../components/ui/button.tsx';
import { DateInput } from '../../../components/ui/date-input.tsx';
import { Dialog } from '../../../components/ui/dialog.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { useCreateShredList } from '../api/create-shred-list.ts';
import { RefusalBanner } from './refusal-banner.tsx';

const formSchema = createShredListSchema.pick({ on: true });

interface GatherDialogProps {
  householdId: string;
  /** The household's day, `yyyy-mm-dd`. */
  today: string;
  onGathered: (list: ShredList) => void;
  onClose: () => void;
}

/** Asks for the day, then gathers what may go on it. */
export function GatherDialog({ householdId, today, onGathered, onClose }: GatherDialogProps) {
  const create = useCreateShredList(householdId);
  const { register, handleSubmit, formState } = useForm({
    resolver: zodResolver(formSchema),
    defaultValues: { on: today },
  });
  const submit = handleSubmit(({ on }) => create.mutate(on, { onSuccess: onGathered }));
  return (
    <Dialog
      open
      onOpenChange={onClose}
      title="Gather a shred list"
      description="Every paper that somebody put on the shred pile is asked about. Those whose time is up come on the list; the others are named with the reason."
    >
      <form noValidate onSubmit={(event) => void submit(event)} className="space-y-5">
        {create.error ? <RefusalBanner error={create.error} title="Not gathered" /> : null}
        <Field
          label="The day of the shredding"
          hint="A later day brings more papers: those whose time is up by then."
          error={formState.errors.on ? 'Choose the day, for example today.' : undefined}
        >
          {(props) => <DateInput {...props} {...register('on')} min={today} />}
        </Field>
        <div className="flex flex-wrap justify-end gap-3">
          <Button onClick={onClose}>Cancel</Button>
          <Button type="submit" tone="primary" busy={create.isPending}>
            Gather
          </Button>
        </div>
      </form>
    </Dialog>
  );
}
