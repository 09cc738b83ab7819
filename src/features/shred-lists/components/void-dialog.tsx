import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { shredListEndpoints, type ShredList } from '../../../../server/contract/shred-lists.ts';
import { Button } from '../../../components/ui/button.tsx';
import { Dialog } from '../../../components/ui/dialog.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { TextArea } from '../../../components/ui/text-input.tsx';
import { useVoidShredList } from '../api/void-shred-list.ts';
import { RefusalBanner } from './refusal-banner.tsx';

interface VoidDialogProps {
  list: ShredList;
  onGivenUp: () => void;
  onClose: () => void;
}

/** Gives a list up with a reason. Nothing leaves; its papers stay where they were. */
export function VoidDialog({ list, onGivenUp, onClose }: VoidDialogProps) {
  const giveUp = useVoidShredList(list);
  const { register, handleSubmit, formState } = useForm({
    resolver: zodResolver(shredListEndpoints.voidShredList.body),
    defaultValues: { reason: '' },
  });
  const submit = handleSubmit(({ reason }) => giveUp.mutate(reason, { onSuccess: onGivenUp }));
  return (
    <Dialog
      open
      onOpenChange={onClose}
      title={`Give up shred list ${list.number}?`}
      description="Nothing is shredded. The papers stay on the shred pile and come up again with the next list."
    >
      <form noValidate onSubmit={(event) => void submit(event)} className="space-y-5">
        {giveUp.error ? <RefusalBanner error={giveUp.error} title="Not given up" /> : null}
        <Field
          label="Why"
          hint="The client can read it in what happened."
          error={formState.errors.reason?.message}
        >
          {(props) => <TextArea {...props} {...register('reason')} maxLength={500} />}
        </Field>
        <div className="flex flex-wrap justify-end gap-3">
          <Button onClick={onClose}>Leave it as it is</Button>
          <Button type="submit" tone="primary" busy={giveUp.isPending}>
            Give the list up
          </Button>
        </div>
      </form>
    </Dialog>
  );
}
